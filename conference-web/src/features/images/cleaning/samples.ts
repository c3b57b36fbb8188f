import { type DicomElement, isPrivate } from '@kerfside/calc/deidentification/dicom-elements';
import type { DicomDataSet } from '@kerfside/calc/deidentification/dicom-file';
import { valuesOf } from '@kerfside/calc/deidentification/dicom-values';
import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { cleanFrame } from '@kerfside/calc/deidentification/packed-clean';
import { packedFrames } from '@kerfside/calc/deidentification/packed-frames';
import { type PictureFacts, plainLength } from '@kerfside/calc/deidentification/picture-facts';
import type { TransferSyntax } from '@kerfside/calc/deidentification/transfer-syntaxes';
import { PIXEL_DATA } from '@kerfside/calc/deidentification/written-attributes';
import type { DicomValue } from 'dcmjs';
import type { RemovedItem } from './cleaned-file.js';

export interface CleanSamples {
  value: DicomValue;
  removed: RemovedItem[];
}

const OVERLAY_BIT = 0x0102;
const OVERLAY_DATA = 0x3000;
const BITS_STORED = 0x00280101;

/**
 * The samples of the picture, as many as it has and nothing else, in little endian.
 * Throws FileRefusal where there are too few, or where they are packed in a way that can't be cleaned.
 */
export function cleanSamples(dataSet: DicomDataSet, syntax: TransferSyntax, facts: PictureFacts): CleanSamples {
  const element = dataSet.elements.find(({ tag }) => tag === PIXEL_DATA);
  if (!element) throw new FileRefusal('no-picture', 'The DICOM file holds no picture.');
  if (Boolean(element.pieces) !== (syntax.packing !== 'plain'))
    throw new FileRefusal(
      'broken',
      `The DICOM file is broken: its head says ${syntax.name}, and its picture is ${element.pieces ? '' : 'not '}packed.`,
    );
  return syntax.packing === 'plain' ? plain(dataSet, element, facts) : packed(dataSet, element, syntax, facts);
}

function plain(dataSet: DicomDataSet, element: DicomElement, facts: PictureFacts): CleanSamples {
  const needed = Math.ceil(plainLength(facts));
  const extra = element.end - element.value - needed;
  if (extra < 0)
    throw new FileRefusal(
      'cut-off',
      `The DICOM file is cut off: ${needed} bytes belong to the picture, and ${element.end - element.value} are there.`,
    );
  if (dataSet.encoding.bigEndian && facts.bitsAllocated > 16)
    throw new FileRefusal('not-read', `Big-endian pictures of ${facts.bitsAllocated} bits are not read here. Export the picture as little endian.`);
  // an odd picture has one byte that makes its length even, which is swapped with its neighbour where words are
  const samples = copyWords(
    dataSet.bytes.subarray(element.value, Math.min(element.end, element.value + needed + (needed % 2))),
    dataSet.encoding.bigEndian && element.vr !== 'OB',
  );
  const removed: RemovedItem[] =
    extra > 1 ? [{ place: '(7FE0,0010)', name: 'bytes after the picture', action: 'removed', was: `${extra} bytes` }] : [];
  if (hasHiddenOverlay(dataSet)) {
    clearUnusedBits(samples, dataSet, facts);
    removed.push({ place: '(7FE0,0010)', name: 'overlay in unused bits', action: 'blanked', was: '' });
  }
  return { value: { vr: facts.bitsAllocated > 8 || element.vr !== 'OB' ? 'OW' : 'OB', Value: [samples.buffer] }, removed };
}

function packed(dataSet: DicomDataSet, element: DicomElement, syntax: TransferSyntax, facts: PictureFacts): CleanSamples {
  if (hasHiddenOverlay(dataSet))
    throw new FileRefusal(
      'not-read',
      'The picture holds an overlay in its unused bits, which can not be removed while it is packed. Export it without compression.',
    );
  const frames = packedFrames(dataSet.bytes, element, facts.frames).map((frame) => cleanFrame(frame, syntax.packing, facts));
  const names = new Set(frames.flatMap(({ removed }) => removed));
  return {
    value: { vr: 'OB', Value: frames.map(({ bytes }) => evenCopy(bytes).buffer) },
    removed: [...names].map((name) => ({
      place: '(7FE0,0010)',
      name,
      action: name.startsWith('COM') && syntax.packing === 'jpeg2000' ? 'blanked' : 'removed',
      was: '',
    })),
  };
}

/** A copy; of big-endian words, in little endian. */
export function copyWords(bytes: Uint8Array, swap: boolean): Uint8Array<ArrayBuffer> {
  const copy = new Uint8Array(bytes.length + (bytes.length % 2));
  copy.set(bytes);
  if (swap) for (let at = 0; at < copy.length; at += 2) [copy[at], copy[at + 1]] = [copy[at + 1]!, copy[at]!];
  return copy;
}

function evenCopy(bytes: Uint8Array): Uint8Array<ArrayBuffer> {
  return copyWords(bytes, false);
}

/** Overlays of old files lie in bits of the samples that are not used for the picture (PS3.3-2003 C.9.2). */
function hasHiddenOverlay({ bytes, elements, encoding }: DicomDataSet): boolean {
  const groups = new Set(
    elements.map(({ tag }) => Math.floor(tag / 0x10000)).filter((group) => group >= 0x6000 && group <= 0x60ff && !isPrivate(group * 0x10000)),
  );
  return [...groups].some((group) => {
    const has = (element: number) => elements.find(({ tag }) => tag === group * 0x10000 + element);
    const bit = has(OVERLAY_BIT);
    return !has(OVERLAY_DATA) || (bit !== undefined && Number(valuesOf(bytes, bit, 'US', encoding)[0] ?? 0) > 0);
  });
}

function clearUnusedBits(samples: Uint8Array<ArrayBuffer>, { bytes, elements, encoding }: DicomDataSet, { bitsAllocated }: PictureFacts): void {
  const element = elements.find(({ tag }) => tag === BITS_STORED);
  const stored = element ? Number(valuesOf(bytes, element, 'US', encoding)[0] ?? 0) : 0;
  if (stored < 1 || stored >= bitsAllocated) return;
  if (bitsAllocated !== 16) throw new FileRefusal('not-read', 'The picture holds an overlay in its unused bits, in a way that is not read here.');
  const words = new DataView(samples.buffer);
  const mask = 2 ** stored - 1;
  for (let at = 0; at + 1 < samples.length; at += 2) words.setUint16(at, words.getUint16(at, true) & mask, true);
}
