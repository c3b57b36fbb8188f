import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { withCheckoutLock } from './checkout-lock.mjs';

let root;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'kerfside-lock-'));
});
afterEach(() => rmSync(root, { recursive: true }));

describe('the checkout lock', () => {
  it('lets one at a time in, and the next after a failure too', async () => {
    let inside = 0;
    let most = 0;
    const work = async () => {
      inside += 1;
      most = Math.max(most, inside);
      await new Promise((resolve) => setImmediate(resolve));
      inside -= 1;
      throw new Error('no build');
    };
    const ends = await Promise.allSettled([1, 2, 3].map(() => withCheckoutLock(root, work)));
    expect(ends.map((end) => end.reason?.message)).toEqual(['no build', 'no build', 'no build']);
    expect(most).toBe(1);
  });

  it('is taken over from a process that is gone', async () => {
    mkdirSync(join(root, '.cache'));
    // This process has this number, but was not started at that tick: its holder is gone.
    writeFileSync(join(root, '.cache/install-and-build.lock'), JSON.stringify({ pid: process.pid, started: '1' }));
    await expect(withCheckoutLock(root, async () => 'in')).resolves.toBe('in');
  });
});
