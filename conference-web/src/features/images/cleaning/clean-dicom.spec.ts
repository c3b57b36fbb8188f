/** @jest-environment node */
import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { deflateRawSync } from 'node:zlib';
import { UidMap } from '@kerfside/calc/deidentification/uid-map';
import { cleanDicom } from './clean-dicom.js';
import { dicomSample } from './testing/dicom-samples.js';
import { dcmdump } from './testing/second-readers.js';

const newMap = () => new UidMap([], () => crypto.getRandomValues(new Uint8Array(16)));
const confirmed = { pixelsConfirmed: true };

let folder = '';
beforeAll(() => (folder = mkdtempSync(join(tmpdir(), 'dicom-'))));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** A sample changed by dcmtk's dcmodify, so that nothing of ours wrote it. */
function modified(sample: string, ...changes: string[]): Uint8Array<ArrayBuffer> {
  const path = join(folder, 'modified.dcm');
  writeFileSync(path, dicomSample(sample));
  execFileSync('dcmodify', ['--quiet', '--no-backup', ...changes, path]);
  return new Uint8Array(readFileSync(path));
}

function dumped(bytes: Uint8Array) {
  const path = join(folder, 'dumped.dcm');
  writeFileSync(path, bytes);
  const [lines] = dcmdump(path);
  return (tag: string) => lines!.filter((line) => line.tag === tag).map(({ value }) => value);
}

describe('what is kept', () => {
  it('is the scale, the side, the view and the part of the body', async () => {
    const bytes = modified(
      'test_files/CT_small.dcm',
      ...['-i', '(0018,1164)=0.139\\0.139', '-i', '(0020,0060)=L', '-i', '(0018,5101)=AP', '-i', '(0018,0015)=HIP', '-i', '(0018,1114)=1.15'],
    );
    const valueOf = dumped((await cleanDicom(bytes, newMap(), confirmed)).bytes);
    expect([valueOf('0018,1164'), valueOf('0020,0060'), valueOf('0018,5101'), valueOf('0018,0015'), valueOf('0018,1114')]).toEqual([
      ['[0.139\\0.139]'],
      ['[L]'],
      ['[AP]'],
      ['[HIP]'],
      ['[1.15]'],
    ]);
    // pydicom's README of its test files: 0.661468 mm
    expect(valueOf('0028,0030')).toEqual(['[0.661468\\0.661468]']);
  });

  it('is no name in an attribute that is otherwise kept', async () => {
    const bytes = modified(
      'test_files/CT_small.dcm',
      '-i',
      '(0018,0015)=DOE JANE',
      '-i',
      '(0018,5101)=DOE',
      '-m',
      '(0008,0008)=ORIGINAL\\PRIMARY\\DOE JANE',
    );
    const { bytes: clean, removed } = await cleanDicom(bytes, newMap(), confirmed);
    expect(Buffer.from(clean).includes('DOE')).toBe(false);
    expect(removed).toContainEqual({ place: '(0018,0015)', name: 'Body Part Examined', action: 'removed', was: 'DOE JANE' });
    expect(dumped(clean)('0008,0008')).toEqual(['[ORIGINAL\\PRIMARY]']);
  });
});

