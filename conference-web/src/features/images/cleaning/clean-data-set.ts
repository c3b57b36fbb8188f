import { actionFor } from '@kerfside/calc/deidentification/actions';
import { type DicomElement, tagText } from '@kerfside/calc/deidentification/dicom-elements';
import type { DicomDataSet } from '@kerfside/calc/deidentification/dicom-file';
import { valuesOf } from '@kerfside/calc/deidentification/dicom-values';
import { KEPT, type KeptAttribute, type KeptAttributes } from '@kerfside/calc/deidentification/kept-attributes';
import { LONGEST_TABLE } from '@kerfside/calc/deidentification/limits';
import type { DicomValues } from 'dcmjs';
import type { KeptItem } from './cleaned-file.js';
import { copyWords } from './samples.js';

export interface CleanValues {
  values: DicomValues;
  kept: KeptItem[];
  /** Attributes of the allow-list whose value may not stay, or not all of it. */
  unclean: Set<DicomElement>;
}

const PIXEL_REPRESENTATION = 0x00280103;

/** The attributes of a data set that are carried over, with their values, ready to be written. */
export function cleanValues(dataSet: DicomDataSet): CleanValues {
  const carrying: Carrying = { dataSet, kept: [], unclean: new Set(), signed: hasSignedSamples(dataSet) };
  return { values: carried(carrying, dataSet.elements, [], KEPT), kept: carrying.kept, unclean: carrying.unclean };
}

interface Carrying {
  dataSet: DicomDataSet;
  kept: KeptItem[];
  unclean: Set<DicomElement>;
  signed: boolean;
}

/** What dcmjs calls a tag: eight digits. */
export const dcmjsTag = (tag: number): string => tag.toString(16).toUpperCase().padStart(8, '0');

function carried(carrying: Carrying, elements: DicomElement[], holders: number[], within: KeptAttributes): DicomValues {
  const values: DicomValues = {};
  for (const element of elements) {
    const action = actionFor(element.tag, element.vr, within);
    if (action.does !== 'keep') continue;
    const vr = vrOf(carrying, element, action.attribute);
    const value = valueOf(carrying, element, action.attribute, vr, [...holders, element.tag]);
    if (value) values[dcmjsTag(element.tag)] = { vr, Value: value };
  }
  return values;
}

function vrOf({ signed }: Carrying, element: DicomElement, { vrs }: KeptAttribute): string {
  if (vrs[0] === 'OW' || vrs[0] === 'SQ') return vrs[0];
  return element.vr || vrs[signed ? vrs.length - 1 : 0]!;
}

function valueOf(carrying: Carrying, element: DicomElement, attribute: KeptAttribute, vr: string, path: number[]): unknown[] | null {
  const { bytes, encoding } = carrying.dataSet;
  if (attribute.items)
    return element.items ? element.items.map((item) => carried(carrying, item, path, attribute.items!)) : refused(carrying, element);
  if (vr === 'OW') {
    const table = bytes.subarray(element.value, element.end);
    return table.length > LONGEST_TABLE || element.pieces ? refused(carrying, element) : [copyWords(table, encoding.bigEndian).buffer];
  }
  const values = valuesOf(bytes, element, vr, encoding);
  const clean = attribute.rule(values);
  if (!clean || clean.length !== values.length || clean.some((value, i) => value !== values[i])) refused(carrying, element);
  if (!clean) return null;
  carrying.kept.push({ place: path.map(tagText).join(' '), name: attribute.name, value: clean.join(', ') });
  return [...clean];
}

function refused({ unclean }: Carrying, element: DicomElement): null {
  if (element.end > element.value) unclean.add(element);
  return null;
}

function hasSignedSamples({ bytes, elements, encoding }: DicomDataSet): boolean {
  const element = elements.find(({ tag }) => tag === PIXEL_REPRESENTATION);
  return element !== undefined && valuesOf(bytes, element, 'US', encoding)[0] === 1;
}
