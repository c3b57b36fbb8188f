import type { Detector } from './finding.js';
import { markAfter, markMatches, trimmed } from './scanning.js';
import type { Judge } from './scanning.js';

// The 124 postcode areas of the United Kingdom (common knowledge, no source).
const UK_AREAS = new Set(
  (
    'AB AL B BA BB BD BF BH BL BN BR BS BT CA CB CF CH CM CO CR CT CV CW DA DD DE DG DH DL DN DT DY E EC EH EN EX FK ' +
    'FY G GL GU GY HA HD HG HP HR HS HU HX IG IM IP IV JE KA KT KW KY L LA LD LE LL LN LS LU M ME MK ML N NE NG NN NP ' +
    'NR NW OL OX PA PE PH PL PO PR RG RH RM S SA SE SG SK SL SM SN SO SP SR SS ST SW SY TA TD TF TN TQ TR TS TW UB W ' +
    'WA WC WD WF WN WR WS WV YO ZE'
  ).split(' '),
);
const TOWN_BEFORE_POSTCODE =
  /(?<!\p{L})\p{Lu}\p{Ll}[\p{L}'-]{1,30}(?: \p{Lu}\p{Ll}[\p{L}'-]{1,30})?(?=,? [A-Z]{1,2}\d[A-Z\d]? \d[ABD-HJLNP-UW-Z]{2}(?![A-Za-z\d]))/gu;
const UK_POSTCODE = /(?<![A-Za-z\d])([A-Z]{1,2})\d[A-Z\d]? ?\d[ABD-HJLNP-UW-Z]{2}(?![A-Za-z\d])/g;
const CANADIAN_POSTCODE =
  /(?<![A-Za-z\d])[ABCEGHJ-NPRSTVXY]\d[ABCEGHJ-NPRSTV-Z][ -]?\d[ABCEGHJ-NPRSTV-Z]\d(?![A-Za-z\d])/g;
const STATE =
  'AL|AK|AZ|AR|CA|CO|CT|DE|DC|FL|GA|HI|ID|IL|IN|IA|KS|KY|LA|ME|MD|MA|MI|MN|MS|MO|MT|NE|NV|NH|NJ|NM|NY|NC|ND|OH|OK|OR|PA|RI|SC|SD|TN|TX|UT|VT|VA|WA|WV|WI|WY';
const ZIP_AFTER_STATE = new RegExp(String.raw`(?<=\b(?:${STATE}),? )\d{5}(?:-\d{4})?(?!\d)`, 'g');
const ZIP_PLUS_FOUR = /(?<![\d.,-])\d{5}-\d{4}(?![\d-])/g;
const POSTCODE_LABEL = /\b(?:post ?code|zip(?: ?code)?|postal code|plz|code postal)(?: (?:is|was))?[ :]{1,3}/gi;
const POSTCODE_VALUE = /[A-Za-z]{0,2}\d[A-Za-z\d]{1,4}(?:[ -]\d[A-Za-z\d]{1,3})?(?![A-Za-z\d])/y;

const CAPITAL = String.raw`\p{Lu}[\p{L}'.-]{0,30}`;
const STREET = new RegExp(
  String.raw`(?<![\d.,/\p{L}])\d{1,5}[A-Za-z]?,? (?:${CAPITAL} ){1,4}(?:Street|Str|St|Road|Rd|Avenue|Ave|Lane|Ln|Terrace|Crescent|Boulevard|Blvd|Gardens|Square|Mews)(?!\p{L})\.?`,
  'gu',
);
// Words that also mean something else at the operating table.
const WEAK_STREET = new RegExp(
  String.raw`(?<![\d.,/\p{L}])\d{1,5}[A-Za-z]?,? (?:${CAPITAL} ){1,4}(?:Drive|Close|Way|Court|Place|Row|Hill|Park|Green|Walk)(?!\p{L})`,
  'gu',
);
const FRENCH_STREET = new RegExp(
  String.raw`(?<![\d.,/\p{L}])\d{1,5}(?: ?(?:bis|ter))?,? (?:rue|avenue|boulevard|chemin|allée|impasse|via|calle|viale|piazza|plaza) (?:(?:de|du|des|la|le|della|del|di) ?){0,3}(?:l'|d')?${CAPITAL}`,
  'gu',
);
const GERMAN_STREET = /\p{Lu}[\p{L}-]{1,30}(?:straße|strasse|gasse|platz|allee|weg) \d{1,4}[a-z]?(?![\p{L}\d])/gu;
const POST_BOX = /\b(?:P\.? ?O\.? Box|Postfach) \d{1,6}\b/gi;
const ADDRESS_LABEL = /(?<!mail |web |ip |mac )\baddress(?: (?:is|was))?[:=] {0,3}/gi;
const ADDRESS_VALUE = /[^\n;:]{4,80}/y;

