import type { Detector } from './finding.js';
import { markAfter, markMatches, trimmed } from './scanning.js';
import type { Judge } from './scanning.js';

// Labels of implants and machines. 'serial', 'lot' and 'batch' are also plain words, so they need
// a word for number or a colon, or a token that no plain word leads to.
const SAID = String.raw`(?:[ .]{0,2}(?:no|nr|number|code|#)\b\.?)`;
const STRONG_LABEL = new RegExp(
  String.raw`\b(?:serial${SAID}|serial(?=[:#])|s\/n|lot${SAID}|lot(?=[:#])|batch${SAID}|batch(?=[:#])|UDI(?:-DI|-PI)?${SAID}?|GTIN|device (?:id|identifier)|implant (?:id|identifier|serial)${SAID}?|IMEI)(?: (?:is|was))?[ :#=.-]{0,4}`,
  'gi',
);
const WEAK_LABEL = /\b(?:LOT|Lot|lot|SN|BATCH|Batch|batch|serial|Serial|SERIAL) /g;
const TOKEN = /[A-Za-z]{0,6}[-/]?\d[A-Za-z\d/.()-]{1,40}/y;
const UDI = /\(01\)\d{14}(?:\(\d{2}\)[^\s(),;]{1,20}){0,6}/g;
const UDI_PLAIN = /(?<!\d)01\d{14}(?:11|17)\d{6}(?:10|21)[A-Za-z\d-]{1,20}/g;
const HIBC = /(?<![\w+])\+[A-Z]\d{3}[A-Z\d]{5,20}\/\$\$?[A-Z\d]{1,30}/g;
const MAC = /(?<![\da-f:-])[\da-f]{2}(?:([:-])[\da-f]{2})(?:\1[\da-f]{2}){4}(?![\da-f:-])/gi;

/** Serial, lot and device identifiers. Sizes of implants are none. */
export const findDeviceSerials: Detector = (text) => [
  ...trimmed(text, markAfter(text, 'device-serial', { label: STRONG_LABEL, value: TOKEN }, ofLength(3, 'certain'))),
  ...trimmed(text, markAfter(text, 'device-serial', { label: WEAK_LABEL, value: TOKEN }, ofLength(5, 'likely'))),
  ...markMatches(text, 'device-serial', UDI, 'certain'),
  ...markMatches(text, 'device-serial', UDI_PLAIN, 'likely'),
  ...markMatches(text, 'device-serial', HIBC, 'likely'),
  ...markMatches(text, 'device-serial', MAC, 'likely'),
];

const ofLength =
  (least: number, strength: 'certain' | 'likely'): Judge =>
  ([token]) =>
    token.length >= least ? strength : null;
