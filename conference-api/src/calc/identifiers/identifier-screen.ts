import type { FieldSpec } from '../common/field-spec.js';
import { CalcInputError } from '../common/calc-input-error.js';
import { readBody } from '../common/optional-input.js';
import { findBirthsAndAges } from './births-and-ages.js';
import { findContacts } from './contact.js';
import { findDates } from './dates.js';
import { findDeviceSerials } from './devices.js';
import { FINDING_KINDS, strengthRank } from './finding.js';
import type { Detector, Finding, Mark } from './finding.js';
import { findNames } from './names.js';
import { findPlaces } from './places.js';
import { plainText } from './plain-text.js';
import { findRecordNumbers } from './record-numbers.js';

export type { Finding, FindingKind, FindingStrength } from './finding.js';

export interface IdentifierScreenInput {
  /** At most 500 000 UTF-16 code units. */
  text: string;
}

export interface IdentifierScreenResult {
  /** In the order of the text; none overlaps another. */
  findings: Finding[];
  definition: string;
  cautions: string[];
}

export const IDENTIFIER_SCREEN_FIELDS: readonly FieldSpec[] = [{ name: 'text', type: 'string' }];

const LONGEST_TEXT = 500_000;

const DETECTORS: readonly Detector[] = [
  findBirthsAndAges,
  findDates,
  findContacts,
  findRecordNumbers,
  findDeviceSerials,
  findPlaces,
  findNames,
];

/**
 * What in a text may identify a person, for a human to look at. `certain`: the form or a label
 * leaves no doubt; `likely`: the form or a check digit speaks for it; `possible`: worth a look.
 * Overlapping findings become one with the kind and strength of the strongest. Offsets are UTF-16
 * code units of the text as given.
 *
 * Throws CalcInputError on `text`: `required`, `type` or `too-long`.
 * Source: the identifiers of 45 CFR 164.514(b)(2)(i); check digits as named in checksums.ts; labels,
 * name and place lists are common practice without a source.
 */
export function screenIdentifiers(input: IdentifierScreenInput): IdentifierScreenResult {
  const text = readText(readBody(input).text);
  const plain = plainText(text);
  const marks = DETECTORS.flatMap((detect) => detect(plain));
  return {
    findings: merge(marks).map((mark) => ({ ...mark, text: text.slice(mark.start, mark.end) })),
    definition: 'Identifiers of 45 CFR 164.514(b)(2)(i), Safe Harbor, as far as they can be told by their form',
    cautions: [
      'An aid to the person who checks, not a proof: a text without findings can still identify someone.',
      'Names without a title, label or common given name, nicknames and rare events are not found.',
      'Check digits also fit by chance: about one number in ten.',
      'A year alone and an interval are let pass; local policy may ask for more.',
      'Images, file names and attachments are not looked at here.',
    ],
  };
}

function readText(text: unknown): string {
  if (text === null || text === undefined) throw new CalcInputError('text', 'required', 'text is required.');
  if (typeof text !== 'string') throw new CalcInputError('text', 'type', 'text must be text.');
  if (text.length > LONGEST_TEXT) {
    throw new CalcInputError('text', 'too-long', `text may have ${LONGEST_TEXT} characters at most.`);
  }
  return text;
}

/** One mark for each group of overlapping marks: their whole extent, with the strongest's kind. */
function merge(marks: readonly Mark[]): Mark[] {
  const merged: Mark[] = [];
  for (const mark of [...marks].filter((one) => one.end > one.start).sort((a, b) => a.start - b.start)) {
    const last = merged.at(-1);
    if (last === undefined || mark.start >= last.end) {
      merged.push(mark);
    } else {
      const { kind, strength } = stronger(last, mark);
      merged[merged.length - 1] = { kind, strength, start: last.start, end: Math.max(last.end, mark.end) };
    }
  }
  return merged;
}

function stronger(a: Mark, b: Mark): Mark {
  const byStrength = strengthRank(b.strength) - strengthRank(a.strength);
  if (byStrength !== 0) return byStrength > 0 ? b : a;
  return FINDING_KINDS.indexOf(b.kind) < FINDING_KINDS.indexOf(a.kind) ? b : a;
}
