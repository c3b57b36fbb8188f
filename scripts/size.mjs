// npm run size: the script that sign-in and case list load, gzip; fails over the limit.
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { onDemandSizes, scriptClosure, scriptSize } from './lib/web-size.mjs';
import { projectRoot } from './lib/root.mjs';

const LIMIT_KB = 220;
const FIRST_PAGES = ['index.html', 'src/app/routes/sign-in.tsx', 'src/app/routes/case-list.tsx'];

const dist = join(projectRoot(import.meta.dirname), 'conference-web/dist');
const manifestFile = join(dist, '.vite/manifest.json');
if (!existsSync(manifestFile)) {
  process.stderr.write('There is no build of conference-web with a manifest: npm run build -w conference-web\n');
  process.exit(1);
}
const manifest = JSON.parse(readFileSync(manifestFile, 'utf8'));
const missing = FIRST_PAGES.filter((key) => !manifest[key]);
if (missing.length > 0) {
  process.stderr.write(`Not in the build: ${missing.join(', ')}\n`);
  process.exit(1);
}

const kb = (bytes) => `${(bytes / 1024).toFixed(1)} KB`;
const first = scriptClosure(manifest, FIRST_PAGES);
const bytes = scriptSize(dist, first);
process.stdout.write(`Sign-in and case list: ${kb(bytes)} of script, gzip (${first.size} files; limit ${LIMIT_KB} KB)\n`);
process.stdout.write('On demand, beyond that:\n');
for (const { key, size } of onDemandSizes(manifest, dist, first)) process.stdout.write(`  ${kb(size).padStart(9)}  ${key}\n`);
if (bytes > LIMIT_KB * 1024) {
  process.stderr.write(`Over the limit by ${kb(bytes - LIMIT_KB * 1024)}.\n`);
  process.exit(1);
}
