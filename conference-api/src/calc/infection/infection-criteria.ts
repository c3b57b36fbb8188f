import type { FindingName, KnownFindings } from './infection-findings.js';

/** Met, not met, or not known. */
export type CriterionState = boolean | null;

/** The numeric findings a definition sets a threshold for; a value must be over it. */
export type Thresholds = Partial<
  Record<'crpMgL' | 'dDimerUgL' | 'esrMmH' | 'synovialWbcPerUl' | 'pmnPercent' | 'synovialCrpMgL', number>
>;

const UNITS = {
  crpMgL: 'mg/L',
  dDimerUgL: 'µg/L',
  esrMmH: 'mm/h',
  synovialWbcPerUl: 'per µL',
  pmnPercent: '%',
  synovialCrpMgL: 'mg/L',
} as const;

/** Whether each finding meets its criterion; strictly over the threshold. */
export function criterionStates(
  findings: KnownFindings,
  thresholds: Thresholds,
): Record<FindingName, CriterionState> {
  const over = (name: keyof typeof UNITS): CriterionState => {
    const threshold = thresholds[name];
    const value = findings[name];
    return threshold === undefined || value === null ? null : value > threshold;
  };
  return {
    sinusTract: findings.sinusTract,
    sameOrganismCultures: findings.sameOrganismCultures === null ? null : findings.sameOrganismCultures >= 2,
    crpMgL: over('crpMgL'),
    dDimerUgL: over('dDimerUgL'),
    esrMmH: over('esrMmH'),
    synovialWbcPerUl: over('synovialWbcPerUl'),
    leukocyteEsterase: findings.leukocyteEsterase === null ? null : findings.leukocyteEsterase === '++',
    alphaDefensin: findings.alphaDefensin,
    pmnPercent: over('pmnPercent'),
    synovialCrpMgL: over('synovialCrpMgL'),
    histologyPositive: findings.histologyPositive,
    purulence: findings.purulence,
    singlePositiveCulture: findings.singlePositiveCulture,
  };
}

/** True if any is true, else null if any is not known, else false. */
export function anyOf(states: readonly CriterionState[]): CriterionState {
  if (states.includes(true)) return true;
  return states.includes(null) ? null : false;
}

/** False if any is false, else null if any is not known, else true. */
export function allOf(states: readonly CriterionState[]): CriterionState {
  if (states.includes(false)) return false;
  return states.includes(null) ? null : true;
}

/** What a missing finding would have to be, in words. */
export function positiveInWords(name: FindingName, thresholds: Thresholds): string {
  if (name in UNITS) {
    const key = name as keyof typeof UNITS;
    return `over ${thresholds[key]} ${UNITS[key]}`;
  }
  if (name === 'sameOrganismCultures') return '2 or more';
  if (name === 'leukocyteEsterase') return '++';
  return 'positive';
}
