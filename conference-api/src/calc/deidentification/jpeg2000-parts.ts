import { ByteReader } from './byte-reader.js';
import type { FilePart } from './file-parts.js';
import { FileRefusal } from './file-refusal.js';
import { MOST_PARTS } from './limits.js';

export interface Jpeg2000Parts {
  parts: FilePart[];
  width: number;
  height: number;
}

const SOC = 0xff4f;
const SIZ = 0xff51;
const COM = 0xff64;
const SOT = 0xff90;
const SOD = 0xff93;
const EOC = 0xffd9;

/**
 * The parts of a JPEG 2000 picture. Of a JP2 file (ITU-T T.800 annex I), which has no place in DICOM but is
 * met there, only the codestream is kept.
 * Throws FileRefusal where there is none, or it is cut off.
 */
export function jpeg2000Parts(bytes: Uint8Array): Jpeg2000Parts {
  const reader = new ByteReader(bytes);
  if (bytes.length < 12 || reader.latin(4, 8) !== 'jP  ') return codestreamParts(bytes);
  const stream = codestreamBox(reader);
  const found = codestreamParts(bytes.subarray(stream.at, stream.end));
  const moved = found.parts.map((part) => ({ ...part, at: part.at + stream.at, end: part.end + stream.at }));
  const before: FilePart = { name: 'JP2 head with colour profile and text', at: 0, end: stream.at, clean: 'drop' };
  return { ...found, parts: [before, ...moved] };
}

function codestreamBox(reader: ByteReader): { at: number; end: number } {
  for (let at = 0, boxes = 0; boxes < MOST_PARTS; boxes++) {
    const length = reader.u32be(at);
    if (reader.latin(at + 4, at + 8) === 'jp2c') return { at: at + 8, end: length === 0 ? reader.length : Math.min(reader.length, at + length) };
    if (length < 8) throw broken('a part has no length');
    at += length;
  }
  throw broken('there is no codestream in it');
}

/** The marker segments of a codestream (T.800 annex A). Comments are blanked in place, since other parts count bytes across them. */
function codestreamParts(bytes: Uint8Array): Jpeg2000Parts {
  const reader = new ByteReader(bytes);
  if (bytes.length < 4 || reader.u16be(0) !== SOC) throw broken('it does not begin as a codestream');
  const found: Jpeg2000Parts = { parts: [{ name: 'SOC', at: 0, end: 2, clean: 'keep' }], width: 0, height: 0 };
  let at = 2;
  while (found.parts.length < MOST_PARTS) {
    const code = reader.u16be(at);
    if (code === EOC) return closed(found, bytes, at);
    if (code === SOT) at = addTile(found, reader, at);
    else at = addSegment(found, reader, at, code);
  }
  throw new FileRefusal('too-large', `The JPEG 2000 picture has more than ${MOST_PARTS} parts.`);
}

function closed(found: Jpeg2000Parts, bytes: Uint8Array, at: number): Jpeg2000Parts {
  if (!found.width) throw new FileRefusal('no-picture', 'The JPEG 2000 data hold no picture.');
  found.parts.push({ name: 'EOC', at, end: at + 2, clean: 'keep' });
  if (at + 2 < bytes.length) found.parts.push({ name: 'bytes after the end of the picture', at: at + 2, end: bytes.length, clean: 'drop' });
  return found;
}

function addSegment(found: Jpeg2000Parts, reader: ByteReader, at: number, code: number): number {
  if (code < 0xff00) throw broken('a part does not begin with a mark');
  const length = reader.u16be(at + 2);
  if (length < 2) throw broken('a part has no length');
  const end = at + 2 + length;
  reader.need(at, 2 + length);
  if (code === SIZ) {
    found.width = reader.u32be(at + 6) - reader.u32be(at + 14);
    found.height = reader.u32be(at + 10) - reader.u32be(at + 18);
  }
  const isBlank = code !== COM || reader.span(at + 4, end).every((byte) => byte === 0);
  found.parts.push({
    name: code === COM ? 'COM (comment)' : code.toString(16).toUpperCase(),
    at,
    end,
    clean: isBlank ? 'keep' : blanked(reader, at, end),
  });
  return end;
}

function blanked(reader: ByteReader, at: number, end: number): Uint8Array {
  const copy = reader.span(at, end).slice();
  copy.fill(0, 4);
  return copy;
}

/** A tile-part: its head's segments, then packed samples up to the length that it names (none: up to the end). */
function addTile(found: Jpeg2000Parts, reader: ByteReader, start: number): number {
  const length = reader.u32be(start + 6);
  const end = length === 0 ? lastEnd(reader) : start + length;
  if (end > reader.length || end < start + 14) throw new FileRefusal('cut-off', 'The JPEG 2000 picture is cut off: a part of it is missing.');
  let at = addSegment(found, reader, start, SOT);
  while (reader.u16be(at) !== SOD) {
    at = addSegment(found, reader, at, reader.u16be(at));
    if (at > end || found.parts.length >= MOST_PARTS) throw broken('a tile is longer than it says');
  }
  found.parts.push({ name: 'SOD', at, end, clean: 'keep' });
  return end;
}

function lastEnd(reader: ByteReader): number {
  for (let at = reader.length - 2; at > 0; at--) if (reader.u16be(at) === EOC) return at;
  throw new FileRefusal('cut-off', 'The JPEG 2000 picture is cut off: its end is missing.');
}

const broken = (what: string) => new FileRefusal('broken', `The JPEG 2000 picture is broken: ${what}.`);