describe('what is removed', () => {
  it('is told tag by tag, inside sequences too', async () => {
    const bytes = modified(
      'test_files/MR_small.dcm',
      ...['-m', '(0010,0010)=Planted^Name', '-i', '(0008,1140)[0].(0008,1155)=1.2.3.4', '-i', '(0040,0275)[0].(0040,0007)=hip of Planted'],
    );
    const { bytes: clean, removed } = await cleanDicom(bytes, newMap(), confirmed);
    expect(removed).toContainEqual({ place: '(0010,0010)', name: "Patient's Name", action: 'emptied', was: 'Planted^Name' });
    expect(removed).toContainEqual({ place: '(0008,1140) (0008,1155)', name: 'Referenced SOPInstance UID', action: 'removed', was: '1.2.3.4' });
    expect(removed).toContainEqual(expect.objectContaining({ place: '(0040,0275) (0040,0007)', was: 'hip of Planted' }));
    expect(Buffer.from(clean).includes('Planted')).toBe(false);
  });

  // the names that pydicom's FileInfo.txt of its files in other scripts gives
  it.each([
    ['charset_files/chrFren.dcm', 'Buc^Jérôme'],
    ['charset_files/chrGerm.dcm', 'Äneas^Rüdiger'],
    ['charset_files/chrRuss.dcm', 'Люкceмбypг'],
    ['charset_files/chrGreek.dcm', 'Διονυσιος'],
    ['charset_files/chrX1.dcm', 'Wang^XiaoDong=王^小東'],
  ])('is shown in its own script: %s', async (name, was) => {
    const { removed } = await cleanDicom(dicomSample(name), newMap(), confirmed);
    expect(removed.find(({ place }) => place === '(0010,0010)')?.was.startsWith(was)).toBe(true);
  });

  it('are preamble, private attributes, overlays and what stands after the picture', async () => {
    const bytes = modified('test_files/MR_small.dcm', '-i', '(0029,0010)=PLANTED', '-i', '(6000,0022)=PLANTED', '-i', '(6000,3000)=0\\1\\2');
    bytes.set(new TextEncoder().encode('PLANTED'), 0);
    const { bytes: clean, removed } = await cleanDicom(bytes, newMap(), confirmed);
    expect(removed.map(({ place }) => place)).toEqual(expect.arrayContaining(['preamble', '(0029,0010)', '(6000,3000)']));
    expect(Buffer.from(clean).includes('PLANTED')).toBe(false);
  });

  it('is the padding of files that are written so that they fill whole blocks', async () => {
    const { bytes, removed } = await cleanDicom(dicomSample('test_files/MR_small_padded.dcm'), newMap(), confirmed);
    expect(removed.map(({ place }) => place)).toContain('(FFFC,FFFC)');
    expect(dumped(bytes)('fffc,fffc')).toEqual([]);
  });

  it('is an overlay that lies in unused bits of the samples', async () => {
    // 12 of 16 bits stored, an overlay said to lie in bit 15 (PS3.3-2003 C.9.2), that bit set in the first sample
    const bytes = modified('test_files/MR_small.dcm', '-m', '(0028,0101)=12', '-m', '(0028,0102)=11', '-i', '(6000,0100)=16', '-i', '(6000,0102)=15');
    const at = bytes.length - 64 * 64 * 2;
    bytes[at + 1] = bytes[at + 1]! | 0x80;
    const { bytes: clean, removed } = await cleanDicom(bytes, newMap(), confirmed);
    expect(removed).toContainEqual({ place: '(7FE0,0010)', name: 'overlay in unused bits', action: 'blanked', was: '' });
    expect(clean[clean.length - 64 * 64 * 2 + 1]! & 0xf0).toBe(0);
  });
});

describe('what a packed picture says of itself', () => {
  it('is removed from JPEG', async () => {
    const sample = Buffer.from(dicomSample('test_files/SC_rgb_small_odd_jpeg.dcm'));
    const start = sample.lastIndexOf(Buffer.from('ffd8ff', 'hex'));
    // ITU-T T.81 B.2.4.5: a comment; the piece's length, which stands before it, grows with it
    const comment = Buffer.from('\xff\xfe\x00\x0ePlanted Name', 'latin1');
    const planted = Buffer.concat([sample.subarray(0, start + 2), comment, sample.subarray(start + 2)]);
    planted.writeUInt32LE(planted.readUInt32LE(start - 4) + comment.length, start - 4);
    const { bytes, removed } = await cleanDicom(new Uint8Array(planted), newMap(), confirmed);
    expect(removed).toContainEqual({ place: '(7FE0,0010)', name: 'COM (comment)', action: 'removed', was: '' });
    expect(Buffer.from(bytes).includes('Planted')).toBe(false);
  });

  it('is blanked in JPEG 2000', async () => {
    const sample = dicomSample('test_files/JPEG2000.dcm');
    const { bytes, removed } = await cleanDicom(sample, newMap(), confirmed);
    expect(removed).toContainEqual({ place: '(7FE0,0010)', name: 'COM (comment)', action: 'blanked', was: '' });
    expect([Buffer.from(sample).includes('Kakadu'), Buffer.from(bytes).includes('Kakadu')]).toEqual([true, false]);
  });
});

