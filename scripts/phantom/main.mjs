// node scripts/phantom/main.mjs --out DIR [--only PART] [--share K/N] [--planted]
// Draws the demo's images as DICOM and PNG, with the truth of each beside it as JSON.

import { mkdir, rename, writeFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { parseArgs } from 'node:util';
import { demoImages } from './demo-images.mjs';
import { PLANTED, PLANTED_EXIF, toDicom } from './dicom.mjs';
import { drawPhotograph } from './photograph.mjs';
import { toJpeg, toPng } from './png.mjs';
import { drawRadiograph } from './render.mjs';

const BURNED_IN = ['QUILLFEATHER TAMSIN', 'QF-7730142  23/06/1951', 'PLUMWICK GENERAL 12/03/2021'];

// a file of this name is a whole one, whenever the program is ended
async function put(path, content) {
  await writeFile(`${path}.part`, content);
  await rename(`${path}.part`, path);
}

async function writePhotograph(entry, out, planted) {
  const picture = drawPhotograph({ ...entry.spec, burnedIn: planted ? BURNED_IN : [] });
  await put(join(out, entry.fileName), await toJpeg(picture, planted ? { exif: PLANTED_EXIF } : {}));
}

async function writeOne(entry, out, planted) {
  if (entry.projection === 'photograph') return writePhotograph(entry, out, planted);
  const name = basename(entry.fileName, '.dcm');
  const image = drawRadiograph({ ...entry.spec, burnedIn: planted ? BURNED_IN : [] });
  const meta = { name, study: `${entry.caseKey} ${entry.interval}` };
  if (planted) Object.assign(meta, { identifiers: PLANTED, privateTag: true });
  await put(join(out, `${name}.dcm`), toDicom(image, meta));
  await put(join(out, `${name}.png`), await toPng(image));
  await put(join(out, `${name}.json`), `${JSON.stringify({ ...entry, spec: undefined, truth: image.truth }, null, 2)}\n`);
}

const { values } = parseArgs({
  options: { out: { type: 'string' }, only: { type: 'string' }, share: { type: 'string', default: '1/1' }, planted: { type: 'boolean', default: false } },
});
if (!values.out) {
  console.error('Usage: node scripts/phantom/main.mjs --out DIR [--only PART] [--planted]');
  process.exit(2);
}
await mkdir(values.out, { recursive: true });
// so that several processes can draw at once, each its share
const [share, shares] = values.share.split('/').map(Number);
const chosen = demoImages()
  .filter((e) => !values.only || e.fileName.includes(values.only))
  .filter((_, index) => index % shares === share - 1);
const start = Date.now();
for (const entry of chosen) await writeOne(entry, values.out, values.planted);
console.log(`${chosen.length} images in ${((Date.now() - start) / 1000).toFixed(1)} s, ${values.out}`);
