import type { Detector, Mark } from './finding.js';
import { digitsIn, isOneDigitRepeated, isPrecededBy, markAfter, markMatches, trimmed } from './scanning.js';
import type { Judge } from './scanning.js';

const PHONE_LABEL =
  /\b(?:tel(?:ephone)?|phone|mobile|mob|cell ?phone|cell no|fax|contact (?:no|number)|whatsapp|call(?:ed)? (?:him|her|them|on))\b\.?(?: (?:no|number)\b\.?)?(?: (?:is|on|at))?[ :.]{0,3}/gi;
const PHONE_VALUE = /[+(]?\d[\d ()./-]{4,22}/y;
const EXTENSION_LABEL = /\b(?:ext(?:ension)?|bleep|pager)\b\.?(?: (?:no|number)\b\.?)?[ :]{0,3}/gi;
const EXTENSION_VALUE = /\d{3,6}(?![\d.]| ?(?:mm|°|deg))/y;
const INTERNATIONAL = /(?<![\d+.,])(?:\+|00(?=[1-9]))\d[\d ().-]{6,22}/g;
const NORTH_AMERICAN = /(?<![\d+.-])(?:\([2-9]\d{2}\) ?|[2-9]\d{2}[-.])[2-9]\d{2}[-. ]\d{4}(?!\d)/g;
const NATIONAL_ZERO = /(?<![\d.,+/-])\(?0\d{2,4}\)?[ -]?\d{3,4}[ -]?\d{3,4}(?!\d|[.,/]\d)/g;
const PAIRS = /(?<![\d.,+/-])0[1-9](?:([ .-])\d{2})(?:\1\d{2}){3}(?!\d)/g;

const WEB = /(?<![\p{L}\d])(?:https?:\/\/|ftp:\/\/|www\.)[^\s<>"'()]{3,2000}/giu;
const BARE_DOMAIN =
  /(?<![\p{L}\d@./-])(?:[a-z\d][a-z\d-]{0,40}\.){1,4}(?:com|org|net|edu|gov|int|info|io|eu|uk|de|fr|nl|ca|au|nz|ie|ch|example)(?:\/[^\s<>"'()]{0,500}|(?![\p{L}\d@-]|\.[a-z\d]))/giu;

const IPV4 = /(?<![\d.\p{L}-])\d{1,3}(?:\.\d{1,3}){3}(?![\d-]|\.\d)/gu;
const IPV6 = /(?<![\da-z:])[\da-f:]{6,39}(?![\da-z:])/gi;
const VERSION_BEFORE = /(?:\bv|\bver|version|release|software|firmware|build|uid)[ .:]{0,2}$/i;

/** Telephone numbers, e-mail addresses, web addresses and network addresses. */
export const findContacts: Detector = (text) => [
  ...trimmed(text, markAfter(text, 'phone', { label: PHONE_LABEL, value: PHONE_VALUE }, phoneOf(6, 'certain', 25))),
  ...markAfter(text, 'phone', { label: EXTENSION_LABEL, value: EXTENSION_VALUE }, 'likely'),
  ...trimmed(text, markMatches(text, 'phone', INTERNATIONAL, phoneOf(8, 'likely'))),
  ...markMatches(text, 'phone', NORTH_AMERICAN, 'likely'),
  ...markMatches(text, 'phone', NATIONAL_ZERO, phoneOf(10, 'likely', 11)),
  ...markMatches(text, 'phone', PAIRS, 'likely'),
  ...findEmails(text),
  ...trimmed(text, markMatches(text, 'url', WEB, 'certain')),
  ...trimmed(text, markMatches(text, 'url', BARE_DOMAIN, 'likely')),
  ...markMatches(text, 'ip-address', IPV4, judgeIpv4),
  ...markMatches(text, 'ip-address', IPV6, ([whole]) => (isIpv6(whole) ? 'likely' : null)),
];

function phoneOf(least: number, strength: 'certain' | 'likely', most = 15): Judge {
  return ([whole]) => {
    const digits = digitsIn(whole);
    return digits.length >= least && digits.length <= most && !isOneDigitRepeated(digits) ? strength : null;
  };
}

const LOCAL_END = /[\p{L}\d.!#$%&'*+/=?^_`{|}~-]{1,64}$/u;
const DOMAIN_START = /^[\p{L}\d-]{1,63}(?:\.[\p{L}\d-]{1,63}){1,8}/u;

// From each @ outwards: a pattern from the left would try every start of a long word.
function findEmails(text: string): Mark[] {
  const marks: Mark[] = [];
  for (let at = text.indexOf('@'); at !== -1; at = text.indexOf('@', at + 1)) {
    const local = LOCAL_END.exec(text.slice(Math.max(0, at - 64), at))?.[0];
    const domain = DOMAIN_START.exec(text.slice(at + 1, at + 256))?.[0];
    if (local === undefined || domain === undefined) continue;
    marks.push({ kind: 'email', start: at - local.length, end: at + 1 + domain.length, strength: 'certain' });
  }
  return marks;
}

const judgeIpv4: Judge = (match, text) => {
  const inRange = match[0].split('.').every((part) => Number(part) <= 255);
  return inRange && !isPrecededBy(text, match.index ?? 0, VERSION_BEFORE, 16) ? 'likely' : null;
};

function isIpv6(address: string): boolean {
  const halves = address.split('::');
  const groups = address.split(':').filter((group) => group !== '');
  const wellFormed = groups.every((group) => group.length <= 4) && !address.includes(':::');
  if (!wellFormed || !/[\da-f]/i.test(address)) return false;
  if (halves.length === 2) return groups.length >= 2 && groups.length <= 7;
  return halves.length === 1 && groups.length === 8 && address.split(':').length === 8;
}
