import { isAmbiguousMonth, isDayAndMonth, isDayOfMonth, isLikelyYear, monthOfWord } from './calendar.js';
import type { Detector, FindingStrength } from './finding.js';
import { isPrecededBy, markAfter, markMatches } from './scanning.js';
import type { Judge } from './scanning.js';

const TIME = String.raw`(?:[T ,]{1,2}\d{1,2}:?\d{2}(?::?\d{2}(?:\.\d{1,6})?)?(?:Z|[+-]\d{2}:?\d{2})?(?!\d))?`;
const YEAR_FIRST = new RegExp(String.raw`(?<![\d.])(\d{4})([-/.])(\d{1,2})\2(\d{1,2})(?!\d|\2\d)${TIME}`, 'g');
const yearLast = (separator: string) =>
  new RegExp(
    String.raw`(?<!\d|\d${separator} ?)(\d{1,2}) ?${separator} ?(\d{1,2}) ?${separator} ?(\d{4}|\d{2})(?!\d|${separator}\d)`,
    'g',
  );
const SLASHES = yearLast('/');
const HYPHENS = yearLast('-');
const DOTS = yearLast(String.raw`\.`);
const SPACED = /(?<!\d|\d[ .,/-])(\d{2}) (\d{2}) (\d{4})(?!\d|[ .,/-]\d)/g;
const COMPACT = /(?<![\d.])(\d{4})(\d{2})(\d{2})(T\d{2}(?:\d{2}){0,2}Z?)?(?!\d)/g;
const COMPACT_DAY_FIRST = /(?<![\d.])(\d{2})(\d{2})((?:19|20)\d{2})(?!\d)/g;
const MONTH_SLASH_YEAR = /(?<![\d/.-])(?:0?[1-9]|1[0-2])\/(?:19|20)\d{2}(?![\d/])/g;
const MONTH_HYPHEN_YEAR = /(?<![\d/.-])(?:0[1-9]|1[0-2])-(?:19|20)\d{2}(?![\d-])/g;
const YEAR_MONTH = /(?<![\d/.-])(?:19|20)\d{2}-(?:0[1-9]|1[0-2])(?![\d/]|-\d)/g;
const SAID_DAY = /\b(?:on|dated|seen|admitted|since|until|date)[ :]{1,2}/gi;
const DAY_MONTH = /(0[1-9]\/\d{2}|\d{2}\/0[1-9])(?![\d/]|[.-]\d)/y;
const VERSION_BEFORE = /(?:\bv|\bver|version|release|software|firmware|build|dicom|standard|\biso|revision)[ .:]{0,2}$/i;

const WORD = String.raw`\p{L}{3,10}\.?`;
const UNIT = String.raw` ?(?:mm|cm|mg|ml|kg|years?|weeks?|months?|days?|hours?|patients?|hips?|°|%)(?!\p{L})`;
const DAY_WORD = new RegExp(
  String.raw`(?<![\d\p{L}]|\d[.,/])(?<day>\d{1,2})(?<ordinal>st|nd|rd|th|er|\.)?(?: (?:of|de) |[ -]|/)?(?<month>${WORD})` +
    String.raw`(?:(?:, ?| de | del |[ -]|/)?'?(?<year>(?:19|20)\d{2}|\d{2})(?![\d:/%]|[.,-]\d|${UNIT}))?(?!\p{L})`,
  'gu',
);
const WORD_DAY = new RegExp(
  String.raw`(?<![\p{L}\d])(?<month>${WORD})(?:[ -]|/|, | the )?(?<day>\d{1,2})(?<ordinal>st|nd|rd|th)?(?![\d:/%]|[.,-]\d|${UNIT})` +
    String.raw`(?:(?:, ?| )'?(?<year>(?:19|20)\d{2})(?!\d))?`,
  'gu',
);
const WORD_YEAR = new RegExp(
  String.raw`(?<![\p{L}\d])(?<month>${WORD})(?:,? (?:of |de |del )?|[-/])'?(?<year>(?:19|20)\d{2})(?!\d)`,
  'gu',
);
const SEASON_YEAR =
  /(?<!\p{L})(?:spring|summer|autumn|fall|winter|easter|christmas|new year|whitsun|ramadan|printemps|été|automne|hiver)(?: of|,)? (?:19|20)\d{2}(?!\d)/giu;
