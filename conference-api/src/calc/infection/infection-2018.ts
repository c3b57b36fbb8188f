import { CalcInputError } from '../common/calc-input-error.js';
import { requireChoice } from '../common/input-checks.js';
import { readBody } from '../common/optional-input.js';
import { infectionCautions } from './infection-cautions.js';
import { anyOf, criterionStates, positiveInWords } from './infection-criteria.js';
import type { CriterionState, Thresholds } from './infection-criteria.js';
import { INFECTION_FIELDS, INFECTION_VARIANTS, readFindings, readTiming } from './infection-findings.js';
import type { FindingName, InfectionFindings, InfectionTiming, InfectionVariant } from './infection-findings.js';

export interface Infection2018Input extends InfectionFindings {
  variant: InfectionVariant;
  timing: InfectionTiming;
}

export type Infection2018Verdict = 'infected' | 'possible' | 'inconclusive' | 'not-infected';

/** What the result would be if this one missing finding were positive. */
export interface Infection2018Change {
  field: FindingName;
  ifItWere: string;
  totalScore: number;
  verdict: Infection2018Verdict;
}

export interface Infection2018Result {
  preoperativeScore: number;
  totalScore: number;
  verdict: Infection2018Verdict;
  /** Major criteria that are met; one alone decides. */
  majorCriteria: FindingName[];
  /** Findings with a role in this variant that are not known. */
  missing: FindingName[];
  /** The total if every missing finding were positive. */
  highestPossibleScore: number;
  /** The missing findings that would change the verdict on their own. */
  wouldChange: Infection2018Change[];
  definition: string;
  cautions: string[];
}

export const INFECTION_2018_FIELDS = INFECTION_FIELDS;

interface Line {
  readonly points: number;
  readonly findings: readonly FindingName[];
}

interface Sheet {
  readonly definition: string;
  readonly thresholds: Thresholds;
  readonly preoperative: readonly Line[];
  readonly intraoperative: readonly Line[];
  readonly cautions: readonly string[];
}

type States = Record<FindingName, CriterionState>;

const MAJOR: readonly FindingName[] = ['sinusTract', 'sameOrganismCultures'];

const INTRAOPERATIVE: readonly Line[] = [
  { points: 3, findings: ['histologyPositive'] },
  { points: 3, findings: ['purulence'] },
  { points: 2, findings: ['singlePositiveCulture'] },
];

const ORIGINAL: Sheet = {
  definition:
    'Evidence-based definition of hip and knee periprosthetic joint infection, 2018, original version ' +
    '(Parvizi and others, J Arthroplasty 2018;33:1309), chronic infection',
  thresholds: { crpMgL: 10, dDimerUgL: 860, esrMmH: 30, synovialWbcPerUl: 3000, pmnPercent: 80, synovialCrpMgL: 6.9 },
  preoperative: [
    { points: 2, findings: ['crpMgL', 'dDimerUgL'] },
    { points: 1, findings: ['esrMmH'] },
    { points: 3, findings: ['synovialWbcPerUl', 'leukocyteEsterase'] },
    { points: 3, findings: ['alphaDefensin'] },
    { points: 2, findings: ['pmnPercent'] },
    { points: 1, findings: ['synovialCrpMgL'] },
  ],
  intraoperative: INTRAOPERATIVE,
  cautions: [
    'The thresholds for neutrophils (80 %) and synovial CRP (6.9 mg/L) are from memory.',
    'The consensus version of 2018 scores alpha-defensin and neutrophils differently. Do not mix the two.',
  ],
};

const CONSENSUS_LINES: readonly Line[] = [
  { points: 2, findings: ['crpMgL', 'dDimerUgL'] },
  { points: 1, findings: ['esrMmH'] },
  { points: 3, findings: ['synovialWbcPerUl', 'leukocyteEsterase', 'alphaDefensin'] },
  { points: 2, findings: ['pmnPercent'] },
];

const CONSENSUS_DEFINITION =
  'International Consensus Meeting 2018, modified version of the 2018 definition (Shohat and others, 2019)';

const CONSENSUS: Record<InfectionTiming, Sheet> = {
  chronic: {
    definition: `${CONSENSUS_DEFINITION}, chronic column`,
    thresholds: { crpMgL: 10, dDimerUgL: 860, esrMmH: 30, synovialWbcPerUl: 3000, pmnPercent: 70 },
    preoperative: CONSENSUS_LINES,
    intraoperative: INTRAOPERATIVE,
    cautions: ['This version has no line for synovial CRP; a value given is not scored.'],
  },
  acute: {
    definition: `${CONSENSUS_DEFINITION}, acute column`,
    thresholds: { crpMgL: 100, synovialWbcPerUl: 10_000, pmnPercent: 90 },
    // No threshold was set for D-dimer and ESR has no role, so neither can score.
    preoperative: CONSENSUS_LINES.map((line) => ({
      ...line,
      findings: line.findings.filter((name) => name !== 'dDimerUgL' && name !== 'esrMmH'),
    })).filter((line) => line.findings.length > 0),
    intraoperative: INTRAOPERATIVE,
    cautions: [
      'This version has no line for synovial CRP; a value given is not scored.',
      'The acute criteria were never validated on acute infections.',
      'In the acute column ESR has no role and D-dimer has no threshold; values given are not scored.',
      'Acute means within 90 days of the index operation in the studies that used it.',
    ],
  },
};