describe('UIDs', () => {
  it('are new, and the same for the same in all files of one upload', async () => {
    const map = newMap();
    const slices = ['4467', '4528', '4558'].map((name) => dicomSample(`test_files/dicomdirtests/98892003/MR700/${name}`));
    const clean: ReturnType<typeof dumped>[] = [];
    for (const slice of slices) clean.push(dumped((await cleanDicom(slice, map, confirmed)).bytes));
    const distinct = (tag: string) => new Set(clean.flatMap((valueOf) => valueOf(tag)));
    expect([distinct('0020,000d').size, distinct('0020,000e').size, distinct('0008,0018').size]).toEqual([1, 1, 3]);
  });

  it('differ from upload to upload, so that nobody can find the file again by them', async () => {
    const twice = [
      await cleanDicom(dicomSample('test_files/CT_small.dcm'), newMap(), confirmed),
      await cleanDicom(dicomSample('test_files/CT_small.dcm'), newMap(), confirmed),
    ];
    expect(new Set(twice.flatMap(({ bytes }) => dumped(bytes)('0020,000d'))).size).toBe(2);
  });
});

it('says that there is no text in the picture only where a person looked', async () => {
  const bytes = modified('test_files/CT_small.dcm', '-i', '(0028,0301)=YES');
  const open = await cleanDicom(bytes, newMap(), { pixelsConfirmed: false });
  expect(open.burnedIn).toBe('YES');
  expect(dumped(open.bytes)('0028,0301')).toEqual([]);
  expect(dumped(open.bytes)('0008,0100')).toEqual(['[113100]']);
  expect(dumped((await cleanDicom(bytes, newMap(), confirmed)).bytes)('0028,0301')).toEqual(['[NO]']);
});

describe('hostile files', () => {
  const clean = (bytes: Uint8Array<ArrayBuffer>) => cleanDicom(bytes, newMap(), confirmed);

  it('that unpack without end are refused early', async () => {
    const sample = dicomSample('test_files/image_dfl.dcm');
    // the group length of the head (PS3.10 7.1) says where the packed part begins
    const head = sample.subarray(0, 144 + new DataView(sample.buffer).getUint32(140, true));
    const bomb = deflateRawSync(Buffer.alloc(160 * 1024 * 1024));
    const began = performance.now();
    await expect(clean(new Uint8Array(Buffer.concat([head, bomb])))).rejects.toThrow(/unpacks to more than 128 MB/);
    expect(performance.now() - began).toBeLessThan(5000);
  }, 30_000);

  it.each([
    ['a million frames', ['-i', '(0028,0008)=999999'], /says that it holds 999999 pictures/],
    ['minus one frame', ['-i', '(0028,0008)=-1'], /names no number of pictures/],
    ['huge dimensions', ['-m', '(0028,0010)=65535', '-m', '(0028,0011)=65535'], /more than 60 million pixels/],
    ['more rows than samples', ['-m', '(0028,0010)=65'], /is cut off: 8320 bytes belong to the picture, and 8192 are there/],
    ['a PDF inside', ['-m', '(0008,0016)=1.2.840.10008.5.1.4.1.1.104.1'], /a PDF document/],
    ['one-bit samples', ['-m', '(0028,0100)=1'], /1 samples of 1 bits are not read/],
  ])('%s', async (_, changes, reason) => {
    await expect(clean(modified('test_files/MR_small.dcm', ...changes))).rejects.toThrow(reason);
  });

  it('with sequences nested too deeply', async () => {
    // (0040,0275) of undefined length, an item in it, and so on
    const level = Buffer.from('4000750253510000fffffffffeff00e0ffffffff', 'hex');
    const sample = dicomSample('test_files/MR_small.dcm');
    const head = Buffer.from(sample).indexOf(Buffer.from('08000800', 'hex'));
    const nested = Buffer.concat([sample.subarray(0, head), ...Array.from({ length: 50_000 }, () => level)]);
    await expect(clean(new Uint8Array(nested))).rejects.toThrow(/nests more than 16 sequences/);
  });
});