const WEEK_YEAR = /\b(?:week|wk)\.? \d{1,2}(?:,| of)? (?:19|20)\d{2}\b|\b(?:19|20)\d{2}-?W\d{2}(?:-?\d)?\b/gi;
const QUARTER_YEAR = /\b(?:Q[1-4]|(?:first|second|third|fourth) quarter)(?: of|,)? ?(?:19|20)\d{2}\b/gi;
const WEEKDAY_DAY =
  /\b(?:mon|tues?|wed(?:nes)?|thu(?:rs)?|fri|sat(?:ur)?|sun)(?:day)?,? (?:the )?\d{1,2}(?:st|nd|rd|th)\b/gi;

/** Calendar dates. An interval ('3 days after surgery') or a year alone is none. */
export const findDates: Detector = (text) => [
  ...markMatches(text, 'date', YEAR_FIRST, ([, y, , a, b]) => validDate(y, a, b, 'certain')),
  ...[SLASHES, HYPHENS, DOTS].flatMap((pattern) => markMatches(text, 'date', pattern, judgeYearLast)),
  ...markMatches(text, 'date', SPACED, ([, a, b, y]) => validDate(y, a, b, 'likely')),
  ...markMatches(text, 'date', COMPACT, judgeCompact),
  ...markMatches(text, 'date', COMPACT_DAY_FIRST, ([, a, b, y]) => validDate(y, a, b, 'possible')),
  ...markMatches(text, 'date', MONTH_SLASH_YEAR, 'likely'),
  ...markMatches(text, 'date', MONTH_HYPHEN_YEAR, 'possible'),
  ...markMatches(text, 'date', YEAR_MONTH, unlessVersion('possible')),
  ...markAfter(text, 'date', { label: SAID_DAY, value: DAY_MONTH }, judgeDayMonth),
  ...[DAY_WORD, WORD_DAY, WORD_YEAR].flatMap((pattern) => markMatches(text, 'date', pattern, judgeMonthWord)),
  ...[SEASON_YEAR, WEEK_YEAR, QUARTER_YEAR, WEEKDAY_DAY].flatMap((pattern) =>
    markMatches(text, 'date', pattern, 'likely'),
  ),
];

function validDate(
  year: string | undefined,
  a: string | undefined,
  b: string | undefined,
  strength: FindingStrength,
): FindingStrength | null {
  return isLikelyYear(Number(year)) && isDayAndMonth(Number(a), Number(b)) ? strength : null;
}

const judgeYearLast: Judge = (match, text) => {
  const [whole, a = '', b = '', year = ''] = match;
  if (year.length === 4) return validDate(year, a, b, 'certain');
  if (whole.includes(' ') || !isDayAndMonth(Number(a), Number(b))) return null;
  if (!whole.includes('.')) return 'likely';
  // 1.12.20 is more often a version than a date, 01.12.20 the other way round.
  return unlessVersion(a.length === 2 && b.length === 2 ? 'likely' : 'possible')(match, text);
};

const unlessVersion =
  (strength: FindingStrength): Judge =>
  (match, text) =>
    isPrecededBy(text, match.index ?? 0, VERSION_BEFORE, 16) ? null : strength;

const judgeCompact: Judge = ([, year, month, day, time]) => {
  if (!isLikelyYear(Number(year)) || !isDayOfMonth(Number(day), Number(month))) return null;
  return time === undefined ? 'likely' : 'certain';
};

const judgeDayMonth: Judge = ([whole]) => {
  const [a = 0, b = 0] = whole.split('/').map(Number);
  return isDayAndMonth(a, b) ? 'possible' : null;
};

const judgeMonthWord: Judge = ({ groups = {} }) => {
  const { month: word = '', day, ordinal, year } = groups;
  const month = monthOfWord(word);
  if (month === null) return null;
  if (day !== undefined && !isDayOfMonth(Number(day), month)) return null;
  if (year?.length === 4) return day === undefined ? 'likely' : 'certain';
  if (isAmbiguousMonth(word) && year === undefined) return ordinal === undefined ? null : 'possible';
  return 'likely';
};
