import { isAmbiguousMonth, isDayAndMonth, isDayOfMonth, isLikelyYear, monthOfWord } from './calendar.js';
import { markOf } from './finding.js';
import type { Detector, FindingStrength, Mark } from './finding.js';

// Every quantifier below is bounded, so that no text can make a pattern run away.

const TIME = String.raw`(?:[T ,]{1,2}\d{1,2}:?\d{2}(?::?\d{2}(?:\.\d{1,6})?)?(?:Z|[+-]\d{2}:?\d{2})?(?!\d))?`;
const YEAR_FIRST = new RegExp(String.raw`(?<![\d.])(\d{4})([-/.])(\d{1,2})\2(\d{1,2})(?![\d]|[-/.]\d)${TIME}`, 'g');
const YEAR_LAST = /(?<![\d/]|\d[.-])(\d{1,2}) ?([-/.]) ?(\d{1,2}) ?\2 ?(\d{4}|\d{2})(?![\d/]|[-.]\d)/g;
const SPACED = /(?<!\d|\d[ .,/-])(\d{2}) (\d{2}) (\d{4})(?![\d/]|[ .,-]\d)/g;
const COMPACT = /(?<![\d.])(\d{4})(\d{2})(\d{2})(T\d{2}(?:\d{2}){0,2}Z?)?(?!\d)/g;
const COMPACT_DAY_FIRST = /(?<![\d.])(\d{2})(\d{2})((?:19|20)\d{2})(?!\d)/g;
const MONTH_YEAR_DIGITS = /(?<![\d/.-])(0?[1-9]|1[0-2])([/.-])((?:19|20)\d{2})(?![\d/]|[-.]\d)/g;
const YEAR_MONTH_DIGITS = /(?<![\d/.-])((?:19|20)\d{2})-(0[1-9]|1[0-2])(?![\d/]|[-.]\d)/g;
const DAY_MONTH_AFTER_ON = /\b(?:on|dated|seen|admitted|since|until|date)[ :]{1,2}(?<value>0[1-9]\/\d{2}|\d{2}\/0[1-9])(?![\d/]|[.-]\d)/gi;

const DAY = String.raw`\d{1,2}(?:st|nd|rd|th|er|\.)?`;
const WORD = String.raw`\p{L}{3,10}\.?`;
const TO = String.raw`(?: |-|/| of | de | di |, | the ){1,2}`;
const DAY_WORD_YEAR = new RegExp(
  String.raw`(?<![\d.,/\p{L}-])(?<day>${DAY})(?: (?:of|de) |[ -]|/|\. ?)?(?<month>${WORD})(?:(?:, ?| de | del |[ -]|/)?'?(?<year>(?:19|20)\d{2}|\d{2})(?![\d:/%]|[.,-]\d| ?(?:mm|cm|mg|ml|years?|weeks?|days?|hours?)\b))?(?![\p{L}])`,
  'gu',
);
const WORD_DAY_YEAR = new RegExp(
  String.raw`(?<![\p{L}\d])(?<month>${WORD})(?:${TO})?(?<day>\d{1,2})(?<ordinal>st|nd|rd|th)?(?![\d:/%]|[.,-]\d)(?:(?:, ?| )'?(?<year>(?:19|20)\d{2})(?!\d))?(?! ?(?:mm|cm|mg|ml|kg|years?|weeks?|days?|patients?|hips?)\b)`,
  'gu',
);
const WORD_YEAR = new RegExp(
  String.raw`(?<![\p{L}\d])(?<month>${WORD})(?:,? (?:of |de |del )?|[-/])'?(?<year>(?:19|20)\d{2})(?!\d)`,
  'gu',
);
const SEASON_YEAR = /\b(?:spring|summer|autumn|fall|winter|easter|christmas|new year|whitsun|ramadan|printemps|été|automne|hiver)(?: of|,)? ((?:19|20)\d{2})\b/gi;
const WEEK = /\b(?:(?:week|wk)\.? \d{1,2}(?:,| of)? (?:19|20)\d{2}|(?:19|20)\d{2}-?W\d{2}(?:-?\d)?|(?:Q[1-4]|first quarter|second quarter|third quarter|fourth quarter)(?: of|,)? ?(?:19|20)\d{2})\b/gi;
const WEEKDAY_DAY = /\b(?:mon|tues?|wed(?:nes)?|thu(?:rs)?|fri|sat(?:ur)?|sun)(?:day)?,? (?:the )?\d{1,2}(?:st|nd|rd|th)\b/gi;
const VERSION_BEFORE = /(?:\bv|\bver|version|release|software|firmware|build|dicom|standard|iso|protocol|node|rev(?:ision)?)[ .:]{0,2}$/i;

