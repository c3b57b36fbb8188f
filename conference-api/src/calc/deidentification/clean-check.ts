import { actionFor, type DicomAction } from './actions.js';
import { type DicomElement, tagText } from './dicom-elements.js';
import { type DicomDataSet, type DicomMeta, readDataSet, readMeta, textOf } from './dicom-file.js';
import { valuesOf } from './dicom-values.js';
import { FileRefusal } from './file-refusal.js';
import type { KeptAttribute, KeptAttributes } from './kept-attributes.js';
import { LONGEST_TABLE } from './limits.js';
import { checkMeta } from './meta-check.js';
import { checkMissing, checkOwn } from './own-check.js';
import { checkSamples } from './samples-check.js';
import { isCleanSyntax } from './transfer-syntaxes.js';

/** Something in a file that cleaning would not have left there. */
export interface CleanFault {
  /** The tag, with those of the sequences that hold it, as '(0008,1140) (0008,1155)'; or 'preamble', 'file'. */
  place: string;
  why: string;
}

/** The faults that are told; a file that was never cleaned has thousands. */
const MOST_FAULTS = 200;

/**
 * Everything in a DICOM file that a cleaned one may not hold; none, and the file is clean. It reads every
 * attribute of every level, the head, the packed pictures' own comments, and the bytes after the end.
 * @param bytes At most MOST_BYTES; the work is linear in their number.
 * @param confirmed Whether the file must say that a person found no text in the picture.
 * Source of what must go: PS3.15 Annex E, Table E.1-1, edition 2024b; everything that is not on the allow-list.
 */
export function cleanFaults(bytes: Uint8Array, confirmed = true): CleanFault[] {
  const faults: CleanFault[] = [];
  try {
    const meta = readMeta(bytes);
    if (bytes.subarray(0, 128).some((byte) => byte !== 0)) faults.push({ place: 'preamble', why: 'is not empty' });
    if (!isCleanSyntax(meta.syntaxUid))
      return [...faults, { place: tagText(0x00020010), why: `names an encoding that cleaning does not write: ${meta.syntax.name}` }];
    checkAll(faults, bytes, meta, confirmed);
  } catch (error) {
    if (!(error instanceof FileRefusal)) throw error;
    faults.push({ place: 'file', why: error.message });
  }
  return faults.slice(0, MOST_FAULTS);
}

function checkAll(faults: CleanFault[], bytes: Uint8Array, meta: DicomMeta, confirmed: boolean): void {
  const dataSet = readDataSet(bytes, meta.end, meta.syntax);
  const valueOf = (tag: number) => {
    const element = dataSet.elements.find((other) => other.tag === tag);
    return element ? textOf(bytes, element) : '';
  };
  faults.push(...checkMeta(bytes, meta, valueOf));
  checkElements(faults, dataSet, dataSet.elements, [], undefined);
  if (dataSet.end < bytes.length) faults.push({ place: 'file', why: `holds ${bytes.length - dataSet.end} bytes after its last attribute` });
  faults.push(...checkMissing(dataSet, confirmed));
  faults.push(...checkSamples(dataSet, meta.syntax));
}

function checkElements(
  faults: CleanFault[],
  dataSet: DicomDataSet,
  elements: DicomElement[],
  holders: number[],
  within: KeptAttributes | undefined,
): void {
  let last = -1;
  for (const element of elements) {
    if (faults.length >= MOST_FAULTS) return;
    const why = element.tag <= last ? 'does not stand in its order, or twice' : checkElement(faults, dataSet, element, holders, within);
    if (why) faults.push({ place: [...holders, element.tag].map(tagText).join(' '), why });
    last = element.tag;
  }
}

function checkElement(
  faults: CleanFault[],
  dataSet: DicomDataSet,
  element: DicomElement,
  holders: number[],
  within: KeptAttributes | undefined,
): string | null {
  const action = actionFor(element.tag, element.vr, within);
  switch (action.does) {
    case 'remove':
      return REASONS[action.because];
    case 'picture':
      return null;
    case 'keep':
      if (!action.attribute.items) return checkValue(dataSet, element, action.attribute);
      for (const item of element.items ?? []) checkElements(faults, dataSet, item, [...holders, element.tag], action.attribute.items);
      return element.items ? null : 'is no sequence';
    default:
      return checkOwn(dataSet, element);
  }
}

const REASONS: Record<Extract<DicomAction, { does: 'remove' }>['because'], string> = {
  profile: 'identifies somebody: the table of PS3.15 Annex E names it',
  private: 'is private to a maker',
  'not-needed': 'is not needed to show the picture',
  'written-otherwise': 'is written in another way than the standard says',
};

function checkValue(dataSet: DicomDataSet, element: DicomElement, attribute: KeptAttribute): string | null {
  if (attribute.vrs.includes('OW')) return element.end - element.value > LONGEST_TABLE ? 'is longer than such a table can be' : null;
  const values = valuesOf(dataSet.bytes, element, element.vr, dataSet.encoding);
  const clean = attribute.rule(values);
  const isSame = clean !== null && clean.length === values.length && clean.every((value, i) => value === values[i]);
  return isSame ? null : 'holds a value that is not on its list';
}
