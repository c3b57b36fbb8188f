import { cpSync, existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { hashOf } from './builds.mjs';

/**
 * Runs `seed` with the demo's pictures in place when this very drawing program has drawn them before, and
 * keeps them for the next time: drawing takes half a minute of processor time.
 */
export async function withDrawnImages(root, dataDir, seed) {
  const kept = join(root, 'node_modules/.cache/kerfside', `demo-images-${hashOf(root, ['scripts/phantom']).slice(0, 16)}`);
  const place = join(dataDir, 'demo-images');
  if (existsSync(kept) && !existsSync(place)) cpSync(kept, place, { recursive: true });
  // Those that are there already may be of an earlier drawing program.
  const drawnNow = !existsSync(place);
  await seed();
  if (drawnNow && existsSync(place)) keep(place, kept);
}

/** Copied beside its place first: an interrupted copy is never taken for the whole. */
function keep(place, kept) {
  const draft = `${kept}.${process.pid}`;
  mkdirSync(join(kept, '..'), { recursive: true });
  cpSync(place, draft, { recursive: true });
  if (existsSync(kept)) rmSync(draft, { recursive: true });
  else renameSync(draft, kept);
}
