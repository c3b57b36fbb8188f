import type { FieldSpec } from '../common/field-spec.js';
import { requireChoice } from '../common/input-checks.js';
import { optionalBoolean, optionalChoice, optionalNumber, readBody } from '../common/optional-input.js';
import type { NumberLimits } from '../common/optional-input.js';

export const INFECTION_VARIANTS = ['original', 'consensus'] as const;
export type InfectionVariant = (typeof INFECTION_VARIANTS)[number];
export const INFECTION_TIMINGS = ['acute', 'chronic'] as const;
export type InfectionTiming = (typeof INFECTION_TIMINGS)[number];
export const ESTERASE_GRADES = ['negative', 'trace', '+', '++'] as const;
export type EsteraseGrade = (typeof ESTERASE_GRADES)[number];

/** The findings of an infection work-up. Null or absent is not known, never negative. */
export interface InfectionFindings {
  /** Sinus tract to the joint, or the prosthesis in view. */
  sinusTract?: boolean | null;
  /** Positive cultures that grew one and the same organism: 0 to 100. */
  sameOrganismCultures?: number | null;
  /** Serum CRP in mg/L (not mg/dL): 0 to 1000. */
  crpMgL?: number | null;
  /** D-dimer in µg/L, which is ng/mL: 0 to 200 000. */
  dDimerUgL?: number | null;
  /** ESR in mm/h: 0 to 200. */
  esrMmH?: number | null;
  /** Synovial leukocytes per µL: 0 to 1 000 000. */
  synovialWbcPerUl?: number | null;
  leukocyteEsterase?: EsteraseGrade | null;
  /** Positive: signal to cut-off ratio over 1. */
  alphaDefensin?: boolean | null;
  /** Share of neutrophils in the synovial fluid in percent: 0 to 100. */
  pmnPercent?: number | null;
  /** Synovial CRP in mg/L: 0 to 1000. */
  synovialCrpMgL?: number | null;
  /** More than 5 neutrophils in each of 5 high-power fields. */
  histologyPositive?: boolean | null;
  purulence?: boolean | null;
  singlePositiveCulture?: boolean | null;
}

export type FindingName = keyof InfectionFindings;
export type KnownFindings = { readonly [K in FindingName]-?: Exclude<InfectionFindings[K], undefined> };

/** The body's fields and their JSON types, shared by both definitions. */
export const INFECTION_FIELDS: readonly FieldSpec[] = [
  { name: 'variant', type: 'string' },
  { name: 'timing', type: 'string' },
  { name: 'sinusTract', type: 'boolean' },
  { name: 'sameOrganismCultures', type: 'number' },
  { name: 'crpMgL', type: 'number' },
  { name: 'dDimerUgL', type: 'number' },
  { name: 'esrMmH', type: 'number' },
  { name: 'synovialWbcPerUl', type: 'number' },
  { name: 'leukocyteEsterase', type: 'string' },
  { name: 'alphaDefensin', type: 'boolean' },
  { name: 'pmnPercent', type: 'number' },
  { name: 'synovialCrpMgL', type: 'number' },
  { name: 'histologyPositive', type: 'boolean' },
  { name: 'purulence', type: 'boolean' },
  { name: 'singlePositiveCulture', type: 'boolean' },
];

// Wide enough for any value seen in practice; no source, they only catch slips of the unit or hand.
const LIMITS = {
  sameOrganismCultures: { min: 0, max: 100, integer: true },
  crpMgL: { min: 0, max: 1000, unit: 'mg/L' },
  dDimerUgL: { min: 0, max: 200_000, unit: 'µg/L' },
  esrMmH: { min: 0, max: 200, unit: 'mm/h' },
  synovialWbcPerUl: { min: 0, max: 1_000_000, unit: 'per µL' },
  pmnPercent: { min: 0, max: 100, unit: '%' },
  synovialCrpMgL: { min: 0, max: 1000, unit: 'mg/L' },
} satisfies Record<string, NumberLimits>;

/**
 * The findings with null for all that is not known.
 * Throws CalcInputError with the field: `type`, `integer`, `range` or `choice`.
 */
export function readFindings(input: InfectionFindings): KnownFindings {
  const body = readBody(input);
  const number = (name: keyof typeof LIMITS) => optionalNumber(body[name], name, LIMITS[name]);
  const flag = (name: FindingName) => optionalBoolean(body[name], name);
  return {
    sinusTract: flag('sinusTract'),
    sameOrganismCultures: number('sameOrganismCultures'),
    crpMgL: number('crpMgL'),
    dDimerUgL: number('dDimerUgL'),
    esrMmH: number('esrMmH'),
    synovialWbcPerUl: number('synovialWbcPerUl'),
    leukocyteEsterase: optionalChoice(body.leukocyteEsterase, 'leukocyteEsterase', ESTERASE_GRADES),
    alphaDefensin: flag('alphaDefensin'),
    pmnPercent: number('pmnPercent'),
    synovialCrpMgL: number('synovialCrpMgL'),
    histologyPositive: flag('histologyPositive'),
    purulence: flag('purulence'),
    singlePositiveCulture: flag('singlePositiveCulture'),
  };
}

/** Acute or chronic; required, since the thresholds hang on it. */
export function readTiming(input: { timing?: unknown }): InfectionTiming {
  return requireChoice(readBody(input).timing, 'timing', INFECTION_TIMINGS);
}
