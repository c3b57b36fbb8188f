import type { ByteReader } from './byte-reader.js';
import { FileRefusal } from './file-refusal.js';
import { LONGEST_SHOWN } from './limits.js';
import { type TiffDirectory, tiffDirectory, type TiffEntry, tiffNumbers, tiffReader } from './tiff-directory.js';

export interface ExifFinding {
  name: string;
  was: string;
}

export interface ExifFindings {
  found: ExifFinding[];
  /** 1 to 8 (EXIF 2.32, 4.6.4 A); 1 where it is not said. */
  orientation: number;
}

const ORIENTATION = 0x0112;
const POINTERS: Record<number, string> = { 0x8769: 'Exif', 0x8825: 'GPS', 0xa005: 'Interoperability' };
/** Names of what tells of somebody; the others are shown by their number. Source: EXIF 2.32, and Windows' XP entries. */
const NAMES: Record<number, string> = {
  0x010e: 'ImageDescription',
  0x010f: 'Make',
  0x0110: 'Model',
  0x0112: 'Orientation',
  0x0131: 'Software',
  0x0132: 'DateTime',
  0x013b: 'Artist',
  0x013c: 'HostComputer',
  0x02bc: 'XMP',
  0x8298: 'Copyright',
  0x83bb: 'IPTC',
  0x8649: 'Photoshop',
  0x8773: 'ICC profile',
  0x9003: 'DateTimeOriginal',
  0x9004: 'DateTimeDigitized',
  0x9011: 'OffsetTimeOriginal',
  0x927c: 'MakerNote',
  0x9286: 'UserComment',
  0x9c9b: 'XPTitle',
  0x9c9c: 'XPComment',
  0x9c9d: 'XPAuthor',
  0x9c9e: 'XPKeywords',
  0x9c9f: 'XPSubject',
  0xa420: 'ImageUniqueID',
  0xa430: 'CameraOwnerName',
  0xa431: 'BodySerialNumber',
  0xa435: 'LensSerialNumber',
};
const MOST_DIRECTORIES = 8;

/**
 * What EXIF data say, entry by entry. Data that can't be read give no finding: they are removed all the same.
 * @param isKept Entries of the first directory that are no finding, as in a TIFF picture.
 */
export function exifFindings(bytes: Uint8Array, isKept: (tag: number) => boolean = () => false): ExifFindings {
  const findings: ExifFindings = { found: [], orientation: 1 };
  try {
    const reader = tiffReader(bytes);
    const waiting: [number, string][] = [[reader.u32(4), '']];
    const seen = new Set<number>();
    while (waiting.length > 0 && seen.size < MOST_DIRECTORIES) {
      const [at, where] = waiting.shift()!;
      if (at === 0 || seen.has(at)) continue;
      seen.add(at);
      waiting.push(...readDirectory(findings, reader, tiffDirectory(reader, at), where, isKept));
    }
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error;
  }
  return findings;
}

function readDirectory(
  findings: ExifFindings,
  reader: ByteReader,
  directory: TiffDirectory,
  where: string,
  isKept: (tag: number) => boolean,
): [number, string][] {
  const more: [number, string][] = [];
  for (const entry of directory.entries) {
    const pointer = where === '' ? POINTERS[entry.tag] : undefined;
    if (pointer && entry.type === 4) more.push([reader.u32(entry.at), pointer]);
    else if (where !== '' || !isKept(entry.tag)) findings.found.push({ name: nameOf(entry, where), was: shown(reader, entry) });
    if (entry.tag === ORIENTATION && where === '' && entry.type === 3) findings.orientation = knownTurn(tiffNumbers(reader, entry, 16)[0]);
  }
  if (where === '') more.push([directory.next, 'Thumbnail']);
  return more;
}

const knownTurn = (value: number | undefined) => (value !== undefined && value >= 1 && value <= 8 ? value : 1);

function nameOf({ tag }: TiffEntry, where: string): string {
  const name = (where === 'GPS' ? undefined : NAMES[tag]) ?? `0x${tag.toString(16).padStart(4, '0')}`;
  return where ? `${where} ${name}` : name;
}

function shown(reader: ByteReader, entry: TiffEntry): string {
  if (entry.type === 2) return reader.latin(entry.at, Math.min(entry.end, entry.at + LONGEST_SHOWN)).replace(/\0[^]*$/, '');
  if ((entry.type === 3 || entry.type === 4) && entry.count <= 4) return tiffNumbers(reader, entry).join(', ');
  return `${entry.end - entry.at} bytes`;
}
