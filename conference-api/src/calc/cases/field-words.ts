import { CHARLSON_CONDITION_WORDS } from '../vocabulary/comorbidities.js';
import { JOINT_WORDS, SIDE_WORDS, URGENCY_WORDS } from '../vocabulary/case.js';
import type { ContentSection, Words } from '../vocabulary/case-content.js';
import * as words from '../vocabulary/case-content.js';

/** A field as people name it; `kind` says how its value is put in words. From `openFrom` on, a number stands for itself and over. */
export type FieldWords =
  | { kind: 'text' | 'flag' | 'id'; label: string }
  | { kind: 'number'; label: string; unit?: string; openFrom?: number }
  | { kind: 'one' | 'many'; label: string; words: Words }
  | { kind: 'list'; label: string; item: ItemWords };

/** The items of a list: what tells them apart, and what one is called. */
export interface ItemWords {
  key: 'id' | 'hour';
  /** The name of one item, for example of a part: 'Shell'. */
  name: (item: Record<string, unknown>) => string;
  fields: Record<string, FieldWords>;
}

/** Age groups end here: 90 stands for 90 and over. Source: 45 CFR 164.514(b)(2)(i)(C). */
export const OLDEST_AGE_YEARS = 90;

const text = (label: string): FieldWords => ({ kind: 'text', label });
const flag = (label: string): FieldWords => ({ kind: 'flag', label });
const number = (label: string, unit?: string): FieldWords => ({ kind: 'number', label, ...(unit ? { unit } : {}) });
const one = (label: string, names: Words): FieldWords => ({ kind: 'one', label, words: names });
const many = (label: string, names: Words): FieldWords => ({ kind: 'many', label, words: names });
const list = (label: string, item: ItemWords): FieldWords => ({ kind: 'list', label, item });

const said = (value: unknown, fallback: string): string => {
  const line = typeof value === 'string' ? value.trim().replace(/\s+/g, ' ') : '';
  if (!line) return fallback;
  return line.length > 60 ? `${line.slice(0, 59)}…` : line;
};
const worded = (names: Words, value: unknown, fallback: string): string => names[String(value)] ?? fallback;

const SCREW: ItemWords = {
  key: 'id',
  name: (screw) => (typeof screw.hour === 'number' ? `Screw at ${screw.hour} o’clock` : 'Screw'),
  fields: {
    hour: number('hour'),
    quadrant: one('quadrant', words.QUADRANT),
    lengthMm: number('length', 'mm'),
    headDrive: one('head drive', words.HEAD_DRIVE),
    tipInsidePelvis: flag('tip inside the pelvis'),
  },
};

const PART: ItemWords = {
  key: 'id',
  name: (part) => worded(words.PART, part.part, 'Part'),
  fields: {
    part: one('part', words.PART),
    fixation: one('fixation', words.FIXATION),
    material: one('material', words.MATERIAL),
    maker: text('maker'),
    model: text('model'),
    sizeMm: number('size', 'mm'),
    certainty: one('how sure', words.CERTAINTY),
    knownFrom: one('known from', words.KNOWN_FROM),
    outerDiameterMm: number('outer diameter', 'mm'),
    innerDiameterMm: number('inner diameter', 'mm'),
    thicknessMm: number('thickness', 'mm'),
    thicknessClass: one('thickness class', words.THICKNESS_CLASS),
    shape: one('shape', words.SHELL_SHAPE),
    screwHoles: flag('screw holes'),
    screws: list('screws', SCREW),
    linerKind: one('kind of liner', words.LINER_KIND),
    locking: text('locking mechanism'),
    note: text('note'),
  },
};

const OPERATION: ItemWords = {
  key: 'id',
  name: (operation) => said(operation.procedure, 'Earlier operation'),
  fields: { interval: text('interval'), procedure: text('procedure') },
};

const CULTURE: ItemWords = {
  key: 'id',
  name: (culture) => `Culture, ${said(culture.specimen, 'no specimen named')}`,
  fields: { specimen: text('specimen'), result: text('result'), organism: text('organism'), sensitivities: text('sensitivities') },
};

const STEP: ItemWords = {
  key: 'id',
  name: (step) => `Step: ${worded(words.STEP_KIND, step.kind, 'other').toLowerCase()}`,
  fields: {
    kind: one('kind', words.STEP_KIND),
    method: text('method'),
    tool: text('tool'),
    fallback: text('fallback'),
    hazard: text('hazard'),
    who: text('who'),
  },
};

const SECTOR: ItemWords = {
  key: 'hour',
  name: (sector) => `Rim at ${String(sector.hour)} o’clock`,
  fields: { state: one('state', words.SECTOR_STATE), order: number('place in the cutting order'), note: text('note') },
};

const KIT: ItemWords = {
  key: 'id',
  name: (item) => `Kit: ${said(item.item, 'no name')}`,
  fields: {
    item: text('item'),
    size: text('size'),
    stepId: { kind: 'id', label: 'step' },
    source: one('source', words.KIT_SOURCE),
    confirmed: flag('confirmed'),
  },
};

const OPTION: ItemWords = {
  key: 'id',
  name: (option) => `Option: ${said(option.title, 'no title')}`,
  fields: { title: text('title'), description: text('description'), isProposal: flag('presenter’s proposal') },
};

