import {
  isAustralianMedicare,
  isBcHealthNumber,
  isCanadianSin,
  isNhsNumber,
  isOntarioHealthNumber,
  isUsSocialSecurity,
  passesLuhn,
} from './checksums.js';
import type { Detector, FindingStrength, Mark } from './finding.js';
import { digitsIn, isOneDigitRepeated, isPrecededBy, markAfter, markMatches } from './scanning.js';
import type { Judge } from './scanning.js';

const TEN_DIGITS = [
  /(?<![\d.,+])\d{10}(?!\d|[.,]\d)/g,
  /(?<![\d.,+])\d{3}([ -])\d{3}\1\d{4}(?!\d)/g,
  /(?<![\d.,+])\d{4}([ -])\d{3}\1\d{3}(?!\d)/g,
  /(?<![\d.,+])\d{4}([ -])\d{5}(?:\1\d(?:[/ -]\d)?)?(?!\d)/g,
  /(?<![\d.,+])\d{4} \d{4} \d{1,2}(?!\d)/g,
] as const;
const NHS_WORDS = /\b(?:NHS|CHI|H&C|health and care)\b/i;
const HEALTH_WORDS = /\b(?:PHN|OHIP|health (?:card|number|no|insurance)|medicare|personal health|BC|ontario|HCN|H\.?C\.?N)\b/i;

const SOCIAL_SECURITY = /(?<![\d-])\d{3}-\d{2}-\d{4}(?![\d-])/g;
const SOCIAL_INSURANCE = /(?<![\d-]|\d )\d{3}([ -])\d{3}\1\d{3}(?!\d|[ -]\d)/g;
const NATIONAL_INSURANCE =
  /(?<![A-Za-z\d])(?!BG|GB|KN|NK|NT|TN|ZZ)[A-CEGHJ-PR-TW-Z][A-CEGHJ-NPR-TW-Z] ?\d{2} ?\d{2} ?\d{2} ?[A-D](?![A-Za-z\d])/g;
