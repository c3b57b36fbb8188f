import { ByteReader } from './byte-reader.js';
import type { CleanFault } from './clean-check.js';
import { type DicomElement, tagText } from './dicom-elements.js';
import type { DicomDataSet } from './dicom-file.js';
import { cleanFrame } from './packed-clean.js';
import { packedFrames } from './packed-frames.js';
import { pictureFacts, type PictureFacts, plainLength } from './picture-facts.js';
import type { TransferSyntax } from './transfer-syntaxes.js';
import { PIXEL_DATA } from './written-attributes.js';

/**
 * Whether the samples are just as many as the picture has, and packed pictures hold nothing but samples.
 * Throws FileRefusal where there are too few, or a packed picture is broken.
 */
export function checkSamples(dataSet: DicomDataSet, syntax: TransferSyntax): CleanFault[] {
  const element = dataSet.elements.find(({ tag }) => tag === PIXEL_DATA);
  if (!element) return [];
  const facts = pictureFacts(dataSet);
  const why = syntax.packing === 'plain' ? checkPlain(element, facts) : checkPacked(dataSet, element, facts, syntax);
  return why ? [{ place: tagText(PIXEL_DATA), why }] : [];
}

function checkPlain(element: DicomElement, facts: PictureFacts): string | null {
  if (element.pieces) return 'is packed, though the head says that it is not';
  const needed = Math.ceil(plainLength(facts));
  const length = element.end - element.value;
  if (length < needed) return `is cut off: ${needed} bytes belong to the picture, and ${length} are there`;
  return length > needed + (needed % 2) ? `holds ${length - needed} bytes that belong to no picture` : null;
}

function checkPacked({ bytes }: DicomDataSet, element: DicomElement, facts: PictureFacts, syntax: TransferSyntax): string | null {
  if (!element.pieces) return 'is not packed, though the head says that it is';
  if (element.pieces.length !== facts.frames + 1) return 'is not one piece a picture';
  if (!isOffsetTable(bytes, element.pieces)) return 'has a table of offsets that are none';
  const left = packedFrames(bytes, element, facts.frames).map((frame) => cleanFrame(frame, syntax.packing, facts));
  const removed = left.find(({ wasClean }) => !wasClean)?.removed[0];
  return removed ? `holds what is no picture: ${removed}` : null;
}

/** PS3.5 A.4: empty, or where each piece begins. */
function isOffsetTable(bytes: Uint8Array, [table, ...pieces]: { at: number; end: number }[]): boolean {
  const length = table!.end - table!.at;
  if (length === 0) return true;
  if (length !== pieces.length * 4) return false;
  const reader = new ByteReader(bytes);
  return pieces.every(({ at }, i) => reader.u32(table!.at + i * 4) === at - pieces[0]!.at);
}
