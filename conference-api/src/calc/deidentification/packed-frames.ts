import { ByteReader } from './byte-reader.js';
import type { DicomElement } from './dicom-elements.js';
import { FileRefusal } from './file-refusal.js';

type Piece = { at: number; end: number };

/**
 * The packed bytes of each picture, in order. A picture may lie in several pieces (PS3.5 A.4); the offset
 * table tells which, or the number of pieces, or the mark with which each packed picture begins.
 * Throws FileRefusal where neither does.
 */
export function packedFrames(bytes: Uint8Array, element: DicomElement, frames: number): Uint8Array[] {
  const [table, ...pieces] = element.pieces ?? [];
  if (!table || pieces.length === 0) throw new FileRefusal('no-picture', 'The DICOM file holds no picture: there are no pieces of one.');
  if (frames === 1) return [joined(bytes, pieces)];
  if (pieces.length === frames) return pieces.map((piece) => joined(bytes, [piece]));
  const groups = byTable(bytes, table, pieces, frames) ?? byMark(bytes, pieces);
  if (groups.length === frames) return groups.map((group) => joined(bytes, group));
  throw new FileRefusal('broken', `The DICOM file is broken: it says that it holds ${frames} pictures, and ${groups.length} are found.`);
}

function byTable(bytes: Uint8Array, table: Piece, pieces: Piece[], frames: number): Piece[][] | null {
  if (table.end - table.at !== frames * 4) return null;
  const reader = new ByteReader(bytes);
  // offsets count from the head of the first piece
  const origin = pieces[0]!.at - 8;
  const starts = new Set<number>();
  for (let at = table.at; at < table.end; at += 4) starts.add(origin + reader.u32(at));
  const groups = grouped(pieces, (piece) => starts.has(piece.at - 8));
  return groups.length === frames ? groups : null;
}

/** JPEG and JPEG-LS begin with FFD8, JPEG 2000 with FF4F. */
const byMark = (bytes: Uint8Array, pieces: Piece[]): Piece[][] =>
  grouped(pieces, ({ at, end }) => end - at >= 2 && bytes[at] === 0xff && (bytes[at + 1] === 0xd8 || bytes[at + 1] === 0x4f));

function grouped(pieces: Piece[], begins: (piece: Piece) => boolean): Piece[][] {
  const groups: Piece[][] = [];
  for (const piece of pieces) {
    if (groups.length === 0 || begins(piece)) groups.push([piece]);
    else groups.at(-1)!.push(piece);
  }
  return groups;
}

function joined(bytes: Uint8Array, pieces: Piece[]): Uint8Array {
  if (pieces.length === 1) return bytes.subarray(pieces[0]!.at, pieces[0]!.end);
  const whole = new Uint8Array(pieces.reduce((sum, { at, end }) => sum + end - at, 0));
  let to = 0;
  for (const { at, end } of pieces) {
    whole.set(bytes.subarray(at, end), to);
    to += end - at;
  }
  return whole;
}
