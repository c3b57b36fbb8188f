import type { CleanFault } from './clean-check.js';
import { type DicomElement, tagText } from './dicom-elements.js';
import { type DicomMeta, textOf } from './dicom-file.js';
import { IMPLEMENTATION_NAME, IMPLEMENTATION_UID, SOP_CLASS } from './written-attributes.js';

const SOP_INSTANCE = 0x00080018;
const GROUP_LENGTH = 0x00020000;
const VERSION = 0x00020001;

/** The head of a clean file: seven attributes (PS3.10 7.1), which say nothing that the file does not say too. */
export function checkMeta(bytes: Uint8Array, { elements, syntaxUid }: DicomMeta, valueOf: (tag: number) => string): CleanFault[] {
  const expected = new Map<number, string | null>([
    [GROUP_LENGTH, null],
    [VERSION, '\0\x01'],
    [0x00020002, valueOf(SOP_CLASS)],
    [0x00020003, valueOf(SOP_INSTANCE)],
    [0x00020010, syntaxUid],
    [0x00020012, IMPLEMENTATION_UID],
    [0x00020013, IMPLEMENTATION_NAME],
  ]);
  const tags = [...expected.keys()];
  return elements.flatMap((element, i) => {
    const why =
      element.tag === tags[i] ? checkHead(bytes, element, expected.get(element.tag)!) : 'is not one of the head of a clean file, or in a wrong place';
    return why ? [{ place: tagText(element.tag), why }] : [];
  });
}

function checkHead(bytes: Uint8Array, element: DicomElement, expected: string | null): string | null {
  if (expected === null) return element.end - element.value === 4 ? null : 'is not as cleaning writes it';
  if (element.end - element.value > 256) return 'is longer than cleaning writes it';
  const text = element.tag === VERSION ? String.fromCharCode(...bytes.subarray(element.value, element.end)) : textOf(bytes, element);
  return text === expected ? null : 'is not as cleaning writes it';
}
