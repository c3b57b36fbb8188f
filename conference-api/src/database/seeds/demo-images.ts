import { spawn } from 'node:child_process';
import { mkdir, readdir, readFile } from 'node:fs/promises';
import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import type { Projection } from '../../calc/vocabulary/images.js';

export interface DemoImage {
  caseKey: string;
  projection: Projection;
  interval: string;
  caption: string;
  bytes: Buffer;
  fileName: string;
}

const PROJECTION_OF: Record<string, Projection> = { 'ap-pelvis': 'ap-pelvis', lateral: 'lateral', oblique: 'oblique', 'ap-knee': 'ap', photograph: 'photograph' };

interface Entry {
  fileName: string;
  caseKey: string;
  projection: string;
  interval: string;
  caption: string;
}

/** The demo's pictures, drawn by the project's own program; kept in the folder for the next time. */
export async function drawDemoImages(projectFolder: string, cacheFolder: string): Promise<DemoImage[]> {
  await mkdir(cacheFolder, { recursive: true });
  const phantom = join(projectFolder, 'scripts/phantom');
  const { demoImages } = (await import(`file://${join(phantom, 'demo-images.mjs')}`)) as { demoImages: () => Entry[] };
  const entries = demoImages();
  const there = new Set(await readdir(cacheFolder));
  const missing = entries.filter((entry) => !there.has(entry.fileName));
  const shares = Math.min(4, availableParallelism());
  if (missing.length)
    await Promise.all(Array.from({ length: shares }, (_, index) => draw(join(phantom, 'main.mjs'), cacheFolder, projectFolder, `${index + 1}/${shares}`)));
  return Promise.all(
    entries.map(async (entry) => ({
      caseKey: entry.caseKey,
      projection: PROJECTION_OF[entry.projection] ?? 'other',
      interval: `${entry.interval} after the index operation`,
      caption: entry.caption,
      fileName: entry.fileName,
      bytes: await readFile(join(cacheFolder, entry.fileName)),
    })),
  );
}

function draw(program: string, folder: string, cwd: string, share: string): Promise<void> {
  const child = spawn(process.execPath, [program, '--out', folder, '--share', share], { cwd, stdio: ['ignore', 'inherit', 'inherit'] });
  return new Promise((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code) => (code === 0 ? resolve() : reject(new Error(`drawing the demo's pictures ended with ${code}`))));
  });
}
