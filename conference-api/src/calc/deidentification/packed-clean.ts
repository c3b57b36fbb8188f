import { ByteReader } from './byte-reader.js';
import { type FilePart, isClean, joinParts } from './file-parts.js';
import { FileRefusal } from './file-refusal.js';
import { jpegParts } from './jpeg-parts.js';
import { jpeg2000Parts } from './jpeg2000-parts.js';
import type { PictureFacts } from './picture-facts.js';
import type { Packing } from './transfer-syntaxes.js';

export interface CleanFrame {
  bytes: Uint8Array;
  /** Comments and the like that were in the packed picture itself. */
  removed: string[];
  wasClean: boolean;
}

/**
 * One packed picture of a DICOM file without comments, thumbnails and whatever stands after its end.
 * The size that it names must be the file's, since a decoder would make room for it.
 * Throws FileRefusal where it is broken, cut off or of another size.
 */
export function cleanFrame(frame: Uint8Array, packing: Packing, facts: PictureFacts): CleanFrame {
  if (packing === 'rle') return { bytes: frame, removed: checkRle(frame), wasClean: true };
  const { parts, width, height } = packing === 'jpeg' ? jpegParts(frame) : jpeg2000Parts(frame);
  if (width !== facts.columns || (height !== facts.rows && height !== 0))
    throw new FileRefusal(
      'broken',
      `The DICOM file is broken: it says ${facts.columns} × ${facts.rows} pixels, and its picture ${width} × ${height}.`,
    );
  const kept = parts.filter((part, i) => !isPadding(frame, part, i === parts.length - 1));
  return { bytes: joinParts(frame, kept), removed: kept.filter(({ clean }) => clean !== 'keep').map(({ name }) => name), wasClean: isClean(kept) };
}

/** One byte that makes the length even belongs to DICOM (PS3.5 A.4). */
const isPadding = (frame: Uint8Array, { at, end, clean }: FilePart, isLast: boolean) =>
  isLast && clean === 'drop' && end - at === 1 && (frame[at] === 0 || frame[at] === 0xff);

/** PS3.5 G.5: up to 15 segments whose offsets rise within the bytes. */
function checkRle(frame: Uint8Array): string[] {
  const reader = new ByteReader(frame);
  reader.need(0, 64);
  const count = reader.u32(0);
  if (count < 1 || count > 15) throw new FileRefusal('broken', 'The DICOM file is broken: its RLE picture names a wrong number of parts.');
  let last = 63;
  for (let i = 0; i < count; i++) {
    const at = reader.u32(4 + i * 4);
    if (at <= last || at >= frame.length) throw new FileRefusal('broken', 'The DICOM file is broken: its RLE picture names parts outside itself.');
    last = at;
  }
  return [];
}
