import type { Joint, Side, Urgency } from './case.js';

/** An enumeration as names with the words shown for them. */
export type Words<T extends string = string> = Record<T, string>;

export const SEX = { female: 'Female', male: 'Male', other: 'Other', 'not-stated': 'Not stated' } as const;
export const BMI_BAND = {
  'under-18.5': 'Under 18.5',
  '18.5-24.9': '18.5 to 24.9',
  '25-29.9': '25 to 29.9',
  '30-34.9': '30 to 34.9',
  '35-39.9': '35 to 39.9',
  '40-or-over': '40 or over',
} as const;
export const ASA = { I: 'I', II: 'II', III: 'III', IV: 'IV', V: 'V' } as const;
export const ANTICOAGULATION = {
  none: 'None',
  antiplatelet: 'Antiplatelet',
  'direct-oral': 'Direct oral anticoagulant',
  warfarin: 'Vitamin K antagonist',
  heparin: 'Heparin',
  other: 'Other',
} as const;
export const REASON_FOR_REVISION = {
  infection: 'Infection',
  instability: 'Instability',
  malposition: 'Malposition',
  loosening: 'Loosening',
  wear: 'Wear or osteolysis',
  'metal-reaction': 'Reaction to metal debris',
  fracture: 'Periprosthetic fracture',
  'implant-failure': 'Implant breakage',
  pain: 'Pain without a known cause',
  'leg-length': 'Leg length',
  other: 'Other',
} as const;
export const PART = {
  shell: 'Shell',
  liner: 'Liner',
  head: 'Head',
  stem: 'Stem',
  'cemented-cup': 'Cemented cup',
  cage: 'Cage or augment',
  'femoral-component': 'Femoral component',
  'tibial-component': 'Tibial component',
  'patellar-component': 'Patellar component',
  other: 'Other part',
} as const;
export const FIXATION = {
  'well-fixed': 'Well fixed',
  'probably-fixed': 'Probably fixed',
  loose: 'Loose',
  unknown: 'Unknown',
} as const;
export const MATERIAL = {
  titanium: 'Titanium alloy',
  tantalum: 'Porous tantalum',
  'cobalt-chrome': 'Cobalt-chromium',
  steel: 'Stainless steel',
  polyethylene: 'Polyethylene',
  'cross-linked-polyethylene': 'Cross-linked polyethylene',
  ceramic: 'Ceramic',
  'oxidised-zirconium': 'Oxidised zirconium',
  cement: 'Cement',
  unknown: 'Unknown',
} as const;
export const CERTAINTY = { certain: 'Certain', likely: 'Likely', unsure: 'Unsure' } as const;
export const KNOWN_FROM = {
  'operation-note': 'Operation note',
  'implant-sticker': 'Implant sticker',
  'radiograph-only': 'Radiograph only',
  other: 'Other',
} as const;
export const SHELL_SHAPE = { hemispherical: 'Hemispherical', flanged: 'Flanged', elliptical: 'Elliptical', finned: 'Finned', unknown: 'Unknown' } as const;
export const THICKNESS_CLASS = { thin: 'Thin (under 3 mm)', standard: 'Standard (3 to 5 mm)', thick: 'Thick (over 5 mm)', unknown: 'Unknown' } as const;
export const LINER_KIND = { standard: 'Standard', lipped: 'Lipped', constrained: 'Constrained', 'dual-mobility': 'Dual mobility', unknown: 'Unknown' } as const;
export const HEAD_DRIVE = { 'hex-3.5': 'Hexagonal 3.5 mm', 'hex-2.5': 'Hexagonal 2.5 mm', star: 'Star', cruciform: 'Cruciform', slot: 'Slot', unknown: 'Unknown' } as const;
export const QUADRANT = {
  posterosuperior: 'Posterosuperior',
  posteroinferior: 'Posteroinferior',
  anterosuperior: 'Anterosuperior',
  anteroinferior: 'Anteroinferior',
} as const;
export const SUSPICION = { none: 'None', possible: 'Possible', confirmed: 'Confirmed' } as const;
export const TIMING = { acute: 'Acute', chronic: 'Chronic' } as const;
export const LEUKOCYTE_ESTERASE = { negative: 'Negative', trace: 'Trace', '+': '+', '++': '++' } as const;
export const DIRECTION = { none: 'None', superior: 'Superior', superolateral: 'Superolateral', superomedial: 'Superomedial', medial: 'Medial' } as const;
export const ISCHIAL_LYSIS = { none: 'None', mild: 'Mild', moderate: 'Moderate', severe: 'Severe' } as const;
export const TEARDROP = { intact: 'Intact', moderate: 'Moderate destruction', partial: 'Partly destroyed', absent: 'Absent' } as const;
export const KOHLER = { intact: 'Intact', disrupted: 'Disrupted' } as const;
export const SUPERIOR_RIM = { intact: 'Intact', deficient: 'Deficient' } as const;
export const DEFECT_CLASS = { I: 'I', IIA: 'IIA', IIB: 'IIB', IIC: 'IIC', IIIA: 'IIIA', IIIB: 'IIIB' } as const;
export const STEP_KIND = {
  exposure: 'Exposure',
  liner: 'Liner',
  screws: 'Screws',
  interface: 'Interface',
  extraction: 'Extraction',
  'bone-inventory': 'Bone inventory',
  stem: 'Stem',
  cement: 'Cement',
  reconstruction: 'Reconstruction',
  other: 'Other',
} as const;
export const SECTOR_STATE = { fixed: 'Fixed', free: 'Free', slow: 'Slow part' } as const;
export const KIT_SOURCE = { hospital: 'Hospital stock', loan: 'Loan kit', unknown: 'Not settled' } as const;