/** Calendar dates; an interval or a year alone is none. */
export const findDates: Detector = (text) => [
  ...fromDigits(text),
  ...fromWords(text),
  ...[SEASON_YEAR, WEEK, WEEKDAY_DAY].flatMap((pattern) =>
    [...text.matchAll(pattern)].map((match) => markOf(match, 'date', 'likely')),
  ),
];

function fromDigits(text: string): Mark[] {
  return [
    ...matches(text, YEAR_FIRST, ([, y, , m, d]) => validYmd(y, m, d, 'certain')),
    ...matches(text, YEAR_LAST, yearLast),
    ...matches(text, SPACED, ([, a, b, y]) => validYmd(y, a, b, 'likely')),
    ...matches(text, COMPACT, ([, y, m, d, time]) =>
      Number(y) >= 1900 && isDayOfMonth(Number(d), Number(m)) && isLikelyYear(Number(y))
        ? time === undefined ? 'likely' : 'certain'
        : null,
    ),
    ...matches(text, COMPACT_DAY_FIRST, ([, a, b, y]) => validYmd(y, a, b, 'possible')),
    ...matches(text, MONTH_YEAR_DIGITS, () => 'likely'),
    ...matches(text, YEAR_MONTH_DIGITS, () => 'possible'),
    ...matches(text, DAY_MONTH_AFTER_ON, ({ groups }) => {
      const [a, b] = (groups?.value ?? '').split('/').map(Number);
      return isDayAndMonth(a ?? 0, b ?? 0) ? 'possible' : null;
    }),
  ];
}

function yearLast(match: RegExpMatchArray): FindingStrength | null {
  const [whole, a, separator, b, year] = match;
  if (!isDayAndMonth(Number(a), Number(b))) return null;
  if (year?.length === 4) return isLikelyYear(Number(year)) ? 'certain' : null;
  if (/ /.test(whole)) return null;
  // Two-digit years with dots also look like versions, so they count less.
  if (separator === '.' && !(a?.length === 2 && b?.length === 2)) return 'possible';
  return 'likely';
}

function validYmd(y?: string, a?: string, b?: string, strength: FindingStrength = 'certain'): FindingStrength | null {
  return isLikelyYear(Number(y)) && isDayAndMonth(Number(a), Number(b)) ? strength : null;
}

function fromWords(text: string): Mark[] {
  return [
    ...matches(text, DAY_WORD_YEAR, ({ groups }) => ofMonthWord(groups)),
    ...matches(text, WORD_DAY_YEAR, ({ groups }) => {
      const strength = ofMonthWord(groups);
      return strength === 'certain' || groups?.ordinal !== undefined || isCapital(groups?.month) ? strength : null;
    }),
    ...matches(text, WORD_YEAR, ({ groups }) => ofMonthWord(groups)),
  ];
}

function ofMonthWord(groups: Record<string, string | undefined> | undefined): FindingStrength | null {
  const word = groups?.month ?? '';
  const month = monthOfWord(word);
  if (month === null) return null;
  const day = groups?.day === undefined ? null : Number.parseInt(groups.day, 10);
  if (day !== null && !isDayOfMonth(day, month)) return null;
  const year = groups?.year;
  if (year?.length === 4) return day === null ? 'likely' : 'certain';
  if (isAmbiguousMonth(word) && year === undefined) return null;
  return 'likely';
}

const isCapital = (word = ''): boolean => /^\p{Lu}/u.test(word);

function matches(
  text: string,
  pattern: RegExp,
  judge: (match: RegExpMatchArray) => FindingStrength | null,
): Mark[] {
  const marks: Mark[] = [];
  for (const match of text.matchAll(pattern)) {
    const strength = judge(match);
    if (strength !== null && !followsVersionWord(text, match.index)) marks.push(markOf(match, 'date', strength));
  }
  return marks;
}

const followsVersionWord = (text: string, index: number): boolean =>
  VERSION_BEFORE.test(text.slice(Math.max(0, index - 16), index));