/**
 * The 2018 definitions of periprosthetic joint infection, in two versions that must not be mixed.
 *
 * `original` (Parvizi 2018, chronic infection only): while no intraoperative finding is known the
 * verdict is 6 or more `infected`, 2 to 5 `possible`, 0 or 1 `not-infected`; once histology,
 * purulence or a single culture is known: 6 or more `infected`, 4 or 5 `inconclusive`, 3 or less
 * `not-infected`. `consensus` (ICM 2018): 6 or more `infected`, 3 to 5 `inconclusive`, under 3
 * `not-infected`, on the total. A major criterion alone makes it `infected`. With no scored finding
 * known at all the verdict is `inconclusive`, because nothing has been ruled out.
 *
 * Values count only when strictly over the threshold. Units and ranges: see InfectionFindings.
 * Throws CalcInputError with the field; `original` with `acute` is refused on `timing` with the
 * code `chronic-only`.
 * Source: BMC Musculoskelet Disord 2020 s12891-020-03266-6 Table 3 (original) and
 * 2019 s12891-019-2941-1 Table 2 (consensus).
 */
export function calculateInfection2018(input: Infection2018Input): Infection2018Result {
  const variant = requireChoice(readBody(input).variant, 'variant', INFECTION_VARIANTS);
  const sheet = sheetFor(variant, readTiming(input));
  const findings = readFindings(input);
  const states = criterionStates(findings, sheet.thresholds);
  const scored = [...sheet.preoperative, ...sheet.intraoperative].flatMap((line) => line.findings);
  const missing = [...MAJOR, ...scored].filter((name) => findings[name] === null);
  const { totalScore, verdict } = assess(variant, sheet, states);
  const allPositive = { ...states, ...Object.fromEntries(missing.map((name) => [name, true])) } as States;
  const highest = assess(variant, sheet, allPositive);
  return {
    preoperativeScore: points(sheet.preoperative, states),
    totalScore,
    verdict,
    majorCriteria: MAJOR.filter((name) => states[name] === true),
    missing,
    highestPossibleScore: highest.totalScore,
    wouldChange: changes(variant, sheet, states, missing),
    definition: sheet.definition,
    cautions: [...sheet.cautions, ...infectionCautions(findings), ...openVerdict(verdict, highest.verdict)],
  };
}

function sheetFor(variant: InfectionVariant, timing: InfectionTiming): Sheet {
  if (variant === 'consensus') return CONSENSUS[timing];
  if (timing === 'acute') {
    throw new CalcInputError(
      'timing',
      'chronic-only',
      'The original version of 2018 is defined for chronic infection only. Use the consensus version for acute infection.',
    );
  }
  return ORIGINAL;
}

const points = (lines: readonly Line[], states: States): number =>
  lines
    .filter((line) => anyOf(line.findings.map((name) => states[name])) === true)
    .reduce((sum, line) => sum + line.points, 0);

const anyKnown = (lines: readonly Line[], states: States): boolean =>
  lines.some((line) => line.findings.some((name) => states[name] !== null));

function assess(variant: InfectionVariant, sheet: Sheet, states: States) {
  const { preoperative, intraoperative } = sheet;
  const totalScore = points([...preoperative, ...intraoperative], states);
  const operated = anyKnown(intraoperative, states);
  const nothingKnown = !operated && !anyKnown(preoperative, states);
  const major = MAJOR.some((name) => states[name] === true);
  const verdict: Infection2018Verdict = major
    ? 'infected'
    : nothingKnown
      ? 'inconclusive'
      : verdictOfScore(variant, totalScore, operated);
  return { totalScore, verdict };
}

function verdictOfScore(variant: InfectionVariant, score: number, operated: boolean): Infection2018Verdict {
  if (score >= 6) return 'infected';
  if (variant === 'consensus') return score >= 3 ? 'inconclusive' : 'not-infected';
  if (operated) return score >= 4 ? 'inconclusive' : 'not-infected';
  return score >= 2 ? 'possible' : 'not-infected';
}

function changes(
  variant: InfectionVariant,
  sheet: Sheet,
  states: States,
  missing: readonly FindingName[],
): Infection2018Change[] {
  const now = assess(variant, sheet, states).verdict;
  return missing
    .map((field) => ({
      field,
      ifItWere: positiveInWords(field, sheet.thresholds),
      ...assess(variant, sheet, { ...states, [field]: true }),
    }))
    .filter((change) => change.verdict !== now);
}

function openVerdict(verdict: Infection2018Verdict, highest: Infection2018Verdict): string[] {
  if (verdict !== 'not-infected' || highest === verdict) return [];
  return ['Not infected on what is known; missing findings could still change this.'];
}
