import argon2 from 'argon2';
import { PasswordHasher } from './password-hasher.js';

describe('PasswordHasher', () => {
  const hasher = new PasswordHasher();

  // OWASP Password Storage Cheat Sheet: argon2id, m=19456 KiB, t=2, p=1
  it('hashes with argon2id at no less than the recommended cost', async () => {
    const hash = await hasher.hash('slate heron umbrella');
    const [, kind, version, cost] = hash.split('$');
    expect([kind, version, cost!.split(',').sort().join(',')]).toEqual(['argon2id', 'v=19', 'm=19456,p=1,t=2']);
    expect(hasher.isOutdated(hash)).toBe(false);
    expect(hasher.isOutdated(await argon2.hash('slate heron umbrella', { memoryCost: 4096, timeCost: 3, parallelism: 1 }))).toBe(true);
  });

  it('salts: one password twice gives two hashes, and both verify', async () => {
    const [one, other] = await Promise.all([hasher.hash('slate heron umbrella'), hasher.hash('slate heron umbrella')]);
    expect(one).not.toBe(other);
    expect(await hasher.verify(one, 'slate heron umbrella')).toBe(true);
    expect(await hasher.verify(other, 'slate heron umbrellb')).toBe(false);
  });

  // Unicode Standard Annex 15: U+FB01 and 'fi', U+00E9 and 'e' with U+0301 are the same under NFKC
  it('takes a password typed in another Unicode form for the same', async () => {
    const hash = await hasher.hash('\ufb01ne caf\u00e9 by the river');
    expect(await hasher.verify(hash, 'fine cafe\u0301 by the river')).toBe(true);
  });

  it('does not cut long passwords: the 200th character counts', async () => {
    const hash = await hasher.hash(`${'long '.repeat(40)}x`);
    expect(await hasher.verify(hash, `${'long '.repeat(40)}y`)).toBe(false);
  });

  it('never accepts where there is no hash', async () => {
    expect(await hasher.verify(null, 'slate heron umbrella')).toBe(false);
    expect(await hasher.verify(null, '')).toBe(false);
  });
});
