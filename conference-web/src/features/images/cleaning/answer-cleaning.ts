import { type FileFault, FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { UidMap } from '@kerfside/calc/deidentification/uid-map';
import { cleanFile } from './clean-file.js';
import type { CleanedFile, CleanOptions } from './cleaned-file.js';
import { pictureTurner } from './turn-picture.js';

/** What the page asks of the worker. */
export interface CleaningRequest {
  id: number;
  file: Blob;
  options: CleanOptions;
  /** Old and new UIDs of the upload so far. */
  uids: [string, string][];
}

/** What the worker answers; `uids` go with the next request. */
export type CleaningAnswer =
  { id: number; cleaned: CleanedFile; uids: [string, string][] } | { id: number; refusal: { fault: FileFault; message: string } };

/** Cleans one file; a fault of any kind is an answer, so that the rest of the batch goes on. */
export async function answerCleaning({ id, file, options, uids }: CleaningRequest): Promise<CleaningAnswer> {
  try {
    const map = new UidMap(uids, () => crypto.getRandomValues(new Uint8Array(16)));
    const cleaned = await cleanFile(new Uint8Array(await file.arrayBuffer()), map, options, pictureTurner());
    return { id, cleaned, uids: map.entries() };
  } catch (error) {
    if (error instanceof FileRefusal) return { id, refusal: { fault: error.fault, message: error.message } };
    return { id, refusal: { fault: 'broken', message: 'The file could not be read. Export it again.' } };
  }
}
