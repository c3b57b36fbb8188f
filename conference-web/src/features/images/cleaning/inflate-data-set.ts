import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { MOST_INFLATED } from '@kerfside/calc/deidentification/limits';

/**
 * Unpacks a deflated data set (PS3.5 A.5), and stops where it grows beyond what is taken: a few hundred
 * kilobytes can unpack to gigabytes.
 */
export async function inflateDataSet(packed: Uint8Array<ArrayBuffer>): Promise<Uint8Array<ArrayBuffer>> {
  const reader = new Blob([packed]).stream().pipeThrough(new DecompressionStream('deflate-raw')).getReader();
  const pieces: Uint8Array[] = [];
  let length = 0;
  for (;;) {
    const { done, value } = await reader.read().catch(() => {
      throw new FileRefusal('broken', 'The DICOM file is broken or cut off: its packed part can not be unpacked.');
    });
    if (done) return joined(pieces, length);
    pieces.push(value);
    length += value.length;
    if (length > MOST_INFLATED) {
      await reader.cancel().catch(() => undefined);
      throw new FileRefusal('too-large', `The DICOM file unpacks to more than ${MOST_INFLATED / 1024 / 1024} MB.`);
    }
  }
}

function joined(pieces: Uint8Array[], length: number): Uint8Array<ArrayBuffer> {
  const whole = new Uint8Array(length);
  let to = 0;
  for (const piece of pieces) {
    whole.set(piece, to);
    to += piece.length;
  }
  return whole;
}
