import type { Detector } from './finding.js';
import { isPrecededBy, markAfter, markMatches } from './scanning.js';
import type { Judge } from './scanning.js';

const BIRTH_LABEL =
  /(?<!\p{L})(?:d\.?o\.?b\.?|date of birth|birth ?da(?:te|y)|birth year|born|year of birth|y\.?o\.?b\.?|b\.|date de naissance|née? le|geboren(?: am)?|geb\.|fecha de nacimiento|data di nascita)(?: (?:is|was|on|in))?[ :.=-]{0,4}/giu;
const BIRTH_VALUE = new RegExp(
  [
    String.raw`\d{4}[-/. ]\d{1,2}[-/. ]\d{1,2}(?!\d)`,
    String.raw`\d{1,2}[-/. ]{1,2}\d{1,2}[-/. ]{1,2}(?:\d{4}|\d{2})(?!\d)`,
    String.raw`\d{1,2}(?:st|nd|rd|th|\.)?[ -]?(?:of |de )?\p{L}{3,10}\.?,?(?: de )?[ -]?(?:\d{4}|\d{2})(?!\d)`,
    String.raw`\p{L}{3,10}\.? \d{1,2}(?:st|nd|rd|th)?,? \d{4}(?!\d)`,
    String.raw`\p{L}{3,10}\.?,? (?:18|19|20)\d{2}(?!\d)`,
    String.raw`\d{8}(?!\d)`,
    String.raw`\d{6}(?!\d)`,
    String.raw`(?:18|19|20)\d{2}(?!\d)`,
  ].join('|'),
  'yu',
);

// 90 to 130; the group '90 and over' is allowed and is told apart below.
const OLD = String.raw`(?:9\d|1[0-2]\d|130)`;
const AGE_BEFORE_WORDS = new RegExp(
  String.raw`(?<![\d.,/-])${OLD}(?:[ -]{0,2}(?:years?|yrs?|y)\.?[ -]{1,2}(?:old|of age)|[ -]?y\.?\/?o\.?(?!\w)|[ -]?yrs?\.? ?o(?:ld)?(?!\w)|[ -]?(?:years?|yrs?|y),? (?:male|female|man|woman|lady|gentleman)(?!\w)| ans(?!\w)| jahre alt| años)`,
  'gi',
);
const AGED = /\b(?:aged about|age (?:of|is|was|about|at \w{1,15})|aged?|turned|turning)[ :=]{1,3}/gi;
const OLD_NUMBER = new RegExp(String.raw`${OLD}(?![\d.,]\d|\d|[%+/°]| ?(?:mm|cm|mg|kg|deg|days|weeks|months|hours|minutes|and over|and older|or over|or older|or more|and above|plus))`, 'y');
const OLD_WITH_SEX = new RegExp(String.raw`(?<=\b(?:an?|this|our) )${OLD}[- ]?(?:[MF](?!\w)|(?:year|yr)\b)`, 'g');
const AGE_WORDS =
  /\b(?:ninety|one hundred)(?:[- ](?:and[- ])?(?:one|two|three|four|five|six|seven|eight|nine|ten))?[ -]years?[ -](?:old|of age)\b|\b(?:nonagenarian|centenarian|supercentenarian)\b/gi;
const GROUPED = /(?:≥|>=|over|least) ?$/i;

/** Birth dates and years, and ages over 89 given as such. '90 and over' as a group is allowed. */
export const findBirthsAndAges: Detector = (text) => [
  ...markAfter(text, 'date-of-birth', { label: BIRTH_LABEL, value: BIRTH_VALUE }, judgeBirth),
  ...markMatches(text, 'age-over-89', AGE_BEFORE_WORDS, judgeAge),
  ...markAfter(text, 'age-over-89', { label: AGED, value: OLD_NUMBER }, 'certain'),
  ...markMatches(text, 'age-over-89', OLD_WITH_SEX, 'likely'),
  ...markMatches(text, 'age-over-89', AGE_WORDS, 'certain'),
];

const judgeBirth: Judge = ([value]) => (/^\d{4}$/.test(value) ? 'likely' : 'certain');

const judgeAge: Judge = (match, text) =>
  Number.parseInt(match[0], 10) === 90 && isPrecededBy(text, match.index ?? 0, GROUPED, 8) ? null : 'certain';
