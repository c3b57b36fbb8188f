import { ByteReader } from './byte-reader.js';
import type { FilePart } from './file-parts.js';
import { FileRefusal } from './file-refusal.js';
import { MOST_PARTS } from './limits.js';

export interface SizedParts {
  parts: FilePart[];
  width: number;
  height: number;
  exif: { at: number; end: number } | null;
}

const SIGNATURE = '\x89PNG\r\n\x1a\n';
/** PNG third edition 4.7: what makes the pixels and their colours; text, times, EXIF, profiles and films are not among them. */
const NEEDED = new Set(['IHDR', 'PLTE', 'IDAT', 'IEND', 'tRNS', 'gAMA', 'cHRM', 'sRGB', 'sBIT', 'bKGD', 'pHYs']);
const NAMES: Record<string, string> = {
  tEXt: 'tEXt (text)',
  zTXt: 'zTXt (packed text)',
  iTXt: 'iTXt (text, also XMP)',
  eXIf: 'eXIf (EXIF)',
  tIME: 'tIME (time of change)',
  iCCP: 'iCCP (colour profile)',
};
/** A chunk that is kept beside the pixels is not longer: no palette or colour value needs more. */
const LONGEST_SMALL = 1024;

/** The chunks of a PNG file. Throws FileRefusal where it is none, or is cut off. */
export function pngParts(bytes: Uint8Array): SizedParts {
  const reader = new ByteReader(bytes);
  if (bytes.length < 33 || reader.latin(0, 8) !== SIGNATURE || reader.latin(12, 16) !== 'IHDR')
    throw new FileRefusal(bytes.length < 33 ? 'cut-off' : 'broken', 'The PNG picture is broken or cut off: it does not begin as one.');
  const found: SizedParts = {
    parts: [{ name: 'signature', at: 0, end: 8, clean: 'keep' }],
    width: reader.u32be(16),
    height: reader.u32be(20),
    exif: null,
  };
  let at = 8;
  while (found.parts.length < MOST_PARTS) {
    const end = at + 12 + reader.u32be(at);
    reader.need(at, end - at);
    const type = reader.latin(at + 4, at + 8);
    addChunk(found, type, at, end);
    at = end;
    if (type === 'IEND') return closed(found, bytes, at);
  }
  throw new FileRefusal('too-large', `The PNG picture has more than ${MOST_PARTS} parts.`);
}

function addChunk(found: SizedParts, type: string, at: number, end: number): void {
  if (!/^[A-Za-z]{4}$/.test(type)) throw new FileRefusal('broken', 'The PNG picture is broken: a part has no name.');
  if (type === 'eXIf') found.exif = { at: at + 8, end: end - 4 };
  const isSmall = type === 'IDAT' || end - at - 12 <= LONGEST_SMALL;
  const isSecond = ['IHDR', 'PLTE'].includes(type) && found.parts.some(({ name }) => name === type);
  found.parts.push({ name: NAMES[type] ?? type, at, end, clean: NEEDED.has(type) && isSmall && !isSecond ? 'keep' : 'drop' });
}

function closed(found: SizedParts, bytes: Uint8Array, end: number): SizedParts {
  if (!found.parts.some(({ name }) => name === 'IDAT')) throw new FileRefusal('no-picture', 'The PNG file holds no picture.');
  if (end < bytes.length) found.parts.push({ name: 'bytes after the end of the picture', at: end, end: bytes.length, clean: 'drop' });
  return found;
}
