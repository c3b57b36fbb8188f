import { ByteReader } from './byte-reader.js';
import { exifFindings } from './exif-findings.js';
import { type FilePart, joinParts } from './file-parts.js';
import { FileRefusal } from './file-refusal.js';
import { jpegParts } from './jpeg-parts.js';
import { LONGEST_SHOWN, MOST_BYTES, MOST_PIXELS } from './limits.js';
import { pngParts, type SizedParts } from './png-parts.js';
import { cleanTiff } from './tiff-clean.js';
import { webpParts } from './webp-parts.js';

export type PictureKind = 'jpeg' | 'png' | 'webp' | 'tiff';

export interface PictureFinding {
  /** The segment, chunk or entry. */
  name: string;
  was: string;
}

export interface CleanedPicture {
  kind: PictureKind;
  bytes: Uint8Array;
  /** What a clean file does not hold. */
  removed: PictureFinding[];
  /** Whether the file was clean as it came: `bytes` are then the same. */
  wasClean: boolean;
  /** 1 to 8, as EXIF tells it; the pixels are not turned yet. */
  orientation: number;
  width: number;
  height: number;
}

/** What a photograph is, by its first bytes and not by its name; null where it is none of the four. */
export function pictureKind(bytes: Uint8Array): PictureKind | null {
  const start = new ByteReader(bytes).latin(0, Math.min(12, bytes.length));
  if (start.startsWith('\xff\xd8\xff')) return 'jpeg';
  if (start.startsWith('\x89PNG\r\n\x1a\n')) return 'png';
  if (start.startsWith('RIFF') && start.endsWith('WEBP') && start.length === 12) return 'webp';
  return start.startsWith('II*\0') || start.startsWith('MM\0*') ? 'tiff' : null;
}

/**
 * A photograph without anything but its pixels: of JPEG, PNG and WebP the parts that a decoder needs, TIFF
 * written anew. Pixels and their packing stay as they are. The work is linear in the number of bytes.
 * Throws FileRefusal where the file is none of these, broken, cut off, too large, or holds several pictures.
 * Sources of the parts: ITU-T T.81 annex B; PNG third edition 4.7; RFC 9649; TIFF 6.0.
 */
export function cleanPictureBytes(bytes: Uint8Array): CleanedPicture {
  if (bytes.length === 0) throw new FileRefusal('empty', 'The file is empty.');
  if (bytes.length > MOST_BYTES) throw new FileRefusal('too-large', `The file is larger than ${MOST_BYTES / 1024 / 1024} MB.`);
  const kind = pictureKind(bytes);
  if (!kind) throw new FileRefusal('not-read', 'The file is no JPEG, PNG, WebP or TIFF picture, whatever its name says.');
  const cleaned = kind === 'tiff' ? ofTiff(bytes) : ofParts(kind, bytes, PARTS[kind](bytes));
  if (cleaned.width * cleaned.height > MOST_PIXELS)
    throw new FileRefusal('too-large', `The picture has more than ${MOST_PIXELS / 1e6} million pixels. Export it smaller.`);
  return cleaned;
}

const PARTS = { jpeg: jpegParts, png: pngParts, webp: webpParts };

function ofParts(kind: PictureKind, bytes: Uint8Array, { parts, width, height, exif }: SizedParts): CleanedPicture {
  const read = exif ? exifFindings(bytes.subarray(exif.at, exif.end)) : { found: [], orientation: 1 };
  const removed = parts.filter(({ clean }) => clean === 'drop').map((part) => ({ name: part.name, was: shownPart(bytes, part) }));
  return {
    kind,
    bytes: joinParts(bytes, parts),
    removed: [...removed, ...read.found.map(({ name, was }) => ({ name: `EXIF ${name}`, was }))],
    wasClean: parts.every(({ clean }) => clean === 'keep'),
    orientation: read.orientation,
    width,
    height,
  };
}

/** Text is shown as such; of all else its length. */
function shownPart(bytes: Uint8Array, { name, at, end }: FilePart): string {
  if (!/text|comment|XMP/i.test(name)) return `${end - at} bytes`;
  const text = new ByteReader(bytes).latin(at, Math.min(end, at + 4 * LONGEST_SHOWN));
  return text
    .replace(/[^ -~]+/g, ' ')
    .trim()
    .slice(0, LONGEST_SHOWN);
}

function ofTiff(bytes: Uint8Array): CleanedPicture {
  const clean = cleanTiff(bytes);
  const dropped = new Set(clean.dropped.map(({ tag }) => tag));
  const removed = exifFindings(bytes, (tag) => !dropped.has(tag)).found.map(({ name, was }) => ({ name: `TIFF ${name}`, was }));
  const wasClean = clean.bytes.length === bytes.length && clean.bytes.every((byte, i) => byte === bytes[i]);
  if (!wasClean && removed.length === 0)
    removed.push({ name: 'bytes that belong to no part of the picture', was: `${Math.max(0, bytes.length - clean.bytes.length)} bytes` });
  return { kind: 'tiff', bytes: clean.bytes, removed, wasClean, orientation: 1, width: clean.width, height: clean.height };
}
