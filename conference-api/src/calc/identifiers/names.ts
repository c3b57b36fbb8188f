import type { Detector, FindingStrength } from './finding.js';
import { isGivenName } from './given-names.js';
import { isPrecededBy, markAfter, markMatches } from './scanning.js';
import type { Judge } from './scanning.js';

const CAPITAL = String.raw`\p{Lu}(?:'\p{Lu})?[\p{L}'-]{1,30}`;
const PARTICLES = String.raw`(?:(?:van|von|de|der|den|del|di|da|la|le|bin|al|el|ten|ter) ){0,2}`;
const INITIALS = String.raw`(?:\p{Lu}\.? ?){0,3}`;
const NAME = String.raw`${INITIALS}${PARTICLES}${CAPITAL}(?: ${PARTICLES}${CAPITAL}){0,3}`;
const FULL_NAME = new RegExp(String.raw`${NAME}(?!\p{L})`, 'yu');
const NAME_OR_INITIALS = new RegExp(String.raw`${NAME}(?!\p{L})|\p{Lu}\.? ?\p{Lu}\.?(?![\p{L}\d])`, 'yu');
const ANY_CASE_NAME = /\p{L}[\p{L}'.-]{1,30}(?:,? \p{L}[\p{L}'.-]{0,30}){0,2}(?![\p{L}\d])/yu;
const LOWER_SURNAME = /\p{Ll}[\p{L}'-]{2,30}(?!\p{L})/yu;

const STRONG_TITLE = /(?<!\p{L})(?:Mr|Mrs|Ms|Miss|Mx|Messrs|MRS|Mme|Mlle|Monsieur|Madame|Herrn?|Frau|Señora?|Signora?)\.? {1,2}/gu;
const WEAK_TITLE = /(?<!\p{L})(?:Dr|DR|dr|Prof|Professor|Doctor|Sir|Dame|Lord|Lady|Rev|Reverend|Nurse|Sister|Matron|Don|Doña|Dott|MR|MS)\.? {1,2}/gu;
const LOWER_TITLE = /(?<!\p{L})(?:mr|mrs|miss)\.? /gu;

const NAME_LABEL =
  /(?<!\p{L})(?<!file |implant |product |brand |trade |device |drug |generic |user )(?:patient'?s? name|pt name|full name|name|surname|last name|family name|first name|forenames?|given name|maiden name|n\.?o\.?k\.?|next of kin|emergency contact)(?: (?:is|was) |[ ]?[:=][ ]{0,3})/giu;
const CALLED_LABEL =
  /(?<!\p{L})(?:known as|named|called|nicknamed|alias|née|next of kin|n\.?o\.?k\.?|referred by|signed by|dictated by|employer|employed by|works for|patient named)[ :]{1,3}/giu;
const RELATIVE_LABEL =
  /(?<!\p{L})(?:wife|husband|son|daughter|mother|father|brother|sister|partner|spouse|aunt|uncle|niece|nephew|grandson|granddaughter|cousin|neighbour|neighbor|carer|mum|dad|friend)(?:,? named|,? called| is|,)? /giu;
const PERSON_LABEL =
  /(?<!\p{L})(?:patient|pt\.?|surgeon|consultant|registrar|anaesthetist|GP|physician|operator|radiologist|assistant|seen by|reviewed by|operated by|performed by|reported by|implanted by|revised by|discussed with|d\/w|care of)[ :]{1,3}/giu;
const INITIALS_LABEL = /\binitials?(?: (?:are|is))?[ :]{1,3}/gi;
const INITIALS_VALUE = /\p{Lu}\.? ?\p{Lu}\.?(?: ?\p{Lu}\.?)?(?![\p{L}\d])/yu;

const CARET_NAME = /(?<![\p{L}^])\p{L}[\p{L}' -]{1,40}\^\p{L}[\p{L}' .-]{0,40}(?:\^[\p{L}' .-]{0,20}){0,3}/gu;
const SURNAME_FIRST = new RegExp(String.raw`(?<!\p{L})\p{Lu}[\p{L}'-]{1,30}, ?(\p{Lu}\p{L}{1,20})(?!\p{L})`, 'gu');
const TWO_CAPITALS = new RegExp(String.raw`(?<![\p{L}-])(\p{Lu}\p{L}{1,20})(?:-\p{Lu}\p{L}{1,20})?(?: \p{Lu}\.?)? ${PARTICLES}(${CAPITAL})(?!\p{L})`, 'gu');
const ONE_CAPITAL = /(?<![\p{L}-])\p{Lu}\p{Ll}{1,20}(?![\p{L}-])/gu;

// What follows a person's name when it names a thing.
const EPONYM_AFTER =
  /^(?:'s?)? (?:\p{Lu}\p{L}{1,20} )?(?:tests?|signs?|scores?|views?|classification|class|approach|bandage|splint|index|lines?|criteria|types?|grade|needle|osteotomy|procedure|angle|triangle|zones?|stage|retractor|method|system|table|traction|fracture|nail|pin|wires?|disease|syndrome|et al|and others|hip|knee|cup|stem)(?!\p{L})/u;

const NOT_NAMES = new Set(
  (
    'the this that these those his her their our your its and or but not no none nil unknown withheld redacted anonymous anonymised ' +
    'deidentified de-identified removed female male man woman patient patients lady gentleman has had have was were is are will would ' +
    'with without who which what when where since after before for from of in on at to by as an all any both each other same new old ' +
    'left right hip knee bilateral primary revision total cemented uncemented acetabular femoral stem shell cup liner head screw screws ' +
    'pain infection fracture dislocation loosening wear osteolysis instability surgery surgeon surgeons consultant consultants team ' +
    'microbiology radiology orthopaedics orthopaedic orthopedics plastics plastic vascular anaesthesia anaesthetics physiotherapy ' +
    'pharmacy theatre ward clinic clinics hospital outpatient unit panel panellist chair coordinator presenter observer nurse senior ' +
    'junior fellow registrar led practitioner specialist dr mr mrs ms miss prof doctor professor scan imaging image images arthrogram ' +
    'sequence sequences mri ct asa bmi crp esr pmn wbc inr bp id mr us uk ap dvt pe copd iv im uti nsaid tha thr tka rom icu itu hdu ' +
    'dair pji ok age aged details information history height weight declined reports reported presents presented complains currently ' +
    'lives now also then there here he she they we you it if so yes because due type class grade stage option plan case see seen'
  ).split(' '),
);

/** Names of people by title, label, relation, form or common given name. */
export const findNames: Detector = (text) => [
  ...markAfter(text, 'name', { label: STRONG_TITLE, value: NAME_OR_INITIALS }, unlessWord('certain')),
  ...markAfter(text, 'name', { label: WEAK_TITLE, value: FULL_NAME }, unlessWord('likely')),
  ...markAfter(text, 'name', { label: LOWER_TITLE, value: LOWER_SURNAME }, unlessWord('likely')),
  ...markAfter(text, 'name', { label: NAME_LABEL, value: ANY_CASE_NAME }, unlessWord('certain')),
  ...markAfter(text, 'name', { label: CALLED_LABEL, value: FULL_NAME }, unlessWord('likely')),
  ...markAfter(text, 'name', { label: RELATIVE_LABEL, value: FULL_NAME }, unlessWord('likely')),
  ...markAfter(text, 'name', { label: PERSON_LABEL, value: FULL_NAME }, unlessWord('possible')),
  ...markAfter(text, 'name', { label: PERSON_LABEL, value: INITIALS_VALUE }, unlessWord('possible')),
  ...markAfter(text, 'name', { label: INITIALS_LABEL, value: INITIALS_VALUE }, unlessWord('likely')),
  ...markMatches(text, 'name', CARET_NAME, 'likely'),
  ...markMatches(text, 'name', SURNAME_FIRST, ([, given = '']) => (isGivenName(given) ? 'likely' : null)),
  ...markMatches(text, 'name', TWO_CAPITALS, judgeTwoCapitals),
  ...markMatches(text, 'name', ONE_CAPITAL, judgeOneCapital),
];

const isWord = (word: string): boolean => NOT_NAMES.has(word.toLowerCase());

function unlessWord(strength: FindingStrength): Judge {
  return ([name]) => (isWord(/^[\p{L}'-]{1,40}/u.exec(name)?.[0] ?? '') ? null : strength);
}

const judgeTwoCapitals: Judge = (match, text) => {
  const [, given = '', family = ''] = match;
  if (!isGivenName(given) || isWord(family)) return null;
  return isEponym(match, text) ? null : 'likely';
};

const judgeOneCapital: Judge = (match, text) =>
  isGivenName(match[0]) && !isEponym(match, text) ? 'possible' : null;

function isEponym(match: RegExpMatchArray, text: string): boolean {
  const end = (match.index ?? 0) + match[0].length;
  return EPONYM_AFTER.test(text.slice(end, end + 48)) || isPrecededBy(text, end, /\b(?:Robert Jones)$/, 16);
}
