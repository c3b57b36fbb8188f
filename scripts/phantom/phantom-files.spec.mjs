// The files that phantoms are written to, read by programs that nobody here wrote, and the demo's list.

import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { demoImages } from './demo-images.mjs';
import { PLANTED, PLANTED_EXIF, toDicom } from './dicom.mjs';
import { drawPhotograph } from './photograph.mjs';
import { toJpeg, toPng } from './png.mjs';
import { drawRadiograph } from './render.mjs';
import { completeSpec, layOut, truthOf } from './scene.mjs';

// Drawing on a busy machine may take many times its usual second.
jest.setTimeout(120_000);

describe('files', () => {
  const image = drawRadiograph({ width: 480, height: 400, pixelSpacingMm: 0.9 });
  const folder = mkdtempSync(join(tmpdir(), 'phantom-'));
  afterAll(() => rmSync(folder, { recursive: true }));

  // dcmtk's dcmdump is the reader that nobody here wrote.
  const dump = (name, meta, options = []) => {
    const path = join(folder, name);
    writeFileSync(path, toDicom(image, meta));
    return execFileSync('dcmdump', [...options, path], { encoding: 'utf8' });
  };

  it('dcmdump reads spacing, size and syntax', () => {
    const text = dump('plain.dcm', {});
    expect(text).toMatch(/0002,0010\) UI =LittleEndianExplicit/);
    expect(text).toMatch(/DigitalXRayImageStorageForPresentation/);
    expect(text).toMatch(/0018,1164\) DS \[0\.9\\0\.9\]/);
    expect(text).toMatch(/0018,1114\) DS \[1\.2\]/);
    expect(text).toMatch(/0028,0010\) US 400/);
    expect(text).toMatch(/0028,0011\) US 480/);
    expect(text).toMatch(/0010,0010\) PN \(no value available\)/);
  });

  it('spacing can be that of the hips or be left out', () => {
    expect(dump('hips.dcm', { spacing: 'calibrated', modality: 'CR' })).toMatch(/0028,0030\) DS \[0\.75\\0\.75\]/);
    expect(dump('none.dcm', { spacing: 'none' })).not.toMatch(/0028,0030|0018,1164/);
  });

  it('the pixels in the file are those drawn', () => {
    dump('pixels.dcm', {}, ['+W', folder]);
    const raw = readdirSync(folder).find((f) => f.endsWith('.raw'));
    expect(readFileSync(join(folder, raw)).equals(Buffer.from(image.pixels.buffer))).toBe(true);
  });

  it('planted identifiers are there when asked for, and only then', () => {
    expect(dump('clean.dcm', {})).not.toMatch(/quillfeather|plumwick/i);
    const text = dump('planted.dcm', { identifiers: PLANTED, privateTag: true }, ['+L']);
    for (const value of ['QUILLFEATHER^TAMSIN', 'Plumwick General', 'RP-61188', 'Quillfeather Tamsin, bed 9']) expect(text).toContain(value);
  });

  it('burned-in text changes the pixels of its boxes and no others', () => {
    const text = drawRadiograph({ ...image.spec, burnedIn: ['DOE-LIKE 12/03'], burnedInSizePx: 20 });
    const [{ box }] = text.truth.burnedIn;
    const inBox = (i) => {
      const [x, y] = [i % 480, Math.floor(i / 480)];
      return x >= box.x - 3 && x <= box.x + box.width + 3 && y >= box.y - 3 && y <= box.y + box.height + 3;
    };
    const changed = [...text.pixels.keys()].filter((i) => text.pixels[i] !== image.pixels[i]);
    expect(changed.length).toBeGreaterThan(200);
    expect(changed.filter((i) => !inBox(i))).toEqual([]);
  });

  it('PNG has the size and the window asked for', async () => {
    const png = await toPng(image, { window: { center: 1000, width: 1000 } });
    const { data, info } = await sharp(png).raw().toBuffer({ resolveWithObject: true });
    expect([info.width, info.height]).toEqual([480, 400]);
    const k = image.pixels.findIndex((v) => v > 900 && v < 1100);
    expect(Math.abs(data[k * info.channels] - (255 * (image.pixels[k] - 500)) / 1000)).toBeLessThan(1);
  });
});

describe('photograph', () => {
  const picture = drawPhotograph({ width: 600, height: 450 });

  it('has ticks one millimetre apart on its ruler', () => {
    const y = Math.round(225 + 34.8 / picture.mmPerPixel);
    const dark = [...Array(600).keys()].filter((x) => picture.rgb[(y * 600 + x) * 3] < 120);
    const gaps = dark.slice(1).map((x, i) => x - dark[i]).filter((d) => d > 1);
    const mean = gaps.reduce((a, b) => a + b, 0) / gaps.length;
    expect(gaps.length).toBeGreaterThan(100);
    expect(Math.abs(mean * picture.mmPerPixel - 1)).toBeLessThan(0.05);
  });

  it('carries EXIF only when it is planted', async () => {
    const [plain, planted] = [await toJpeg(picture), await toJpeg(picture, { exif: PLANTED_EXIF })];
    expect((await sharp(plain).metadata()).exif).toBeUndefined();
    expect((await sharp(planted).metadata()).exif.toString('latin1')).toContain('Quillfeather, theatre 3');
  });
});

describe('demo images', () => {
  const entries = demoImages();

  it('have names of their own and a case each', () => {
    expect(new Set(entries.map((e) => e.fileName)).size).toBe(entries.length);
    expect(new Set(entries.map((e) => e.caseKey)).size).toBeGreaterThanOrEqual(15);
  });

  it.each(entries.filter((e) => e.projection === 'ap-pelvis').map((e) => [e.fileName, e]))('%s shows its landmarks within the film', (_name, entry) => {
    const spec = completeSpec(entry.spec);
    const truth = truthOf(spec, layOut(spec));
    const points = [truth.hipCentre.px, ...Object.values(truth.teardropsPx), ...Object.values(truth.lesserTrochantersPx), ...truth.screws.map((s) => s.tipPx)];
    for (const p of points) {
      expect(p.x).toBeGreaterThan(15);
      expect(p.x).toBeLessThan(spec.width - 15);
      expect(p.y).toBeGreaterThan(15);
      expect(p.y).toBeLessThan(spec.height - 15);
    }
    expect(truth.cup.inclinationDeg).toBeCloseTo(entry.spec.shell.inclinationDeg, 2);
  });
});
