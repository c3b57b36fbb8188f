import { ByteReader } from './byte-reader.js';
import type { FilePart } from './file-parts.js';
import { FileRefusal } from './file-refusal.js';
import { MOST_PARTS } from './limits.js';
import type { SizedParts } from './png-parts.js';

const HEAD = 12;
const NEEDED = new Set(['VP8 ', 'VP8L', 'ALPH']);
const NAMES: Record<string, string> = { EXIF: 'EXIF', 'XMP ': 'XMP', ICCP: 'ICCP (colour profile)' };
/** RFC 9649 2.7: the flag of an alpha channel; the others announce profiles, EXIF, XMP and films. */
const ALPHA = 0x10;

/**
 * The chunks of a WebP file (RFC 9649). The head's length and the announced extras are written anew.
 * Throws FileRefusal where it is none, is cut off, or is a film.
 */
export function webpParts(bytes: Uint8Array): SizedParts {
  const reader = new ByteReader(bytes);
  if (bytes.length < 20 || reader.latin(0, 4) !== 'RIFF' || reader.latin(8, 12) !== 'WEBP')
    throw new FileRefusal('broken', 'The WebP picture is broken: it does not begin as one.');
  const stop = 8 + reader.u32(4);
  if (stop > bytes.length) throw new FileRefusal('cut-off', 'The WebP picture is cut off: a part of it is missing.');
  const found: SizedParts = { parts: [], width: 0, height: 0, exif: null };
  let at = HEAD;
  while (at + 8 <= stop) {
    if (found.parts.length > MOST_PARTS) throw new FileRefusal('too-large', `The WebP picture has more than ${MOST_PARTS} parts.`);
    at = addChunk(found, reader, at, stop);
  }
  if (at < bytes.length) found.parts.push({ name: 'bytes after the end of the picture', at, end: bytes.length, clean: 'drop' });
  if (found.width === 0) throw new FileRefusal('no-picture', 'The WebP file holds no picture.');
  return { ...found, parts: [head(reader.bytes, found.parts), ...found.parts] };
}

function addChunk(found: SizedParts, reader: ByteReader, at: number, stop: number): number {
  const type = reader.latin(at, at + 4);
  const length = reader.u32(at + 4);
  if (at + 8 + length > stop) throw new FileRefusal('cut-off', 'The WebP picture is cut off: a part of it is missing.');
  const end = Math.min(stop, at + 8 + length + (length % 2));
  if (type === 'ANIM' || type === 'ANMF')
    throw new FileRefusal('several-pictures', 'The WebP file holds several pictures; save the one that is needed.');
  if (type === 'EXIF') found.exif = exifOf(reader, at + 8, at + 8 + length);
  readSize(found, reader, type, at + 8, length);
  const isSecond = found.parts.some(({ name }) => name === type);
  const clean = type === 'VP8X' ? plainFlags(reader, at, end) : NEEDED.has(type) && !isSecond ? 'keep' : 'drop';
  found.parts.push({ name: NAMES[type] ?? type.replace(/[^ -~]/g, '?').trim(), at, end, clean });
  return end;
}

/** Some writers put JPEG's mark before the EXIF data. */
function exifOf(reader: ByteReader, at: number, end: number): { at: number; end: number } {
  return end - at > 6 && reader.latin(at, at + 4) === 'Exif' ? { at: at + 6, end } : { at, end };
}

function plainFlags(reader: ByteReader, at: number, end: number): FilePart['clean'] {
  if (end - at !== 18) throw new FileRefusal('broken', 'The WebP picture is broken: its head has a wrong length.');
  const flags = reader.u8(at + 8);
  const reserved = reader.u8(at + 9) | reader.u8(at + 10) | reader.u8(at + 11);
  if ((flags & ~ALPHA) === 0 && reserved === 0) return 'keep';
  const copy = reader.span(at, end).slice();
  copy.set([flags & ALPHA, 0, 0, 0], 8);
  return copy;
}

function readSize(found: SizedParts, reader: ByteReader, type: string, at: number, length: number): void {
  if (type === 'VP8X' && length >= 10) [found.width, found.height] = [1 + u24(reader, at + 4), 1 + u24(reader, at + 7)];
  // RFC 6386 9.1 and RFC 9649 3.4: 14 bits each
  else if (type === 'VP8 ' && length >= 10) [found.width, found.height] = [reader.u16(at + 6) & 0x3fff, reader.u16(at + 8) & 0x3fff];
  else if (type === 'VP8L' && length >= 5) {
    const bits = reader.u32(at + 1);
    [found.width, found.height] = [1 + (bits & 0x3fff), 1 + ((bits >>> 14) & 0x3fff)];
  }
}

const u24 = (reader: ByteReader, at: number) => reader.u16(at) + reader.u8(at + 2) * 0x10000;

function head(bytes: Uint8Array, parts: FilePart[]): FilePart {
  const length = parts.reduce((sum, { at, end, clean }) => sum + (clean === 'drop' ? 0 : clean === 'keep' ? end - at : clean.length), 4);
  const copy = bytes.slice(0, HEAD);
  new DataView(copy.buffer).setUint32(4, length, true);
  const isSame = copy.every((byte, i) => byte === bytes[i]);
  return { name: 'RIFF', at: 0, end: HEAD, clean: isSame ? 'keep' : copy };
}
