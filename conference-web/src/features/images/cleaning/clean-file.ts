import { isDicom } from '@kerfside/calc/deidentification/dicom-file';
import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { pictureKind } from '@kerfside/calc/deidentification/picture-clean';
import type { UidMap } from '@kerfside/calc/deidentification/uid-map';
import { cleanDicom } from './clean-dicom.js';
import { cleanPicture, type TurnPicture } from './clean-picture.js';
import type { CleanedFile, CleanOptions } from './cleaned-file.js';

/** Cleans a file by what it is, whatever it is called. Throws FileRefusal where it is nothing that is read. */
export async function cleanFile(bytes: Uint8Array<ArrayBuffer>, uids: UidMap, options: CleanOptions, turn: TurnPicture | null): Promise<CleanedFile> {
  if (bytes.length === 0) throw new FileRefusal('empty', 'The file is empty.');
  if (isDicom(bytes)) return cleanDicom(bytes, uids, options);
  if (pictureKind(bytes)) return cleanPicture(bytes, turn);
  throw new FileRefusal('not-read', `The file is ${guess(bytes)}; DICOM, JPEG, PNG, WebP and TIFF are read.`);
}

/** By first bytes, for the kinds that are met by mistake. */
function guess(bytes: Uint8Array): string {
  const start = new TextDecoder('latin1').decode(bytes.subarray(0, 16));
  if (start.startsWith('%PDF-')) return 'a PDF document';
  if (start.startsWith('PK\x03\x04') || start.startsWith('\x1f\x8b')) return 'an archive: unpack it first';
  if (start.startsWith('GIF8')) return 'a GIF picture';
  if (/^.{4}ftyp(hei|mif|avi)/s.test(start)) return 'a HEIC or AVIF picture: save it as JPEG';
  return 'of no kind known here';
}
