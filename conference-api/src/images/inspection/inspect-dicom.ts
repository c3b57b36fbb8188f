import { type CleanFault, cleanFaults } from '../../calc/deidentification/clean-check.js';
import { tagText } from '../../calc/deidentification/dicom-elements.js';
import { readDataSet, readMeta } from '../../calc/deidentification/dicom-file.js';
import { dcmjs } from './dcmjs.js';
import type { Inspection, InspectionFault } from './inspection.js';

/**
 * Everything in a DICOM file that a cleaned one may not hold, by tag. It is read twice: by the check of the
 * allow-list, which bounds its work and looks at every byte, and then by dcmjs, as the viewers do; a file in
 * which the two find different attributes is refused.
 */
export function inspectDicom(bytes: Uint8Array): Inspection {
  const faults = cleanFaults(bytes);
  return { faults: (faults.length > 0 ? faults : secondReading(bytes)).map(named) };
}

function secondReading(bytes: Uint8Array): CleanFault[] {
  const meta = readMeta(bytes);
  const ours = readDataSet(bytes, meta.end, meta.syntax).elements.map(({ tag }) => tagText(tag));
  const theirs = dcmjsTags(bytes);
  if (!theirs) return [{ place: 'file', why: 'can not be read by a second reader' }];
  const seen = new Set(ours);
  const differing = theirs.find((tag) => !seen.has(tag)) ?? (theirs.length === ours.length ? undefined : ours.find((tag) => !theirs.includes(tag)));
  return differing === undefined ? [] : [{ place: differing, why: 'is found by one reader and not by another' }];
}

function dcmjsTags(bytes: Uint8Array): string[] | null {
  try {
    const { dict } = dcmjs.data.DicomMessage.readFile(new Uint8Array(bytes).buffer, { noCopy: true });
    return Object.keys(dict).map((tag) => tagText(parseInt(tag, 16)));
  } catch {
    return null;
  }
}

/** The name of the innermost attribute, as the standard's dictionary has it. */
function named({ place, why }: CleanFault): InspectionFault {
  const tag = place.split(' ').at(-1)!;
  const name = dcmjs.data.DicomMetaDictionary.dictionary[tag]?.name ?? '';
  return { place, name: name.replace(/([a-z])([A-Z])/g, '$1 $2'), why };
}