const HOUSE = new RegExp(
  String.raw`(?<!\p{L})(?:${CAPITAL} (?:of |and |the )?){1,4}(?:Hospitals?|Infirmary|Clinic|Medical Cent(?:re|er)|Health Cent(?:re|er)|Hospice|Care Home|Nursing Home|Klinik|Krankenhaus)(?!\p{L})`,
  'gu',
);
const HOUSE_FIRST = new RegExp(
  String.raw`(?<!\p{L})(?:Hôpital|Klinikum|Krankenhaus|Ospedale|Clinique|Ziekenhuis) (?:(?:de|du|des|la|le|di|del|van) ){0,2}${CAPITAL}(?: ${CAPITAL})?`,
  'gu',
);
const LIVES_LABEL = /\b(?:live[sd]? in|living in|resident (?:of|in)|moved (?:to|from)|native of|(?:village|town|city|county) of) /gi;
const PLACE_VALUE = new RegExp(String.raw`\p{Lu}\p{Ll}[\p{L}'-]{1,30}(?: \p{Lu}[\p{L}'-]{1,30}){0,2}`, 'yu');

// Words before 'Hospital' or 'Clinic' that say what kind it is, not which.
const KIND_OF_HOUSE = new Set(
  (
    'The This Our Your Their A An At In To From And Of District General Local Day Teaching University Regional Referring ' +
    'Community Private Central National Another Other Same Home Index First Second Third Receiving Treating Fracture Hip Knee ' +
    'Pain Revision Arthroplasty Orthopaedic Orthopedic Outpatient Infection Joint Wound Preoperative Trauma Follow-up Anaesthetic ' +
    'Anticoagulation Diabetic Previous Review Tertiary Acute Specialist Children Women Each Any Every No Patient Seen Admitted Dental'
  ).split(' '),
);

/** Postcodes, street addresses, named hospitals and places of residence. */
export const findPlaces: Detector = (text) => [
  ...markMatches(text, 'postcode', UK_POSTCODE, judgeUkPostcode),
  ...markMatches(text, 'place', TOWN_BEFORE_POSTCODE, 'possible'),
  ...markMatches(text, 'postcode', CANADIAN_POSTCODE, 'likely'),
  ...markMatches(text, 'postcode', ZIP_AFTER_STATE, 'likely'),
  ...markMatches(text, 'postcode', ZIP_PLUS_FOUR, 'possible'),
  ...markAfter(text, 'postcode', { label: POSTCODE_LABEL, value: POSTCODE_VALUE }, 'certain'),
  ...markMatches(text, 'address', STREET, 'likely'),
  ...markMatches(text, 'address', WEAK_STREET, 'possible'),
  ...markMatches(text, 'address', FRENCH_STREET, 'likely'),
  ...markMatches(text, 'address', GERMAN_STREET, 'likely'),
  ...markMatches(text, 'address', POST_BOX, 'likely'),
  ...trimmed(text, markAfter(text, 'address', { label: ADDRESS_LABEL, value: ADDRESS_VALUE }, 'likely')),
  ...markMatches(text, 'place', HOUSE, judgeHouse),
  ...markMatches(text, 'place', HOUSE_FIRST, 'likely'),
  ...markAfter(text, 'place', { label: LIVES_LABEL, value: PLACE_VALUE }, 'possible'),
];

const judgeUkPostcode: Judge = ([whole, area = '']) => {
  if (!UK_AREAS.has(area)) return null;
  return whole.includes(' ') ? 'likely' : 'possible';
};

const judgeHouse: Judge = ([whole]) => {
  const words = whole.replace(/ (?:Hospitals?|Infirmary|Clinic|Medical Cent\w+|Health Cent\w+|Hospice|Care Home|Nursing Home|Klinik|Krankenhaus)$/, '').split(' ');
  return words.some((word) => /^\p{Lu}/u.test(word) && !KIND_OF_HOUSE.has(word)) ? 'likely' : null;
};
