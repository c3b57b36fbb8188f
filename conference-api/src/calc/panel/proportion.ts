import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { requireInteger } from '../common/input-checks.js';

export interface ProportionInput {
  successes: number;
  n: number;
}

export interface ProportionAnswer {
  low: number;
  high: number;
  definition: string;
  cautions: string[];
}

export const PROPORTION_FIELDS: readonly FieldSpec[] = [
  { name: 'successes', type: 'number' },
  { name: 'n', type: 'number' },
];

/** The 97.5th percentile of the standard normal distribution. */
const Z = 1.959963984540054;
const SMALL_SAMPLE = 10;

/**
 * Wilson's 95 % score interval of a proportion, without continuity correction.
 * `low` and `high` are shares from 0 to 1.
 *
 * Source: Newcombe RG. Stat Med 1998;17:857–872, method 3.
 *
 * @throws CalcInputError when n is 0 (undefined), or successes is not within 0 to n.
 */
export function proportion(input: ProportionInput): ProportionAnswer {
  const n = requireInteger(input.n, 'n', 0);
  if (n === 0) {
    throw new CalcInputError('n', 'undefined', 'A share of nothing is undefined: n must be 1 or more.');
  }
  const successes = requireInteger(input.successes, 'successes', 0, n);
  return {
    ...wilson(successes, n),
    definition: 'Wilson 95 % score interval without continuity correction (Newcombe 1998, method 3).',
    cautions: n < SMALL_SAMPLE ? [`Only ${n} observed: the interval is wide, show ${successes}/${n} beside it.`] : [],
  };
}

/** The interval alone, for a caller that has already checked 0 ≤ k ≤ n and n ≥ 1. */
export function wilson(k: number, n: number): { low: number; high: number } {
  const p = k / n;
  const z2 = Z * Z;
  const centre = p + z2 / (2 * n);
  const half = Z * Math.sqrt((p * (1 - p)) / n + z2 / (4 * n * n));
  const scale = 1 + z2 / n;
  // The ends are exact at none and all, where subtraction would leave a trace of rounding.
  return {
    low: k === 0 ? 0 : Math.max(0, (centre - half) / scale),
    high: k === n ? 1 : Math.min(1, (centre + half) / scale),
  };
}
