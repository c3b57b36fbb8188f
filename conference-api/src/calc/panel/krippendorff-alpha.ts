import { CalcInputError } from '../common/calc-input-error.js';
import { requireChoice, requireMatrix, requireNumber } from '../common/input-checks.js';
import type { Statistic } from './fleiss-kappa.js';

export const ALPHA_LEVELS = ['nominal', 'ordinal', 'interval', 'ratio'] as const;
export type AlphaLevel = (typeof ALPHA_LEVELS)[number];

export interface AlphaInput {
  level: AlphaLevel;
  /** Rater by unit; null where a rater gave no value. */
  data: (number | null)[][];
}

export const ALPHA_DEFINITION =
  'Krippendorff’s alpha, 1 − Do/De from the coincidence matrix (Krippendorff K. Content Analysis); ' +
  'units with fewer than two values are left out';

const MOST_DISTINCT_VALUES = 2000;
/** Keeps the squares of differences finite. */
const LARGEST_VALUE = 1e100;

/** One unit's pairable values: indices of the distinct ones into `values`, and how often each. */
export interface UnitCounts {
  /** How many raters gave a value (two or more). */
  size: number;
  indices: readonly number[];
  counts: readonly number[];
}

export interface PairableUnits {
  /** Distinct values, ascending. */
  values: readonly number[];
  units: readonly UnitCounts[];
}

/**
 * Krippendorff's alpha (no unit, at most 1, may be negative); missing values are legal.
 *
 * Undefined, with `value` null and the reason in `why`: no unit with two values,
 * or all values identical (De = 0).
 *
 * Source: Krippendorff K., Computing Krippendorff's alpha-reliability, 2011.
 *
 * @throws CalcInputError for a ragged table, a cell that is not a number or null,
 * negative numbers at ratio level, or more than 2000 distinct values.
 */
export function krippendorffAlpha(input: AlphaInput): Statistic {
  const { level, pairable } = readAlphaInput(input);
  return alphaOf(level, pairable);
}

/** Checks the input and gathers the units that have at least two values. */
export function readAlphaInput(input: AlphaInput): { level: AlphaLevel; pairable: PairableUnits } {
  const level = requireChoice(input.level, 'level', ALPHA_LEVELS);
  const data = requireMatrix(input.data, 'data', (cell, path) => readCell(cell, path, level));
  const pairable = pairableUnits(data);
  if (pairable.values.length > MOST_DISTINCT_VALUES) {
    throw new CalcInputError(
      'data',
      'too-many-values',
      `data may have ${MOST_DISTINCT_VALUES} distinct values at most.`,
    );
  }
  return { level, pairable };
}

/** Alpha of units already gathered, each as often as the bootstrap drew it (or once). */
export function alphaOf(
  level: AlphaLevel,
  { values, units }: PairableUnits,
  drawn: Int32Array = new Int32Array(units.length).fill(1),
): Statistic {
  if (units.length === 0) {
    return { value: null, why: 'No unit has two values: there is nothing to agree on.' };
  }
  const totals = totalsOf(values.length, units, drawn);
  const present = values.map((_, c) => c).filter((c) => (totals[c] as number) > 0);
  if (present.length === 1) {
    return { value: null, why: 'All values are identical, so no disagreement could be expected (De = 0).' };
  }
  const n = totals.reduce((sum, total) => sum + total, 0);
  const difference = squaredDifference(level, values, totals);
  const observed = observedDisagreement(units, drawn, difference);
  let expected = 0;
  for (const c of present) {
    for (const k of present) {
      if (c < k) expected += 2 * (totals[c] as number) * (totals[k] as number) * difference(c, k);
    }
  }
  if (expected === 0) return { value: null, why: 'The values differ too little to compute with.' };
  return { value: 1 - ((n - 1) * observed) / expected, why: null };
}

function readCell(cell: unknown, path: string, level: AlphaLevel): number | null {
  if (cell === null) return null;
  const number = requireNumber(cell, path, -LARGEST_VALUE, LARGEST_VALUE);
  // Negative numbers have no ratio to zero; opposite ones would divide by it.
  if (level === 'ratio') requireNumber(number, path, 0);
  return number;
}

function pairableUnits(data: (number | null)[][]): PairableUnits {
  const columns = (data[0] ?? [])
    .map((_, u) => data.map((row) => row[u]).filter((value) => typeof value === 'number'))
    .filter((column) => column.length >= 2);
  const values = [...new Set(columns.flat())].sort((a, b) => a - b);
  const indexOf = new Map(values.map((value, index) => [value, index]));
  const units = columns.map((column) => {
    const counts = new Map<number, number>();
    for (const value of column) {
      const index = indexOf.get(value) as number;
      counts.set(index, (counts.get(index) ?? 0) + 1);
    }
    return { size: column.length, indices: [...counts.keys()], counts: [...counts.values()] };
  });
  return { values, units };
}

function totalsOf(valueCount: number, units: readonly UnitCounts[], drawn: Int32Array): number[] {
  const totals = new Array<number>(valueCount).fill(0);
  // Plain loops here and below: the bootstrap runs them millions of times.
  for (let u = 0; u < units.length; u += 1) {
    const times = drawn[u] as number;
    if (times === 0) continue;
    const { indices, counts } = units[u] as UnitCounts;
    for (let i = 0; i < indices.length; i += 1) {
      const value = indices[i] as number;
      totals[value] = (totals[value] as number) + times * (counts[i] as number);
    }
  }
  return totals;
}

function observedDisagreement(
  units: readonly UnitCounts[],
  drawn: Int32Array,
  difference: (c: number, k: number) => number,
): number {
  let sum = 0;
  for (let u = 0; u < units.length; u += 1) {
    const times = drawn[u] as number;
    if (times === 0) continue;
    const { size, indices, counts } = units[u] as UnitCounts;
    let pairs = 0;
    for (let i = 1; i < indices.length; i += 1) {
      for (let j = 0; j < i; j += 1) {
        const product = (counts[i] as number) * (counts[j] as number);
        pairs += product * difference(indices[i] as number, indices[j] as number);
      }
    }
    sum += (2 * times * pairs) / (size - 1);
  }
  return sum;
}

/** δ² between two values, given by their indices. */
function squaredDifference(
  level: AlphaLevel,
  values: readonly number[],
  totals: readonly number[],
): (c: number, k: number) => number {
  if (level === 'nominal') return (c, k) => (c === k ? 0 : 1);
  // The ordinal difference Σ n_g − (n_c+n_k)/2 is the distance between the values' mid-ranks.
  const scale = level === 'ordinal' ? midRanks(totals) : values;
  return (c, k) => {
    const a = scale[c] as number;
    const b = scale[k] as number;
    const distance = level === 'ratio' ? (a - b) / (a + b) : a - b;
    return distance * distance;
  };
}

function midRanks(totals: readonly number[]): number[] {
  let below = 0;
  return totals.map((total) => {
    const middle = below + total / 2;
    below += total;
    return middle;
  });
}
