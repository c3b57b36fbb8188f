import fc from 'fast-check';
import { randomBytes } from 'node:crypto';
import { isMappedUid, UidMap } from './uid-map.js';

const newMap = (known: [string, string][] = []) => new UidMap(known, () => new Uint8Array(randomBytes(16)));
const anyUid = fc.array(fc.nat({ max: 99999 }), { minLength: 3, maxLength: 9 }).map((parts) => `1.3.${parts.join('.')}`);

it('gives the same for the same, and others for others', () => {
  fc.assert(
    fc.property(fc.uniqueArray(anyUid, { minLength: 2, maxLength: 20 }), (uids) => {
      const map = newMap();
      const first = uids.map((uid) => map.replace(uid));
      expect(uids.map((uid) => map.replace(uid))).toEqual(first);
      expect(new Set(first).size).toBe(uids.length);
    }),
  );
});

// PS3.5 9.1: at most 64 characters, digits and dots, no component with a leading zero. B.2: 2.25 and a UUID as a number
it('makes UIDs of the standard, out of version 4 UUIDs (RFC 9562 5.4)', () => {
  for (let i = 0; i < 500; i++) {
    const uid = newMap().fresh();
    expect(uid).toMatch(/^2\.25\.[1-9]\d{0,38}$/);
    expect(uid.length).toBeLessThanOrEqual(64);
    const hex = BigInt(uid.slice(5)).toString(16).padStart(32, '0');
    expect(hex).toMatch(/^[0-9a-f]{12}4[0-9a-f]{3}[89ab][0-9a-f]{15}$/);
  }
});

// the example of ITU-T X.667 and PS3.5 B.2 (from memory): the UUID f81d4fae-7dec-11d0-a765-00a0c91e6bf6
it('knows the form', () => {
  expect(isMappedUid('2.25.329800735698586629295641978511506172918')).toBe(true);
  expect(BigInt('0xf81d4fae7dec11d0a76500a0c91e6bf6').toString()).toBe('329800735698586629295641978511506172918');
  expect(['2.25.0123', '2.25.', '2.25.1.2', '1.2.840.113619.2.1', `2.25.${2n ** 128n}`, '2.25.1 '].map(isMappedUid)).toEqual([
    false,
    false,
    false,
    false,
    false,
    false,
  ]);
});

it('goes on where an earlier file of the upload ended', () => {
  const earlier = newMap();
  const made = earlier.replace('1.2.3');
  expect(newMap(earlier.entries()).replace('1.2.3')).toBe(made);
});

it('leaves UIDs of the standard, and its own', () => {
  const map = newMap();
  expect(map.replace('1.2.840.10008.5.1.4.1.1.2')).toBe('1.2.840.10008.5.1.4.1.1.2');
  const made = map.replace('1.2.3');
  expect(map.replace(made)).toBe(made);
});
