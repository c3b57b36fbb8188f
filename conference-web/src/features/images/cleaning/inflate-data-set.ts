import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { MOST_INFLATED } from '@kerfside/calc/deidentification/limits';
import { Inflate } from 'fflate';

/** One step unpacks to at most a thousand times as much, so that memory is bounded between two looks. */
const STEP = 16_384;

/**
 * Unpacks a deflated data set (PS3.5 A.5), and stops where it grows beyond what is taken: a few hundred
 * kilobytes can unpack to gigabytes. Writers put padding or checksums after the packed data, which browsers'
 * own unpacking refuses.
 */
export function inflateDataSet(packed: Uint8Array): Uint8Array<ArrayBuffer> {
  const pieces: Uint8Array[] = [];
  let length = 0;
  let isWhole = false;
  const inflate = new Inflate((piece, final) => {
    pieces.push(piece);
    length += piece.length;
    isWhole ||= final;
  });
  for (let at = 0; at < packed.length && !isWhole; at += STEP) {
    push(inflate, packed.subarray(at, at + STEP), at + STEP >= packed.length);
    if (length > MOST_INFLATED) throw new FileRefusal('too-large', `The DICOM file unpacks to more than ${MOST_INFLATED / 1024 / 1024} MB.`);
  }
  if (!isWhole) throw broken();
  return joined(pieces, length);
}

function push(inflate: Inflate, bytes: Uint8Array, final: boolean): void {
  try {
    inflate.push(bytes, final);
  } catch {
    throw broken();
  }
}

const broken = () => new FileRefusal('broken', 'The DICOM file is broken or cut off: its packed part can not be unpacked.');

function joined(pieces: Uint8Array[], length: number): Uint8Array<ArrayBuffer> {
  const whole = new Uint8Array(length);
  let to = 0;
  for (const piece of pieces) {
    whole.set(piece, to);
    to += piece.length;
  }
  return whole;
}
