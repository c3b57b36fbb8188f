import type { ByteReader } from './byte-reader.js';
import { FileRefusal } from './file-refusal.js';
import { type TiffDirectory, tiffDirectory, type TiffEntry, tiffNumbers, tiffReader } from './tiff-directory.js';

export interface CleanTiff {
  bytes: Uint8Array;
  /** Entries that are left out. */
  dropped: TiffEntry[];
  width: number;
  height: number;
}

/** TIFF 6.0: what a decoder needs, all of it numbers; the way up (0112) stays, since browsers can't turn TIFF. */
const NEEDED = new Set([256, 257, 258, 259, 262, 266, 273, 274, 277, 278, 279, 282, 283, 284, 296, 317, 320, 322, 323, 324, 325, 338, 339]);
const WIDTH = 256;
const HEIGHT = 257;
const COMPRESSION = 259;
/** None, CCITT 2 to 4, LZW, Deflate (two numbers), PackBits. JPEG inside would bring parts of its own. */
const PACKINGS = new Set([1, 2, 3, 4, 5, 8, 32946, 32773]);
const STRIPS = [273, 279] as const;
const TILES = [324, 325] as const;
const MOST_STRIPS = 200_000;
/** Values of an entry that is kept, in bytes: a colour map of 16 bits has 393 216. */
const LONGEST_VALUE = 400_000;
const SHORT_OR_LONG = new Set([3, 4]);

/**
 * The first picture of a TIFF file, written anew with what a decoder needs: head, samples, values, directory.
 * A file that was written so comes out the same, byte for byte.
 * Throws FileRefusal where the file is broken, cut off, or holds several pictures.
 */
export function cleanTiff(bytes: Uint8Array): CleanTiff {
  const reader = tiffReader(bytes);
  const directory = tiffDirectory(reader, reader.u32(4));
  if (directory.next !== 0) throw new FileRefusal('several-pictures', 'The TIFF file holds several pictures; save the one that is needed.');
  checkPacking(reader, directory);
  const strips = stripsOf(reader, directory);
  const kept = directory.entries.filter(isKept).sort((a, b) => a.tag - b.tag);
  if (new Set(kept.map(({ tag }) => tag)).size !== kept.length) throw new FileRefusal('broken', 'The TIFF file is broken: it names one thing twice.');
  return {
    bytes: new TiffWriter(reader, kept, strips).write(),
    dropped: directory.entries.filter((entry) => !isKept(entry)),
    width: firstOf(reader, directory, WIDTH),
    height: firstOf(reader, directory, HEIGHT),
  };
}

const isKept = ({ tag, at, end }: TiffEntry) => NEEDED.has(tag) && (isStrips(tag) || end - at <= LONGEST_VALUE);
const isStrips = (tag: number) => [...STRIPS, ...TILES].includes(tag as never);

function firstOf(reader: ByteReader, { entries }: TiffDirectory, tag: number): number {
  const entry = entries.find((other) => other.tag === tag);
  return entry && SHORT_OR_LONG.has(entry.type) ? tiffNumbers(reader, entry)[0]! : 0;
}

function checkPacking(reader: ByteReader, directory: TiffDirectory): void {
  const packing = firstOf(reader, directory, COMPRESSION) || 1;
  if (!PACKINGS.has(packing)) throw new FileRefusal('not-read', `TIFF packed in the way ${packing} is not read here. Save the picture as PNG.`);
}

function stripsOf(reader: ByteReader, { entries }: TiffDirectory): Uint8Array[] {
  const [offsets, lengths] = (entries.some(({ tag }) => tag === TILES[0]) ? TILES : STRIPS).map((tag) => {
    const entry = entries.find((other) => other.tag === tag);
    if (!entry || !SHORT_OR_LONG.has(entry.type)) throw new FileRefusal('no-picture', 'The TIFF file holds no picture.');
    return tiffNumbers(reader, entry, MOST_STRIPS);
  }) as [number[], number[]];
  if (offsets.length !== lengths.length) throw new FileRefusal('broken', 'The TIFF file is broken: its strips have no lengths.');
  // strips that lie over one another would let a small file grow without end
  if (lengths.reduce((sum, length) => sum + length, 0) > reader.length)
    throw new FileRefusal('cut-off', 'The TIFF picture is cut off: a part of it is missing.');
  return offsets.map((at, i) => reader.span(at, at + lengths[i]!));
}

const even = (n: number) => n + (n % 2);

/** Writes in the order of bytes of the file that it came from, so that values are copied as they are. */
class TiffWriter {
  private readonly out: Uint8Array;
  private readonly view: DataView;
  private readonly little: boolean;
  private to = 8;

  constructor(
    private readonly reader: ByteReader,
    private readonly entries: TiffEntry[],
    private readonly strips: Uint8Array[],
  ) {
    const samples = strips.reduce((sum, strip) => sum + even(strip.length), 0);
    const values = entries.reduce((sum, entry) => sum + even(this.valueLength(entry)), 0);
    this.out = new Uint8Array(8 + samples + values + 2 + entries.length * 12 + 4);
    this.view = new DataView(this.out.buffer);
    this.little = !reader.bigEndian;
  }

  write(): Uint8Array {
    this.out.set(this.reader.span(0, 4));
    const offsets = this.strips.map((strip) => this.put(strip));
    const places = this.entries.map((entry) => this.putValue(entry, offsets));
    this.view.setUint32(4, this.to, this.little);
    this.view.setUint16(this.to, this.entries.length, this.little);
    this.entries.forEach((entry, i) => this.putEntry(entry, this.to + 2 + i * 12, places[i]!));
    return this.out;
  }

  private put(bytes: Uint8Array): number {
    const at = this.to;
    this.out.set(bytes, at);
    this.to += even(bytes.length);
    return at;
  }

  private isOffsets = ({ tag }: TiffEntry) => tag === STRIPS[0] || tag === TILES[0];

  private valueLength(entry: TiffEntry): number {
    const length = this.isOffsets(entry) ? entry.count * 4 : entry.end - entry.at;
    return length <= 4 ? 0 : length;
  }

  /** Where the value lies, or the value itself where it fits into the entry. */
  private putValue(entry: TiffEntry, offsets: number[]): number | Uint8Array {
    const value = this.isOffsets(entry) ? this.longs(offsets) : this.reader.span(entry.at, entry.end);
    return value.length <= 4 ? value : this.put(value);
  }

  private longs(numbers: number[]): Uint8Array {
    const view = new DataView(new ArrayBuffer(numbers.length * 4));
    numbers.forEach((n, i) => view.setUint32(i * 4, n, this.little));
    return new Uint8Array(view.buffer);
  }

  private putEntry(entry: TiffEntry, at: number, place: number | Uint8Array): void {
    this.view.setUint16(at, entry.tag, this.little);
    this.view.setUint16(at + 2, this.isOffsets(entry) ? 4 : entry.type, this.little);
    this.view.setUint32(at + 4, entry.count, this.little);
    if (typeof place === 'number') this.view.setUint32(at + 8, place, this.little);
    else this.out.set(place, at + 8);
  }
}
