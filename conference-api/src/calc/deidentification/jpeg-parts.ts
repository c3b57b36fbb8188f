import { ByteReader } from './byte-reader.js';
import type { FilePart } from './file-parts.js';
import { FileRefusal } from './file-refusal.js';
import { MOST_PARTS } from './limits.js';

export interface JpegParts {
  parts: FilePart[];
  width: number;
  height: number;
  /** Where the EXIF data begin, if there are some. */
  exif: { at: number; end: number } | null;
}

const SOI = 0xd8;
const EOI = 0xd9;
const SOS = 0xda;
const COMMENT = 0xfe;
// ITU-T T.81 table B.1 and T.87 C.1: what a decoder needs. SOF0-15 without DHT, JPG, DAC; then DHT, DAC, DQT, DNL, DRI, DHP, EXP, SOF55, LSE
const FRAMES = new Set([0xc0, 0xc1, 0xc2, 0xc3, 0xc5, 0xc6, 0xc7, 0xc9, 0xca, 0xcb, 0xcd, 0xce, 0xcf, 0xf7]);
const NEEDED = new Set([...FRAMES, SOS, 0xc4, 0xcc, 0xdb, 0xdc, 0xdd, 0xde, 0xdf, 0xf8]);

/**
 * The segments of a JPEG or JPEG-LS file. Kept are those that a decoder needs and three that change how
 * colours are read, of one exact length each so that nothing else fits: JFIF without a thumbnail, Adobe's
 * colour transform, and JPEG-LS's (APP8 'mrfx'). All work is linear in the number of bytes.
 * Throws FileRefusal where the file is none, or is cut off.
 */
export function jpegParts(bytes: Uint8Array): JpegParts {
  const reader = new ByteReader(bytes);
  if (bytes.length < 4 || reader.u16be(0) !== 0xffd8) throw new FileRefusal('broken', 'The JPEG picture is broken: it does not begin as one.');
  const found: JpegParts = { parts: [{ name: 'SOI', at: 0, end: 2, clean: 'keep' }], width: 0, height: 0, exif: null };
  let at = 2;
  while (found.parts.length < MOST_PARTS) {
    const marker = markerAt(reader, at);
    if (marker.code === EOI) return closed(found, bytes, at, marker.value);
    if (marker.code === SOI || marker.code < 0xc0)
      throw new FileRefusal('broken', `The JPEG picture is broken: the mark FF${hex(marker.code)} stands in a wrong place.`);
    const end = marker.value + segmentLength(reader, marker.value);
    readSize(found, reader, marker.code, marker.value);
    const stop = marker.code === SOS ? scanEnd(bytes, end) : end;
    addSegment(found, reader, marker.code, at, marker.value, stop);
    at = stop;
  }
  throw new FileRefusal('too-large', `The JPEG picture has more than ${MOST_PARTS} parts.`);
}

function closed(found: JpegParts, bytes: Uint8Array, at: number, end: number): JpegParts {
  if (found.width === 0 || !found.parts.some(({ name }) => name === 'SOS')) throw new FileRefusal('no-picture', 'The JPEG file holds no picture.');
  found.parts.push({ name: 'EOI', at, end, clean: 'keep' });
  if (end < bytes.length) found.parts.push({ name: 'bytes after the end of the picture', at: end, end: bytes.length, clean: 'drop' });
  return found;
}

/** Fill bytes may stand before a mark. */
function markerAt(reader: ByteReader, at: number): { code: number; value: number } {
  if (reader.u8(at) !== 0xff) throw new FileRefusal('broken', 'The JPEG picture is broken: a part does not begin with a mark.');
  let next = at + 1;
  while (reader.u8(next) === 0xff) next++;
  return { code: reader.u8(next), value: next + 1 };
}

function segmentLength(reader: ByteReader, at: number): number {
  const length = reader.u16be(at);
  if (length < 2) throw new FileRefusal('broken', 'The JPEG picture is broken: a part has no length.');
  reader.need(at, length);
  return length;
}

/** The packed samples end at the first mark that is neither a stuffed byte nor a restart. */
function scanEnd(bytes: Uint8Array, from: number): number {
  let at = from;
  for (;;) {
    at = bytes.indexOf(0xff, at);
    if (at < 0 || at + 1 >= bytes.length) throw new FileRefusal('cut-off', 'The JPEG picture is cut off: a part of it is missing.');
    const next = bytes[at + 1]!;
    // T.87 stuffs a bit, so there any byte below 80 belongs to the samples
    if (next >= 0x80 && next !== 0xff && !(next >= 0xd0 && next <= 0xd7)) return at;
    at += next === 0xff ? 1 : 2;
  }
}

function readSize(found: JpegParts, reader: ByteReader, code: number, at: number): void {
  if (!FRAMES.has(code)) return;
  found.height = reader.u16be(at + 3);
  found.width = reader.u16be(at + 5);
}

function addSegment(found: JpegParts, reader: ByteReader, code: number, at: number, value: number, end: number): void {
  const name = nameOf(reader, code, value, end);
  if (name === 'APP1 (EXIF)' && !found.exif) found.exif = { at: value + 8, end };
  // fill bytes before a kept mark are left out with it: nobody needs them
  const exact = value - at === 2;
  const keep = (NEEDED.has(code) || KEPT_APPLICATION.has(name)) && exact;
  found.parts.push({ name, at, end, clean: keep ? 'keep' : NEEDED.has(code) ? reader.span(value - 2, end) : 'drop' });
}

const KEPT_APPLICATION = new Set(['APP0 (JFIF)', 'APP14 (Adobe colours)', 'APP8 (JPEG-LS colours)']);

function nameOf(reader: ByteReader, code: number, value: number, end: number): string {
  if (code === SOS) return 'SOS';
  if (code === COMMENT) return 'COM (comment)';
  if (code < 0xe0 || code > 0xef) return `FF${hex(code)}`;
  const text = reader.latin(value + 2, Math.min(end, value + 40));
  const known = APPLICATION.find((row) => row.app === code - 0xe0 && text.startsWith(row.start) && (row.length === 0 || end - value === row.length));
  const noThumbnail = known?.name !== 'JFIF' || (reader.u8(end - 1) === 0 && reader.u8(end - 2) === 0);
  return known && noThumbnail ? `APP${known.app} (${known.name})` : `APP${code - 0xe0}`;
}

/** Applications' own segments by their first characters, and their exact length where they are kept. */
const APPLICATION = [
  { app: 0, start: 'JFIF\0', name: 'JFIF', length: 16 },
  { app: 0, start: 'JFIF\0', name: 'JFIF with a thumbnail', length: 0 },
  { app: 0, start: 'JFXX\0', name: 'thumbnail', length: 0 },
  { app: 1, start: 'Exif\0', name: 'EXIF', length: 0 },
  { app: 1, start: 'http://ns.adobe.com/xap/1.0/\0', name: 'XMP', length: 0 },
  { app: 1, start: 'http://ns.adobe.com/xmp/extension/', name: 'XMP', length: 0 },
  { app: 2, start: 'ICC_PROFILE\0', name: 'colour profile', length: 0 },
  { app: 2, start: 'MPF\0', name: 'more pictures', length: 0 },
  { app: 8, start: 'mrfx', name: 'JPEG-LS colours', length: 7 },
  { app: 13, start: 'Photoshop 3.0\0', name: 'IPTC', length: 0 },
  { app: 14, start: 'Adobe', name: 'Adobe colours', length: 14 },
];

const hex = (code: number) => code.toString(16).toUpperCase().padStart(2, '0');
