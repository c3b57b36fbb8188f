import { FileRefusal } from '../../calc/deidentification/file-refusal.js';
import { cleanPictureBytes } from '../../calc/deidentification/picture-clean.js';
import type { Inspection } from './inspection.js';

/**
 * Everything in a JPEG, PNG, WebP or TIFF file that a cleaned one may not hold, by segment, chunk or entry:
 * EXIF, XMP, IPTC, comments, text, dates, profiles, thumbnails, bytes after the end. The work is linear in
 * the number of bytes, and nothing is decoded.
 */
export function inspectPicture(bytes: Uint8Array): Inspection {
  try {
    const { wasClean, removed } = cleanPictureBytes(bytes);
    if (wasClean) return { faults: [] };
    const places = [...new Set(removed.map(({ name }) => name))];
    return { faults: (places.length > 0 ? places : ['head']).map((place) => ({ place, name: '', why: 'is not needed to show the picture' })) };
  } catch (error) {
    if (error instanceof FileRefusal) return { faults: [{ place: 'file', name: '', why: error.message }] };
    throw error;
  }
}
