import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { basename, join } from 'node:path';

/** The sample files of Debian's python3-pydicom, by name: nobody of this project wrote them. */
export function dicomSamples(): Map<string, Buffer> {
  let listed: string;
  try {
    listed = execFileSync('dpkg', ['-L', 'python3-pydicom'], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });
  } catch {
    throw new Error('these tests read the sample files of the Debian package python3-pydicom: install it with apt-get install python3-pydicom');
  }
  const paths = listed.split('\n').filter((path) => /\/test_files\/[^/]+\.dcm$/.test(path));
  return new Map(paths.map((path) => [basename(path), readFileSync(path)]));
}

export interface Raster {
  width: number;
  height: number;
  channels: number;
  data: Buffer;
}

/** What dcmtk shows of a file, read back from the PNM that its `dcmj2pnm` writes. */
export function renderedByDcmtk(file: Buffer, window: 'first-in-file' | 'min-max'): Raster {
  const folder = mkdtempSync(join(tmpdir(), 'kerfside-dcmtk-'));
  const [from, to] = [join(folder, 'in.dcm'), join(folder, 'out.pnm')];
  try {
    writeFileSync(from, file);
    const options = window === 'min-max' ? ['+Wm'] : ['+Wi', '1'];
    execFileSync('dcmj2pnm', ['-q', ...options, '--write-raw-pnm', from, to], { stdio: 'pipe' });
    return readPnm(readFileSync(to));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function readPnm(bytes: Buffer): Raster {
  const head = /^P([56])\s+(?:#[^\n]*\n)*(\d+)\s+(\d+)\s+255\s/.exec(bytes.toString('latin1', 0, 200));
  if (!head) throw new Error('not a PNM of 8 bits');
  return { channels: head[1] === '5' ? 1 : 3, width: Number(head[2]), height: Number(head[3]), data: bytes.subarray(head[0].length) };
}

export const EXPLICIT_LITTLE = '1.2.840.10008.1.2.1';
const LONG_VRS = ['OB', 'OW', 'SQ', 'UN', 'UT'];

/** One element, explicit VR little endian (PS3.5 section 7.1.2). */
export function element(group: number, number: number, vr: string, value: string | number | Buffer): Buffer {
  let bytes = Buffer.isBuffer(value) ? value : typeof value === 'number' ? u16(value) : Buffer.from(value, 'latin1');
  if (bytes.length % 2) bytes = Buffer.concat([bytes, Buffer.from(vr === 'UI' || vr === 'OB' ? [0] : [0x20])]);
  const head = Buffer.concat([u16(group), u16(number), Buffer.from(vr, 'latin1')]);
  return Buffer.concat([head, LONG_VRS.includes(vr) ? Buffer.concat([u16(0), u32(bytes.length)]) : u16(bytes.length), bytes]);
}

export const u16 = (value: number) => {
  const bytes = Buffer.alloc(2);
  bytes.writeUInt16LE(value);
  return bytes;
};

export const u32 = (value: number) => {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32LE(value);
  return bytes;
};

export interface DicomPicture {
  rows: number;
  columns: number;
  /** 16-bit words, row by row. */
  pixels: number[];
  photometric?: 'MONOCHROME1' | 'MONOCHROME2';
  window?: { centre: number; width: number };
  spacing?: string;
  frames?: number;
  syntax?: string;
  /** Elements before the picture's, in ascending order. */
  before?: Buffer[];
}

/** Preamble, prefix and file meta information (PS3.10 section 7.1), then a data set. */
export function dicomFile(dataSet: Buffer, syntax = EXPLICIT_LITTLE): Buffer {
  const meta = Buffer.concat([element(2, 2, 'UI', '1.2.840.10008.5.1.4.1.1.7'), element(2, 3, 'UI', '2.25.1'), element(2, 0x10, 'UI', syntax)]);
  return Buffer.concat([Buffer.alloc(128), Buffer.from('DICM'), element(2, 0, 'UL', u32(meta.length)), meta, dataSet]);
}

/** The data set of a 12-bit grey picture, written by hand from PS3.5 so that no library is on both sides. */
export function pictureDataSet(picture: DicomPicture): Buffer {
  const { window } = picture;
  return Buffer.concat([
    ...(picture.before ?? []),
    element(0x28, 2, 'US', 1),
    element(0x28, 4, 'CS', picture.photometric ?? 'MONOCHROME2'),
    ...(picture.frames ? [element(0x28, 8, 'IS', String(picture.frames))] : []),
    element(0x28, 0x10, 'US', picture.rows),
    element(0x28, 0x11, 'US', picture.columns),
    ...(picture.spacing ? [element(0x28, 0x30, 'DS', picture.spacing)] : []),
    element(0x28, 0x100, 'US', 16),
    element(0x28, 0x101, 'US', 12),
    element(0x28, 0x102, 'US', 11),
    element(0x28, 0x103, 'US', 0),
    ...(window ? [element(0x28, 0x1050, 'DS', String(window.centre)), element(0x28, 0x1051, 'DS', String(window.width))] : []),
    element(0x7fe0, 0x10, 'OW', Buffer.concat(picture.pixels.map(u16))),
  ]);
}

export const dicomPicture = (picture: DicomPicture): Buffer => dicomFile(pictureDataSet(picture), picture.syntax);
