import { deflateRawSync } from 'node:zlib';
import { dicomFile, dicomPicture, dicomSamples, element, pictureDataSet, u16, u32 } from '../../test/support/dicom-files.js';
import { DicomRefusal } from './dicom-elements.js';
import { checkDicomStructure } from './dicom-structure.js';

const DEFLATED = '1.2.840.10008.1.2.1.99';
const JPEG_BASELINE = '1.2.840.10008.1.2.4.50';
const pixels = Array.from({ length: 64 * 64 }, (_, index) => index);
const picture = { rows: 64, columns: 64, pixels };

async function faultOf(file: Buffer): Promise<string> {
  try {
    await checkDicomStructure(file);
    return 'none';
  } catch (error) {
    if (!(error instanceof DicomRefusal)) throw error;
    return error.fault;
  }
}

/** The picture with some of its elements said otherwise; the pixels stay as they are. */
const lying = (tag: Buffer, value: Buffer) => {
  const file = dicomPicture(picture);
  file.set(value, file.indexOf(tag) + 8);
  return file;
};
const ROWS = Buffer.concat([u16(0x28), u16(0x10)]);

describe('the structure of a DICOM file', () => {
  it('a whole picture passes, also deflated', async () => {
    expect(await faultOf(dicomPicture(picture))).toBe('none');
    expect(await faultOf(dicomFile(deflateRawSync(pictureDataSet(picture)), DEFLATED))).toBe('none');
  });

  it('cut off anywhere before the end of its pixels it does not', async () => {
    const file = dicomPicture(picture);
    for (let length = 132; length < file.length; length += length < 700 ? 1 : 97) expect(['cut-off', 'no-picture', 'broken']).toContain(await faultOf(file.subarray(0, length)));
    const deflated = dicomFile(deflateRawSync(pictureDataSet(picture)), DEFLATED);
    for (let length = 132; length < deflated.length; length += 97) expect(await faultOf(deflated.subarray(0, length))).not.toBe('none');
  });

  // sample files of Debian's python3-pydicom, in ten transfer syntaxes
  it('no sample passes once a tenth of it or more is gone', async () => {
    const passed: string[] = [];
    let whole = 0;
    for (const [name, file] of dicomSamples()) {
      if (file.toString('latin1', 128, 132) !== 'DICM' || (await faultOf(file)) !== 'none') continue;
      whole++;
      for (const part of [0.05, 0.25, 0.5, 0.75, 0.9]) if ((await faultOf(file.subarray(0, Math.floor(file.length * part)))) === 'none') passed.push(`${name} ${part}`);
    }
    expect(passed).toEqual([]);
    expect(whole).toBeGreaterThan(30);
  });

  it.each<[string, Buffer, string]>([
    ['more rows than there are pixels', lying(ROWS, u16(65)), 'cut-off'],
    ['no rows', lying(ROWS, u16(0)), 'no-picture'],
    ['65535 rows of 65535', dicomPicture({ rows: 65535, columns: 65535, pixels: [] }), 'too-large'],
    ['a million frames', dicomPicture({ ...picture, frames: 1_000_000 }), 'frames'],
    ['a length that overruns the file', dicomFile(Buffer.concat([u16(0x10), u16(0x10), Buffer.from('UT'), u16(0), u32(0xfffffff0)])), 'cut-off'],
    ['a representation that is none', dicomFile(Buffer.concat([u16(0x10), u16(0x10), Buffer.from('??'), u16(4), u32(0)])), 'broken'],
    ['no transfer syntax', Buffer.concat([Buffer.alloc(128), Buffer.from('DICM'), element(2, 2, 'UI', '1.2'), pictureDataSet(picture)]), 'broken'],
    ['nothing after its prefix', Buffer.concat([Buffer.alloc(128), Buffer.from('DICM')]), 'cut-off'],
    ['sequences nested ten thousand deep', dicomFile(nested(10_000)), 'broken'],
    ['a million empty elements', dicomFile(Buffer.concat(Array.from({ length: 1_000_000 }, () => element(0x10, 0x10, 'PN', '')))), 'broken'],
    ['a compressed picture of another size than it says', jpegOfSize(64, 65), 'broken'],
    ['a compressed picture without its end', jpegOfSize(64, 64, false), 'cut-off'],
  ])('with %s it is refused', async (_, file, fault) => {
    expect(await faultOf(file)).toBe(fault);
  });

  it('a compressed picture of the size it says passes', async () => {
    expect(await faultOf(jpegOfSize(64, 64))).toBe('none');
  });

  it('sequences of undefined length before the picture are stepped over', async () => {
    expect(await faultOf(dicomPicture({ ...picture, before: [nested(30, true)] }))).toBe('none');
  });

  it('a deflate bomb is refused before it is unpacked whole', async () => {
    const bomb = dicomFile(deflateRawSync(Buffer.concat([pictureDataSet({ ...picture, pixels: [] }).subarray(0, -12), element(0x42, 0x11, 'OB', Buffer.alloc(400_000_000))]), { level: 1 }), DEFLATED);
    expect(bomb.length).toBeLessThan(4_000_000);
    expect(await faultOf(bomb)).toBe('too-large');
  });
});

/** Sequences of undefined length, each in an item of the one before (PS3.5 7.5). */
function nested(depth: number, isClosed = false): Buffer {
  const sequence = Buffer.concat([u16(0x08), u16(0x1140), Buffer.from('SQ'), u16(0), u32(0xffffffff), u16(0xfffe), u16(0xe000), u32(0xffffffff)]);
  const ends = Buffer.concat([u16(0xfffe), u16(0xe00d), u32(0), u16(0xfffe), u16(0xe0dd), u32(0)]);
  return Buffer.concat([...Array.from({ length: depth }, () => sequence), ...(isClosed ? Array.from({ length: depth }, () => ends) : [])]);
}

/** A data set that says 64 by 64, and a JPEG frame header (ITU-T T.81 B.2.2) that says what is given. */
function jpegOfSize(rows: number, columns: number, isEnded = true): Buffer {
  const frame = Buffer.from([0xff, 0xd8, 0xff, 0xc0, 0, 11, 8, rows >> 8, rows & 255, columns >> 8, columns & 255, 1, 1, 0x11, 0, ...(isEnded ? [0xff, 0xd9] : [0, 0]), 0]);
  const item = (bytes: Buffer) => Buffer.concat([u16(0xfffe), u16(0xe000), u32(bytes.length), bytes]);
  const head = pictureDataSet({ ...picture, pixels: [] }).subarray(0, -12);
  const fragments = Buffer.concat([item(Buffer.alloc(0)), item(frame), u16(0xfffe), u16(0xe0dd), u32(0)]);
  return dicomFile(Buffer.concat([head, u16(0x7fe0), u16(0x10), Buffer.from('OB'), u16(0), u32(0xffffffff), fragments]), JPEG_BASELINE);
}
