import { requireInteger, requireMatrix } from '../common/input-checks.js';

/** A statistic that may be undefined; then `value` is null and `why` says the reason. */
export interface Statistic {
  value: number | null;
  why: string | null;
}

export const FLEISS_DEFINITION =
  'Fleiss’ kappa with fixed marginals (Fleiss JL. Psychol Bull 1971;76:378): nominal categories, ' +
  'the same number of ratings for each case.';

const LARGEST_COUNT = 1_000_000;

/**
 * Fleiss' kappa of a table of counts, case by category (no unit, at most 1, may be negative).
 * κ = (P̄ − P̄e)/(1 − P̄e).
 *
 * Undefined, with `value` null and the reason in `why`: no cases, fewer than two
 * ratings a case, unequal numbers of ratings, or everyone in one category.
 *
 * Source: Fleiss JL. Psychol Bull 1971;76:378–382.
 *
 * @throws CalcInputError for a ragged table or a cell that is not a count.
 */
export function fleissKappa(input: { counts: number[][] }): Statistic {
  const counts = requireMatrix(input.counts, 'counts', (cell, path) =>
    requireInteger(cell, path, 0, LARGEST_COUNT),
  );
  const totals = counts.map(sum);
  const raters = totals[0] ?? 0;
  const why = whyUndefined(counts, totals, raters);
  if (why !== null) return { value: null, why };

  const all = counts.length * raters;
  const observed =
    counts.reduce((total, row) => total + (sumOfSquares(row) - raters), 0) / (all * (raters - 1));
  const expected = sumOfSquares(columnTotals(counts)) / (all * all);
  return { value: (observed - expected) / (1 - expected), why: null };
}

function whyUndefined(counts: number[][], totals: number[], raters: number): string | null {
  if (counts.length === 0 || counts[0]?.length === 0) return 'There are no cases.';
  if (totals.some((total) => total !== raters)) {
    return 'The cases have unequal numbers of ratings; use Krippendorff’s alpha.';
  }
  if (raters < 2) return 'Fewer than two ratings a case: there is nothing to agree on.';
  if (columnTotals(counts).filter((total) => total > 0).length === 1) {
    return 'Everyone chose one category, so agreement by chance is already complete (0/0).';
  }
  return null;
}

function columnTotals(counts: number[][]): number[] {
  return (counts[0] ?? []).map((_, j) => sum(counts.map((row) => row[j] as number)));
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}

function sumOfSquares(values: readonly number[]): number {
  return values.reduce((total, value) => total + value * value, 0);
}