export type Key<T> = Extract<keyof T, string>;

export interface Heading {
  title?: string;
  side?: Side | null;
  joint?: Joint;
  question?: string;
  urgency?: Urgency;
  urgencyReason?: string;
}

export interface Patient {
  /** Completed years; 90 stands for 90 and over. */
  ageYears?: number | null;
  sex?: Key<typeof SEX> | null;
  bmiBand?: Key<typeof BMI_BAND> | null;
  asa?: Key<typeof ASA> | null;
  /** Names of the 1987 comorbidity table. */
  comorbidities?: string[];
  comorbidityNote?: string;
  metalAllergy?: string;
  cementAllergy?: string;
  antibioticAllergy?: string;
  anticoagulation?: Key<typeof ANTICOAGULATION> | null;
  anticoagulationNote?: string;
  function?: string;
}

export interface EarlierOperation {
  id: string;
  /** '9 years ago', never a date. */
  interval: string;
  procedure: string;
}

export interface History {
  indexDiagnosis?: string;
  indexInterval?: string;
  operations?: EarlierOperation[];
  reasons?: Key<typeof REASON_FOR_REVISION>[];
  course?: string;
}

export interface Screw {
  id: string;
  /** Hour on the rim clock, 1 to 12. */
  hour?: number | null;
  quadrant?: Key<typeof QUADRANT> | null;
  lengthMm?: number | null;
  headDrive?: Key<typeof HEAD_DRIVE> | null;
  tipInsidePelvis?: boolean | null;
}

export interface ImplantPart {
  id: string;
  part: Key<typeof PART>;
  fixation?: Key<typeof FIXATION> | null;
  material?: Key<typeof MATERIAL> | null;
  /** Catalogue entry, or 'unknown'. */
  maker?: string;
  model?: string;
  sizeMm?: number | null;
  certainty?: Key<typeof CERTAINTY> | null;
  knownFrom?: Key<typeof KNOWN_FROM> | null;
  outerDiameterMm?: number | null;
  innerDiameterMm?: number | null;
  thicknessMm?: number | null;
  thicknessClass?: Key<typeof THICKNESS_CLASS> | null;
  shape?: Key<typeof SHELL_SHAPE> | null;
  screwHoles?: boolean | null;
  screws?: Screw[];
  linerKind?: Key<typeof LINER_KIND> | null;
  locking?: string;
  note?: string;
}

export interface Culture {
  id: string;
  specimen: string;
  result: string;
  organism?: string;
  sensitivities?: string;
}

export interface InfectionWorkUp {
  suspicion?: Key<typeof SUSPICION> | null;
  timing?: Key<typeof TIMING> | null;
  sampling?: string;
  sinusTract?: boolean | null;
  sameOrganismCultures?: number | null;
  crpMgL?: number | null;
  dDimerUgL?: number | null;
  esrMmH?: number | null;
  synovialWbcPerUl?: number | null;
  leukocyteEsterase?: Key<typeof LEUKOCYTE_ESTERASE> | null;
  alphaDefensin?: boolean | null;
  pmnPercent?: number | null;
  synovialCrpMgL?: number | null;
  histologyPositive?: boolean | null;
  purulence?: boolean | null;
  singlePositiveCulture?: boolean | null;
  cultures?: Culture[];
  histology?: string;
}

export interface BoneAndPosition {
  migrationMm?: number | null;
  direction?: Key<typeof DIRECTION> | null;
  ischialLysis?: Key<typeof ISCHIAL_LYSIS> | null;
  teardrop?: Key<typeof TEARDROP> | null;
  kohler?: Key<typeof KOHLER> | null;
  superiorRim?: Key<typeof SUPERIOR_RIM> | null;
  transverseLine?: boolean | null;
  column?: string;
  readersClass?: Key<typeof DEFECT_CLASS> | null;
  inclinationDeg?: number | null;
  versionDeg?: number | null;
  hipCentreHeightMm?: number | null;
  legLengthMm?: number | null;
  note?: string;
}

export interface PlanStep {
  id: string;
  kind: Key<typeof STEP_KIND>;
  method: string;
  tool?: string;
  fallback?: string;
  hazard?: string;
  who?: string;
}

export interface RimSector {
  /** 1 to 12. */
  hour: number;
  state?: Key<typeof SECTOR_STATE> | null;
  /** Place in the cutting order; null while not settled. */
  order?: number | null;
  note?: string;
}

export interface KitItem {
  id: string;
  item: string;
  size?: string;
  stepId?: string | null;
  source?: Key<typeof KIT_SOURCE> | null;
  confirmed?: boolean;
}

export interface RemovalPlan {
  steps?: PlanStep[];
  rim?: RimSector[];
  kit?: KitItem[];
  reconstruction?: string;
  expectedNextShellMm?: number | null;
  expectedBoneLoss?: string;
}

export interface CaseOption {
  id: string;
  title: string;
  description?: string;
  /** The presenter's own proposal. */
  isProposal?: boolean;
}

/** All that is written of a case; images stand in their own table. */
export interface CaseContent {
  heading: Heading;
  patient: Patient;
  history: History;
  implants: { parts?: ImplantPart[] };
  infection: InfectionWorkUp;
  bone: BoneAndPosition;
  plan: RemovalPlan;
  options: { options?: CaseOption[] };
}

export const CONTENT_SECTIONS = ['heading', 'patient', 'history', 'implants', 'infection', 'bone', 'plan', 'options'] as const;
export type ContentSection = (typeof CONTENT_SECTIONS)[number];

export const emptyContent = (): CaseContent => ({
  heading: {},
  patient: {},
  history: {},
  implants: {},
  infection: {},
  bone: {},
  plan: {},
  options: {},
});
