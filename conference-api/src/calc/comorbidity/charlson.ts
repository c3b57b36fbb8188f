import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { requireArray, requireString } from '../common/input-checks.js';
import { optionalNumber, readBody } from '../common/optional-input.js';
import type { CharlsonCondition } from '../vocabulary/comorbidities.js';

export type { CharlsonCondition } from '../vocabulary/comorbidities.js';

/** Weights of the 1987 table, in its order. */
export const CHARLSON_WEIGHTS = {
  'myocardial-infarction': 1,
  'congestive-heart-failure': 1,
  'peripheral-vascular-disease': 1,
  'cerebrovascular-disease': 1,
  dementia: 1,
  'chronic-pulmonary-disease': 1,
  'connective-tissue-disease': 1,
  'ulcer-disease': 1,
  'mild-liver-disease': 1,
  diabetes: 1,
  hemiplegia: 2,
  'moderate-or-severe-renal-disease': 2,
  'diabetes-with-end-organ-damage': 2,
  'any-tumor': 2,
  leukemia: 2,
  lymphoma: 2,
  'moderate-or-severe-liver-disease': 3,
  'metastatic-solid-tumor': 6,
  aids: 6,
} as const satisfies Record<CharlsonCondition, number>;

export const CHARLSON_CONDITIONS = Object.keys(CHARLSON_WEIGHTS) as CharlsonCondition[];

/** Other spellings that are accepted for a name of the table. */
const SPELLINGS: Readonly<Record<string, CharlsonCondition>> = {
  'myocardial-infarct': 'myocardial-infarction',
  'heart-failure': 'congestive-heart-failure',
  'peripheral-vascular': 'peripheral-vascular-disease',
  'chronic-pulmonary': 'chronic-pulmonary-disease',
  'connective-tissue': 'connective-tissue-disease',
  ulcer: 'ulcer-disease',
  'peptic-ulcer': 'ulcer-disease',
  'peptic-ulcer-disease': 'ulcer-disease',
  'mild-liver': 'mild-liver-disease',
  'diabetes-uncomplicated': 'diabetes',
  'uncomplicated-diabetes': 'diabetes',
  'diabetes-without-end-organ-damage': 'diabetes',
  hemiplegy: 'hemiplegia',
  hemiparesis: 'hemiplegia',
  'moderate-severe-renal-disease': 'moderate-or-severe-renal-disease',
  'moderate-or-severe-renal': 'moderate-or-severe-renal-disease',
  'moderate-severe-renal': 'moderate-or-severe-renal-disease',
  'moderate-to-severe-renal-disease': 'moderate-or-severe-renal-disease',
  'diabetes-end-organ-damage': 'diabetes-with-end-organ-damage',
  'diabetes-with-end-organ': 'diabetes-with-end-organ-damage',
  'any-tumour': 'any-tumor',
  tumor: 'any-tumor',
  tumour: 'any-tumor',
  'solid-tumor': 'any-tumor',
  'solid-tumour': 'any-tumor',
  leukaemia: 'leukemia',
  'moderate-severe-liver-disease': 'moderate-or-severe-liver-disease',
  'moderate-or-severe-liver': 'moderate-or-severe-liver-disease',
  'moderate-severe-liver': 'moderate-or-severe-liver-disease',
  'moderate-to-severe-liver-disease': 'moderate-or-severe-liver-disease',
  'metastatic-solid-tumour': 'metastatic-solid-tumor',
  'metastatic-tumor': 'metastatic-solid-tumor',
  'metastatic-tumour': 'metastatic-solid-tumor',
  'acquired-immunodeficiency-syndrome': 'aids',
};

/** The milder condition does not count beside its worse form. */
const WORSE_FORM: Partial<Record<CharlsonCondition, CharlsonCondition>> = {
  'mild-liver-disease': 'moderate-or-severe-liver-disease',
  diabetes: 'diabetes-with-end-organ-damage',
  'any-tumor': 'metastatic-solid-tumor',
};

export interface CharlsonInput {
  /** Conditions present; an empty list says that there are none. */
  conditions: string[];
  /** Age in years, 0 to 130; 90 may stand for 90 and over. */
  ageYears?: number | null;
}

export interface CharlsonResult {
  score: number;
  /** Score with the points for age; null when the age is not known. */
  ageAdjusted: number | null;
  /** Expected share alive after 10 years from the age-adjusted score, 0 to 1; null without age. */
  tenYearSurvival: number | null;
  /** The conditions that count, each once. */
  counted: CharlsonCondition[];
  definition: string;
  cautions: string[];
}

export const CHARLSON_FIELDS: readonly FieldSpec[] = [
  { name: 'conditions', type: 'array' },
  { name: 'ageYears', type: 'number' },
];

/**
 * The comorbidity index with the weights of 1987; of a nested pair only the worse form counts.
 * Age adds 1 point for each decade from 50: 50–59 1, 60–69 2, 70–79 3, 80 and over 4.
 *
 * Throws CalcInputError: `required`, `type`, `too-many` or `choice` on conditions (a name that is
 * not in the table), `type` or `range` on ageYears.
 * Sources: Charlson and others, J Chronic Dis 1987;40:373 (weights as in PMC7946705 Table 4);
 * age points of 1994.
 */
export function calculateCharlson(input: CharlsonInput): CharlsonResult {
  const body = readBody(input);
  const present = new Set(requireArray(body.conditions, 'conditions', 200).map(readCondition));
  const ageYears = optionalNumber(body.ageYears, 'ageYears', { min: 0, max: 130, unit: 'years' });
  const counted = CHARLSON_CONDITIONS.filter((name) => {
    const worse = WORSE_FORM[name];
    return present.has(name) && !(worse !== undefined && present.has(worse));
  });
  const score = counted.reduce((sum, name) => sum + CHARLSON_WEIGHTS[name], 0);
  const ageAdjusted = ageYears === null ? null : score + agePoints(ageYears);
  return {
    score,
    ageAdjusted,
    tenYearSurvival: ageAdjusted === null ? null : tenYearSurvivalAt(ageAdjusted),
    counted,
    definition: 'Charlson comorbidity index, weights of 1987 (J Chronic Dis 1987;40:373), age points of 1994',
    cautions: [
      'Support for a decision only. The judgement of the treating team comes first.',
      'Conditions not listed count as absent. Check that the list is complete.',
      'Later weights (2011) differ. Do not mix them with these.',
      'Survival is from the cohorts of the 1980s and is for groups, not for one person.',
    ],
  };
}

/** Expected share alive after 10 years at a score: 0.983^(e^(0.9·score)). */
export const tenYearSurvivalAt = (score: number): number => 0.983 ** Math.exp(0.9 * score);

function readCondition(value: unknown): CharlsonCondition {
  const name = requireString(value, 'conditions', 100);
  if (Object.hasOwn(CHARLSON_WEIGHTS, name)) return name as CharlsonCondition;
  const spelling = Object.hasOwn(SPELLINGS, name) ? SPELLINGS[name] : undefined;
  if (spelling !== undefined) return spelling;
  throw new CalcInputError('conditions', 'choice', `conditions may hold only: ${CHARLSON_CONDITIONS.join(', ')}.`);
}

function agePoints(ageYears: number): number {
  if (ageYears < 50) return 0;
  return Math.min(4, Math.floor(ageYears / 10) - 4);
}
