import { type DicomElement, tagText } from './dicom-elements.js';
import { type DicomDataSet, textOf } from './dicom-file.js';
import type { CleanFault } from './clean-check.js';
import { contentOf, pictureClass } from './sop-classes.js';
import { isMappedUid } from './uid-map.js';
import {
  BASIC_PROFILE,
  BURNED_IN,
  CLEAN_PIXELS,
  EMPTIED,
  MAPPED_UIDS,
  METHOD_CODE_TAGS,
  METHOD_CODES,
  METHOD_SCHEME,
  NEEDED_UIDS,
  PIXEL_DATA,
  SOP_CLASS,
  STATEMENTS,
} from './written-attributes.js';

/** Why an attribute that cleaning writes itself is not as it writes it; null where it is. */
export function checkOwn(dataSet: DicomDataSet, element: DicomElement): string | null {
  const { tag, vr } = element;
  const emptied = EMPTIED.get(tag);
  if (emptied) return element.end > element.value ? 'is not empty' : vr === emptied.vr ? null : 'is written in another way than the standard says';
  if (tag === METHOD_CODES) return checkCodes(dataSet, element);
  const text = element.items || element.pieces || element.end - element.value > 256 ? null : textOf(dataSet.bytes, element);
  if (text === null) return 'holds more than cleaning writes';
  if (MAPPED_UIDS.has(tag)) return vr === 'UI' && isMappedUid(text) ? null : 'is not a new UID';
  if (tag === SOP_CLASS) return pictureClass(text) ? null : `says that the file holds ${contentOf(text)}`;
  if (tag === BURNED_IN) return text === 'NO' ? null : 'does not say that a person found no text in the picture';
  return STATEMENTS.get(tag)?.value === text ? null : 'is not as cleaning writes it';
}

/** Clean Pixel Data is claimed where, and only where, the file says that there is no text in the picture. */
function checkCodes({ bytes, elements }: DicomDataSet, { items }: DicomElement): string | null {
  const methods = elements.some(({ tag }) => tag === BURNED_IN) ? [BASIC_PROFILE, CLEAN_PIXELS] : [BASIC_PROFILE];
  const expected = methods.map(({ value, meaning }) => [
    [METHOD_CODE_TAGS.value, value],
    [METHOD_CODE_TAGS.scheme, METHOD_SCHEME],
    [METHOD_CODE_TAGS.meaning, meaning],
  ]);
  const found = items?.map((item) => item.map((element) => [element.tag, element.items ? '' : textOf(bytes, element)]));
  return JSON.stringify(found) === JSON.stringify(expected)
    ? null
    : `does not name ${methods.map(({ value }) => value).join(' and ')}, and nothing else`;
}

/** What every clean file says, and what is not there; text in the picture only where a person looked for it. */
export function checkMissing({ elements }: DicomDataSet, confirmed: boolean): CleanFault[] {
  const found = new Set(elements.map(({ tag }) => tag));
  const needed = [SOP_CLASS, ...(confirmed ? [BURNED_IN] : []), METHOD_CODES, PIXEL_DATA, ...NEEDED_UIDS, ...EMPTIED.keys(), ...STATEMENTS.keys()];
  return needed.filter((tag) => !found.has(tag)).map((tag) => ({ place: tagText(tag), why: 'is missing' }));
}
