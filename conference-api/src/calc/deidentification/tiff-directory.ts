import { ByteReader } from './byte-reader.js';
import { FileRefusal } from './file-refusal.js';

/** One entry of a TIFF directory (TIFF 6.0 section 2). */
export interface TiffEntry {
  tag: number;
  type: number;
  count: number;
  /** Where its values lie, in the entry itself where they fit. */
  at: number;
  end: number;
}

export interface TiffDirectory {
  /** Where the directory itself begins and ends. */
  at: number;
  end: number;
  entries: TiffEntry[];
  next: number;
}

/** Bytes a value of each type takes; 0 stands for a type that the standard does not know. */
const WIDTHS = [0, 1, 1, 2, 4, 8, 1, 1, 2, 4, 8, 4, 8, 4];
const MOST_ENTRIES = 4096;

/** A reader in the file's own byte order. Throws FileRefusal where the bytes don't begin as TIFF. */
export function tiffReader(bytes: Uint8Array): ByteReader {
  if (bytes.length < 8) throw new FileRefusal('cut-off', 'The TIFF data are cut off.');
  const order = new ByteReader(bytes).latin(0, 2);
  const reader = new ByteReader(bytes, order === 'MM');
  if (!['II', 'MM'].includes(order) || reader.u16(2) !== 42) throw new FileRefusal('broken', 'The TIFF data are broken: they do not begin as such.');
  return reader;
}

/** The directory at `at`; entries of unknown types are left out. Throws FileRefusal where it overruns the bytes. */
export function tiffDirectory(reader: ByteReader, at: number): TiffDirectory {
  const count = reader.u16(at);
  if (count > MOST_ENTRIES) throw new FileRefusal('too-large', `The TIFF data have more than ${MOST_ENTRIES} entries.`);
  const end = at + 2 + count * 12 + 4;
  reader.need(at, end - at);
  const entries: TiffEntry[] = [];
  for (let i = 0; i < count; i++) {
    const entry = readEntry(reader, at + 2 + i * 12);
    if (entry) entries.push(entry);
  }
  return { at, end, entries, next: reader.u32(end - 4) };
}

function readEntry(reader: ByteReader, at: number): TiffEntry | null {
  const type = reader.u16(at + 2);
  const count = reader.u32(at + 4);
  const length = (WIDTHS[type] ?? 0) * count;
  if (length === 0) return null;
  const value = length <= 4 ? at + 8 : reader.u32(at + 8);
  reader.need(value, length);
  return { tag: reader.u16(at), type, count, at: value, end: value + length };
}

/** Whole numbers of an entry (types BYTE, SHORT, LONG), at most `most`. */
export function tiffNumbers(reader: ByteReader, { type, count, at }: TiffEntry, most = 1_000_000): number[] {
  if (count > most) throw new FileRefusal('too-large', 'The TIFF data have more strips than are taken.');
  const width = WIDTHS[type]!;
  const numbers: number[] = [];
  for (let i = 0; i < count; i++)
    numbers.push(type === 3 ? reader.u16(at + i * width) : type === 4 ? reader.u32(at + i * width) : reader.u8(at + i * width));
  return numbers;
}
