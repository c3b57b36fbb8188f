import { requireMatrix, requireNumber } from '../common/input-checks.js';
import { chiSquareSurvival } from './chi-square.js';
import type { Statistic } from './fleiss-kappa.js';

export interface KendallResult extends Statistic {
  chiSquare: number | null;
  df: number | null;
  p: number | null;
  /** W without the correction for ties. */
  uncorrected: number | null;
  cautions: string[];
}

export const KENDALL_DEFINITION =
  'Kendall’s W (Kendall MG, Babington Smith B. 1939), tied scores given their average rank, ' +
  'corrected for ties: 12S/(m²(n³−n) − mT); p from χ² = m(n−1)W with n−1 degrees of freedom.';

const POOR_CHI_SQUARE = 7;

/**
 * Kendall's coefficient of concordance of a table judge by item (no unit, 0 to 1).
 * Scores may be ranks or any numbers; each judge's are ranked, ties averaged.
 *
 * Undefined, all figures null and the reason in `why`: fewer than two judges or
 * items, or every judge tied all items.
 *
 * Source: Kendall MG, Gibbons JD. Rank Correlation Methods, chapter 6.
 *
 * @throws CalcInputError for a ragged table or a cell that is not a number.
 */
export function kendallW(input: { scores: number[][] }): KendallResult {
  const scores = requireMatrix(input.scores, 'scores', (cell, path) => requireNumber(cell, path));
  const m = scores.length;
  const n = scores[0]?.length ?? 0;
  if (m < 2) return undefinedResult('Fewer than two judges: there is nothing to agree on.');
  if (n < 2) return undefinedResult('Fewer than two items: there is nothing to rank.');

  const ranked = scores.map(averageRanks);
  const s = sumOfSquaredDeviations(ranked.map(({ ranks }) => ranks));
  const ties = ranked.map(({ tieTerm }) => tieTerm);
  const most = m * m * (n ** 3 - n);
  const denominator = most - m * ties.reduce((total, term) => total + term, 0);
  if (denominator === 0) return undefinedResult('Every judge tied all items, so nothing was ranked.');

  const value = (12 * s) / denominator;
  const chiSquare = m * (n - 1) * value;
  const df = n - 1;
  const blank = ties.filter((term) => term === n ** 3 - n).length;
  return {
    value,
    why: null,
    chiSquare,
    df,
    p: chiSquareSurvival(chiSquare, df),
    uncorrected: (12 * s) / most,
    cautions: cautionsOf(m, n, blank),
  };
}

/** Ranks from 1, ties averaged, with the judge's tie term Σ(t³ − t). */
function averageRanks(scores: readonly number[]): { ranks: number[]; tieTerm: number } {
  const order = scores.map((_, item) => item).sort((a, b) => (scores[a] as number) - (scores[b] as number));
  const ranks = new Array<number>(scores.length);
  let tieTerm = 0;
  for (let start = 0; start < order.length; ) {
    let end = start;
    while (end < order.length && scores[order[end] as number] === scores[order[start] as number]) end += 1;
    for (const item of order.slice(start, end)) ranks[item] = (start + 1 + end) / 2;
    tieTerm += (end - start) ** 3 - (end - start);
    start = end;
  }
  return { ranks, tieTerm };
}

function sumOfSquaredDeviations(ranks: readonly number[][]): number {
  const items = ranks[0] as number[];
  const mean = (ranks.length * (items.length + 1)) / 2;
  return items.reduce((total, _, item) => {
    const rankSum = ranks.reduce((sum, judge) => sum + (judge[item] as number), 0);
    return total + (rankSum - mean) ** 2;
  }, 0);
}

function undefinedResult(why: string): KendallResult {
  return { value: null, why, chiSquare: null, df: null, p: null, uncorrected: null, cautions: [] };
}

function cautionsOf(judges: number, items: number, blankJudges: number): string[] {
  const cautions: string[] = [];
  if (items <= POOR_CHI_SQUARE) {
    cautions.push('Seven items or fewer: the chi-square p is rough; a permutation test is better.');
  }
  if (judges === 2) cautions.push('With two judges W is 0 when their rankings are opposite.');
  if (blankJudges > 0) {
    cautions.push(`${blankJudges} of ${judges} judges tied all items and add nothing to the figure.`);
  }
  return cautions;
}
