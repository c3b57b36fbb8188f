import { optionalChoice, readBody } from '../common/optional-input.js';
import { infectionCautions } from './infection-cautions.js';
import { allOf, anyOf, criterionStates, positiveInWords } from './infection-criteria.js';
import type { CriterionState, Thresholds } from './infection-criteria.js';
import { INFECTION_FIELDS, INFECTION_VARIANTS, readFindings, readTiming } from './infection-findings.js';
import type { FindingName, InfectionFindings, InfectionTiming, InfectionVariant } from './infection-findings.js';

export interface Infection2013Input extends InfectionFindings {
  /** Accepted so that one form fits both definitions; without effect here. */
  variant?: InfectionVariant | null;
  timing: InfectionTiming;
}

export type Infection2013Verdict = 'infected' | 'not-infected';
export type Infection2013Criterion =
  | 'serum-crp-and-esr'
  | 'synovial-count-or-esterase'
  | 'synovial-neutrophils'
  | 'histology'
  | 'single-culture';

/** What the result would be if this one missing finding were positive. */
export interface Infection2013Change {
  field: FindingName;
  ifItWere: string;
  criteriaMet: number;
  verdict: Infection2013Verdict;
}

export interface Infection2013Result {
  /** Minor criteria met, 0 to 5. */
  criteriaMet: number;
  /** Which minor criteria are met. */
  criteria: Infection2013Criterion[];
  /** Major criteria that are met; one alone decides. */
  majorCriteria: FindingName[];
  verdict: Infection2013Verdict;
  missing: FindingName[];
  /** Minor criteria met if every missing finding were positive. */
  highestPossibleCriteria: number;
  /** The missing findings that would change the verdict on their own. */
  wouldChange: Infection2013Change[];
  definition: string;
  cautions: string[];
}

export const INFECTION_2013_FIELDS = INFECTION_FIELDS;

type States = Record<FindingName, CriterionState>;

const THRESHOLDS: Record<InfectionTiming, Thresholds> = {
  acute: { crpMgL: 100, esrMmH: 30, synovialWbcPerUl: 10_000, pmnPercent: 90 },
  chronic: { crpMgL: 10, esrMmH: 30, synovialWbcPerUl: 3000, pmnPercent: 80 },
};

const MAJOR: readonly FindingName[] = ['sinusTract', 'sameOrganismCultures'];
const MINOR: readonly FindingName[] = [
  'crpMgL',
  'esrMmH',
  'synovialWbcPerUl',
  'leukocyteEsterase',
  'pmnPercent',
  'histologyPositive',
  'singlePositiveCulture',
];

/**
 * The definition of 2013: infected with one major criterion, or with 3 or more of 5 minor ones.
 * Raised CRP and raised ESR make one criterion together; neither counts alone. D-dimer,
 * alpha-defensin, synovial CRP and purulence have no role and are not listed as missing.
 * `not-infected` means that the definition is not met on what is known.
 *
 * Values count only when strictly over the threshold. Units and ranges: see InfectionFindings.
 * Throws CalcInputError with the field.
 * Source: josr-online s13018-021-02296-7 Table 1; thresholds PMC6678965 Table 1.
 */
export function calculateInfection2013(input: Infection2013Input): Infection2013Result {
  optionalChoice(readBody(input).variant, 'variant', INFECTION_VARIANTS);
  const timing = readTiming(input);
  const findings = readFindings(input);
  const states = criterionStates(findings, THRESHOLDS[timing]);
  const missing = [...MAJOR, ...MINOR].filter((name) => findings[name] === null);
  const { criteria, verdict } = assess(states);
  const best = { ...states, ...Object.fromEntries(missing.map((name) => [name, true])) } as States;
  const wouldChange = changes(states, missing, THRESHOLDS[timing]);
  return {
    criteriaMet: criteria.length,
    criteria,
    majorCriteria: MAJOR.filter((name) => states[name] === true),
    verdict,
    missing,
    highestPossibleCriteria: assess(best).criteria.length,
    wouldChange,
    definition: `MSIS/ICM definition of periprosthetic joint infection, 2013, ${timing} thresholds`,
    cautions: [
      ...timingCautions(timing),
      ...infectionCautions(findings),
      ...(verdict === 'not-infected' && missing.length > 0
        ? ['Not infected means only that the definition is not met on what is known.']
        : []),
    ],
  };
}

function assess(states: States): { criteria: Infection2013Criterion[]; verdict: Infection2013Verdict } {
  const minor: [Infection2013Criterion, CriterionState][] = [
    ['serum-crp-and-esr', allOf([states.crpMgL, states.esrMmH])],
    ['synovial-count-or-esterase', anyOf([states.synovialWbcPerUl, states.leukocyteEsterase])],
    ['synovial-neutrophils', states.pmnPercent],
    ['histology', states.histologyPositive],
    ['single-culture', states.singlePositiveCulture],
  ];
  const criteria = minor.filter(([, state]) => state === true).map(([name]) => name);
  const major = MAJOR.some((name) => states[name] === true);
  return { criteria, verdict: major || criteria.length >= 3 ? 'infected' : 'not-infected' };
}

function changes(states: States, missing: readonly FindingName[], thresholds: Thresholds): Infection2013Change[] {
  const now = assess(states).verdict;
  return missing
    .map((field) => {
      const { criteria, verdict } = assess({ ...states, [field]: true });
      return { field, ifItWere: positiveInWords(field, thresholds), criteriaMet: criteria.length, verdict };
    })
    .filter((change) => change.verdict !== now);
}

function timingCautions(timing: InfectionTiming): string[] {
  const common = ['Purulence, D-dimer, alpha-defensin and synovial CRP are not part of this definition.'];
  if (timing === 'chronic') return common;
  return [
    ...common,
    'The acute criteria were never validated on acute infections.',
    'An ESR over 30 mm/h is asked for in acute infection too; other copies of the table give it no role there (from memory).',
  ];
}