const NATIONAL_LABEL = /\b(?:SSN|social security|SIN|social insurance|NINO|national insurance|passport|tax)(?: (?:no|number|id)\b\.?)?[ :#=]{1,3}/gi;
const CARD = /(?<![\d.,+])(?:\d{4}([ -])\d{4}\1\d{4}\1\d{1,7}|\d{13,19})(?!\d)/g;

const NUMBER_WORD = String.raw`(?:[ .]{0,2}(?:no|nr|num|number|id|identifier|code|#)\b\.?|[ .]{0,2}#)`;
const SAID = String.raw`(?: (?:is|was))?[ :=#-]{0,4}`;
// Labels that announce an identifier by themselves, and those that need a word for number after them.
const STRONG_LABEL = new RegExp(
  String.raw`\b(?:MRN|M\.R\.N\.|medical record|accession)${NUMBER_WORD}?${SAID}`,
  'gi',
);
// These names also stand before years and page numbers, so a short number after them is none.
const SCHEME_LABEL = new RegExp(
  String.raw`\b(?:NHS|CHI|PHN|OHIP|HCN|NHI|URN|health card|medicare)${NUMBER_WORD}?${SAID}`,
  'gi',
);
const WEAK_LABEL = new RegExp(
  String.raw`\b(?:hosp(?:ital)?\.?|patient|pt\.?|record|unit|case ?note|chart|file|account|acc(?:t)?|policy|insurance|licen[cs]e|registration|vehicle|plate|specimen|sample|lab(?:oratory)?|order|request|encounter|visit|admission|episode|referral|study|beneficiary|member|certificate|GMC|NPI|national|identity|personal)${NUMBER_WORD}${SAID}`,
  'gi',
);
const TOKEN = /[A-Za-z]{0,4}[-/]?\d[A-Za-z\d/-]{0,24}(?: \d{3,5}(?![\d.])){0,3}/y;

const LONG_NUMBER =
  /(?<![\d.,+#\p{L}]|\d[ /-])\d{7,40}(?!\d|[.,]\d| ?(?:\/|per\b|cells|copies|cfu|iu\b|mm|[µu]?l\b|x ?10|\u00d7))/giu;
const LETTERS_AND_NUMBER = /(?<![\p{L}\d.-])\p{Lu}{1,4}-?\d{6,12}\p{Lu}?(?![\p{L}\d.-])/gu;
const DICOM_UID = /(?<![\d.])(?:2\.25\.\d{10,39}|[0-2](?:\.\d{1,39}){5,15})(?![\d]|\.\d)/g;

/** Numbers of people, records, cards and accounts, by check digit, by label or by length. */
export const findRecordNumbers: Detector = (text) => [
  ...TEN_DIGITS.flatMap((pattern) => tenDigits(text, pattern)),
  ...markMatches(text, 'national-id', SOCIAL_SECURITY, ([whole]) => (isUsSocialSecurity(digitsIn(whole)) ? 'likely' : null)),
  ...markMatches(text, 'national-id', SOCIAL_INSURANCE, ([whole]) => (isCanadianSin(digitsIn(whole)) ? 'likely' : null)),
  ...markMatches(text, 'national-id', NATIONAL_INSURANCE, 'likely'),
  ...markAfter(text, 'national-id', { label: NATIONAL_LABEL, value: TOKEN }, ofDigits(6, 'certain')),
  ...markMatches(text, 'card-number', CARD, ([whole]) => (isCard(digitsIn(whole)) ? 'likely' : null)),
  ...markAfter(text, 'record-number', { label: STRONG_LABEL, value: TOKEN }, ofDigits(3, 'certain')),
  ...markAfter(text, 'record-number', { label: SCHEME_LABEL, value: TOKEN }, ofDigits(6, 'likely')),
  ...markAfter(text, 'record-number', { label: WEAK_LABEL, value: TOKEN }, ofDigits(3, 'likely')),
  ...markMatches(text, 'record-number', LONG_NUMBER, judgeLong),
  ...markMatches(text, 'record-number', LETTERS_AND_NUMBER, 'possible'),
  ...markMatches(text, 'record-number', DICOM_UID, ([whole]) => (digitsIn(whole).length >= 16 ? 'likely' : null)),
];

// A check digit alone is weak: one random number in ten or eleven has it. A word before it settles it.
function tenDigits(text: string, pattern: RegExp): Mark[] {
  const marks: Mark[] = [];
  for (const match of text.matchAll(pattern)) {
    const [start, end] = [match.index, match.index + match[0].length];
    const digits = digitsIn(match[0]);
    const saidNhs = isPrecededBy(text, start, NHS_WORDS);
    const saidHealth = isPrecededBy(text, start, HEALTH_WORDS);
    if (isNhsNumber(digits)) {
      marks.push({ kind: 'nhs-number', start, end, strength: saidNhs ? 'certain' : 'likely' });
    }
    if (isHealthNumber(match[0], digits, saidHealth)) {
      marks.push({ kind: 'health-number', start, end, strength: saidHealth ? 'certain' : 'likely' });
    }
  }
  return marks;
}

const GROUPED_3_3_4 = /^\d{3}[ -]\d{3}[ -]/;

function isHealthNumber(written: string, digits: string, said: boolean): boolean {
  // Nine digits are a Medicare number without its issue number: too short to believe unsaid.
  if (digits.length === 9) return said && isAustralianMedicare(digits);
  // These cards are not written 3-3-4; it takes a word to believe one that is.
  if (!said && GROUPED_3_3_4.test(written)) return false;
  return isBcHealthNumber(digits) || isOntarioHealthNumber(digits) || isAustralianMedicare(digits);
}

const isCard = (digits: string): boolean => digits.length >= 13 && digits.length <= 19 && passesLuhn(digits);

const ofDigits =
  (least: number, strength: FindingStrength): Judge =>
  ([token]) => {
    const digits = digitsIn(token);
    return digits.length >= least && !isOneDigitRepeated(digits) ? strength : null;
  };

const judgeLong: Judge = ([whole]) => {
  if (isOneDigitRepeated(whole)) return null;
  return whole.length >= 9 && passesLuhn(whole) ? 'likely' : 'possible';
};