/** Every field of the content, in the order of the sheet, with its words. */
export const FIELD_WORDS: Record<ContentSection, Record<string, FieldWords>> = {
  heading: {
    title: text('Title'),
    side: one('Side', SIDE_WORDS),
    joint: one('Joint', JOINT_WORDS),
    question: text('Question to the panel'),
    urgency: one('Urgency', URGENCY_WORDS),
    urgencyReason: text('Reason for the urgency'),
  },
  patient: {
    ageYears: { kind: 'number', label: 'Age', unit: 'years', openFrom: OLDEST_AGE_YEARS },
    sex: one('Sex', words.SEX),
    bmiBand: one('BMI', words.BMI_BAND),
    asa: one('ASA class', words.ASA),
    comorbidities: many('Comorbidities', CHARLSON_CONDITION_WORDS),
    comorbidityNote: text('Note on comorbidities'),
    metalAllergy: text('Metal allergy'),
    cementAllergy: text('Cement allergy'),
    antibioticAllergy: text('Antibiotic allergy'),
    anticoagulation: one('Anticoagulation', words.ANTICOAGULATION),
    anticoagulationNote: text('Note on anticoagulation'),
    function: text('Function'),
  },
  history: {
    indexDiagnosis: text('Index diagnosis'),
    indexInterval: text('Interval since the index operation'),
    operations: list('Earlier operations', OPERATION),
    reasons: many('Reason for revision', words.REASON_FOR_REVISION),
    course: text('Course'),
  },
  implants: { parts: list('Parts', PART) },
  infection: {
    suspicion: one('Suspicion of infection', words.SUSPICION),
    timing: one('Timing', words.TIMING),
    sampling: text('Sampling interval'),
    sinusTract: flag('Sinus tract'),
    sameOrganismCultures: number('Cultures with the same organism'),
    crpMgL: number('CRP', 'mg/L'),
    dDimerUgL: number('D-dimer', 'µg/L'),
    esrMmH: number('ESR', 'mm/h'),
    synovialWbcPerUl: number('Synovial cell count', '/µL'),
    leukocyteEsterase: one('Leukocyte esterase', words.LEUKOCYTE_ESTERASE),
    alphaDefensin: flag('Alpha-defensin positive'),
    pmnPercent: number('Synovial PMN', '%'),
    synovialCrpMgL: number('Synovial CRP', 'mg/L'),
    histologyPositive: flag('Histology positive'),
    purulence: flag('Purulence'),
    singlePositiveCulture: flag('Single positive culture'),
    cultures: list('Cultures', CULTURE),
    histology: text('Histology'),
  },
  bone: {
    migrationMm: number('Migration', 'mm'),
    direction: one('Direction of migration', words.DIRECTION),
    ischialLysis: one('Ischial lysis', words.ISCHIAL_LYSIS),
    teardrop: one('Teardrop', words.TEARDROP),
    kohler: one('Köhler line', words.KOHLER),
    superiorRim: one('Superior rim', words.SUPERIOR_RIM),
    transverseLine: flag('Transverse line through the acetabulum'),
    column: text('Column'),
    readersClass: one('Reader’s own defect class', words.DEFECT_CLASS),
    inclinationDeg: number('Inclination', '°'),
    versionDeg: number('Version', '°'),
    hipCentreHeightMm: number('Height of the hip centre', 'mm'),
    legLengthMm: number('Leg length', 'mm'),
    note: text('Note'),
  },
  plan: {
    steps: list('Steps', STEP),
    rim: list('Rim', SECTOR),
    kit: list('Kit', KIT),
    reconstruction: text('Reconstruction intended'),
    expectedNextShellMm: number('Expected next shell', 'mm'),
    expectedBoneLoss: text('Expected bone loss'),
  },
  options: { options: list('Options', OPTION) },
};

/** True where a field says nothing: absent, null, empty text or an empty list. */
export const saysNothing = (value: unknown): boolean =>
  value === undefined || value === null || (typeof value === 'string' && value.trim() === '') || (Array.isArray(value) && value.length === 0);

const UNITS_WITHOUT_SPACE = ['°', '/µL'];

function numberInWords({ unit, openFrom }: { unit?: string; openFrom?: number }, value: number): string {
  const measured = unit ? `${value}${UNITS_WITHOUT_SPACE.includes(unit) ? '' : ' '}${unit}` : String(value);
  return openFrom !== undefined && value >= openFrom ? `${measured} and over` : measured;
}

/** A value in words; null where it says nothing. Lists of items are worded by their names. */
export function valueInWords(field: FieldWords, value: unknown): string | null {
  if (saysNothing(value)) return null;
  switch (field.kind) {
    case 'number':
      return numberInWords(field, Number(value));
    case 'flag':
      return value === true ? 'Yes' : 'No';
    case 'one':
      return field.words[String(value)] ?? String(value);
    case 'many':
      return (value as string[]).map((name) => field.words[name] ?? name).sort().join(', ');
    case 'list':
      return (value as Record<string, unknown>[]).map(field.item.name).join(', ');
    default:
      return String(value);
  }
}
