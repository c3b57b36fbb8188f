import { fileTypeFromBuffer } from 'file-type/node';
import { Problem } from '../common/problems/problem.js';
import type { CaseImage } from './entities/case-image.entity.js';

export type ImageKind = CaseImage['sourceKind'];

const KINDS: Record<string, ImageKind> = {
  'image/jpeg': 'jpeg',
  'image/png': 'png',
  'image/webp': 'webp',
  'image/tiff': 'tiff',
  'application/dicom': 'dicom',
};

/** What the bytes are, whatever the file is called; problem 415 where it is nothing that is read here. */
export async function imageKind(bytes: Buffer): Promise<ImageKind> {
  if (bytes.length === 0) throw new Problem('unsupported-type', 'The file is empty.');
  if (bytes.subarray(128, 132).toString('latin1') === 'DICM') return 'dicom';
  const found = await fileTypeFromBuffer(bytes).catch(() => undefined);
  const kind = found && KINDS[found.mime];
  if (kind) return kind;
  throw new Problem(
    'unsupported-type',
    `The file is ${found ? `of the kind ${found.mime}` : 'of no kind known here'}; JPEG, PNG, WebP, TIFF and DICOM are read.`,
  );
}
