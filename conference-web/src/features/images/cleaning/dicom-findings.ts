import { actionFor } from '@kerfside/calc/deidentification/actions';
import { type DicomElement, isGroupLength, isPrivate, tagText } from '@kerfside/calc/deidentification/dicom-elements';
import type { DicomDataSet } from '@kerfside/calc/deidentification/dicom-file';
import { KEPT, type KeptAttributes } from '@kerfside/calc/deidentification/kept-attributes';
import { LONGEST_SHOWN } from '@kerfside/calc/deidentification/limits';
import { EMPTIED, MAPPED_UIDS } from '@kerfside/calc/deidentification/written-attributes';
import dcmjs from 'dcmjs';
import type { RemovedItem } from './cleaned-file.js';
import { textDecoderFor } from './character-sets.js';

/** Those that are listed; a file with more has them counted in the last one. */
const MOST_LISTED = 2000;
const CHARACTER_SET = 0x00080005;
const TEXT_VRS = new Set(['AE', 'AS', 'CS', 'DA', 'DS', 'DT', 'IS', 'LO', 'LT', 'PN', 'SH', 'ST', 'TM', 'UC', 'UI', 'UR', 'UT']);

/**
 * What of a data set is not carried over, tag by tag, in its order.
 * @param unclean Attributes of the allow-list whose value may not stay, or not all of it.
 */
export function dicomFindings(dataSet: DicomDataSet, unclean: ReadonlySet<DicomElement>): RemovedItem[] {
  const list: Listing = { found: [], count: 0, source: dataSet, decoder: decoderOf(dataSet), unclean };
  collect(list, dataSet.elements, [], KEPT);
  if (list.count > list.found.length) list.found.push({ place: '', name: `${list.count - list.found.length} more`, action: 'removed', was: '' });
  return list.found;
}

interface Listing {
  found: RemovedItem[];
  count: number;
  source: DicomDataSet;
  decoder: TextDecoder;
  unclean: ReadonlySet<DicomElement>;
}

/** The name of an attribute as the standard's dictionary has it. */
export function attributeName(tag: number): string {
  if (isPrivate(tag)) return 'private attribute';
  const name = EMPTIED.get(tag)?.name ?? MAPPED_UIDS.get(tag) ?? dcmjs.data.DicomMetaDictionary.dictionary[tagText(tag)]?.name;
  return (name ?? 'attribute unknown to the standard').replace(/([a-z])([A-Z])/g, '$1 $2');
}

/** `within` is what of the holder's items is kept; null where the holder goes as a whole. */
function collect(list: Listing, elements: DicomElement[], holders: number[], within: KeptAttributes | null): void {
  for (const element of elements) {
    if (isGroupLength(element.tag)) continue;
    const action = changeOf(list, element, within);
    if (action && !isEmptyAlready(element, action)) {
      list.count++;
      if (list.found.length < MOST_LISTED) list.found.push(finding(list, element, holders, action));
    }
    const deeper = action ? null : (within?.get(element.tag)?.items ?? null);
    for (const item of element.items ?? []) collect(list, item, [...holders, element.tag], deeper);
  }
}

const isEmptyAlready = ({ value, end }: DicomElement, action: RemovedItem['action']) => action === 'emptied' && value === end;

/** Null where it stays, or is no more than the file's own bookkeeping. */
function changeOf({ unclean }: Listing, element: DicomElement, within: KeptAttributes | null): RemovedItem['action'] | null {
  if (!within || unclean.has(element)) return 'removed';
  const { does } = actionFor(element.tag, element.vr, within);
  return does === 'remove' ? 'removed' : does === 'empty' ? 'emptied' : does === 'replace' ? 'replaced' : null;
}

function finding({ source, decoder }: Listing, element: DicomElement, holders: number[], action: RemovedItem['action']): RemovedItem {
  return {
    place: [...holders, element.tag].map(tagText).join(' '),
    name: attributeName(element.tag),
    action,
    was: shown(source.bytes, element, decoder),
  };
}

function shown(bytes: Uint8Array, element: DicomElement, decoder: TextDecoder): string {
  if (element.items) return `${element.items.length} item${element.items.length === 1 ? '' : 's'}`;
  const length = element.end - element.value;
  const vr = element.vr || dcmjs.data.DicomMetaDictionary.dictionary[tagText(element.tag)]?.vr;
  if (!vr || !TEXT_VRS.has(vr) || element.pieces) return `${length} byte${length === 1 ? '' : 's'}`;
  const text = decoder.decode(bytes.subarray(element.value, Math.min(element.end, element.value + 4 * LONGEST_SHOWN)));
  return [...text]
    .filter((character) => character >= ' ')
    .join('')
    .trim()
    .slice(0, LONGEST_SHOWN);
}

function decoderOf({ bytes, elements }: DicomDataSet): TextDecoder {
  const element = elements.find(({ tag }) => tag === CHARACTER_SET);
  const name = element ? new TextDecoder('latin1').decode(bytes.subarray(element.value, Math.min(element.end, element.value + 256))) : '';
  return textDecoderFor(name);
}
