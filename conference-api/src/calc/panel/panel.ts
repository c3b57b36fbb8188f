import { CalcInputError } from '../common/calc-input-error.js';
import type { FieldSpec } from '../common/field-spec.js';
import { requireArray, requireChoice, requireInteger } from '../common/input-checks.js';

export type PercentileRule = 'weibull' | 'linear';
export type PanelBand = 'inappropriate' | 'uncertain' | 'appropriate';

export interface PanelInput {
  /** One rating a member, whole numbers 1–9; abstentions are left out. */
  ratings: number[];
  /** `weibull`: rank (n+1)p, the default; `linear`: rank (n−1)p+1. */
  percentiles?: PercentileRule | null;
}

export interface PanelAnswer {
  n: number;
  median: number;
  p30: number;
  p70: number;
  ipr: number;
  ipras: number;
  disagreementIndex: number;
  disagreement: boolean;
  /** By the RAND/UCLA table, which covers panels of 8–16; null outside. */
  classicDisagreement: boolean | null;
  /** By the same table; null outside 8–16. */
  agreement: boolean | null;
  band: PanelBand;
  verdict: PanelBand;
  definition: string;
  cautions: string[];
}

export const PANEL_FIELDS: readonly FieldSpec[] = [
  { name: 'ratings', type: 'array' },
  { name: 'percentiles', type: 'string' },
];

const PERCENTILE_RULES = ['weibull', 'linear'] as const;
const LARGEST_PANEL = 1000;

/** The row of the RAND/UCLA table: most ratings allowed outside, fewest in each extreme. */
const CLASSIC_ROWS = [
  { from: 8, to: 10, outsideAtMost: 2, extremeAtLeast: 3 },
  { from: 11, to: 13, outsideAtMost: 3, extremeAtLeast: 4 },
  { from: 14, to: 16, outsideAtMost: 4, extremeAtLeast: 5 },
] as const;

/** Ratings in each three-point region of the 1–9 scale. */
export interface RegionCounts {
  low: number;
  middle: number;
  high: number;
}

/**
 * Reads a panel's ratings: 1 to 1000 whole numbers 1–9, returned in ascending order.
 * @throws CalcInputError naming `ratings` or `ratings[i]`.
 */
export function readRatings(value: unknown, field = 'ratings'): number[] {
  const list = requireArray(value, field, LARGEST_PANEL);
  if (list.length === 0) {
    throw new CalcInputError(field, 'empty', 'At least one rating is needed.');
  }
  return list
    .map((rating, i) => requireInteger(rating, `${field}[${i}]`, 1, 9))
    .sort((a, b) => a - b);
}

/** How many ratings lie in 1–3, 4–6 and 7–9. */
export function countRegions(ratings: readonly number[]): RegionCounts {
  const low = ratings.filter((rating) => rating <= 3).length;
  const high = ratings.filter((rating) => rating >= 7).length;
  return { low, middle: ratings.length - low - high, high };
}

/**
 * Statistics of one round of ratings on the RAND/UCLA 1–9 scale (no unit).
 *
 * Source: Fitch K et al., The RAND/UCLA Appropriateness Method User's Manual,
 * RAND MR-1269, 2001: IPR = P70 − P30, IPRAS = 2.35 + 1.5·|5 − (P30+P70)/2|,
 * disagreement when IPR > IPRAS. The table for 8–16 members is as printed in
 * BMC Med Inform Decis Mak 2012;12:93, table 7. Half medians go up (from memory).
 * The formula does not fix how percentiles are read, so the rule is an input.
 *
 * @throws CalcInputError for anything but 1–1000 whole ratings 1–9 and a known rule.
 */
export function panel(input: PanelInput): PanelAnswer {
  const ratings = readRatings(input.ratings);
  const rule = requireChoice(input.percentiles ?? 'weibull', 'percentiles', PERCENTILE_RULES);
  const n = ratings.length;
  const median = medianOf(ratings);
  const band = bandOf(median);
  const spread = spreadOf(ratings, rule);
  const classic = classicOf(ratings, band);
  const otherRule = rule === 'weibull' ? 'linear' : 'weibull';
  const ruleMatters = spreadOf(ratings, otherRule).disagreement !== spread.disagreement;
  return {
    n,
    median,
    ...spread,
    ...classic,
    band,
    verdict: spread.disagreement ? 'uncertain' : band,
    definition: definitionOf(rule),
    cautions: cautionsOf(n, spread.disagreement, classic.classicDisagreement, ruleMatters),
  };
}

function medianOf(sorted: readonly number[]): number {
  const n = sorted.length;
  return (at(sorted, Math.ceil(n / 2)) + at(sorted, Math.floor(n / 2) + 1)) / 2;
}

/** Half medians go to the more appropriate band: 3.5 is uncertain, 6.5 appropriate. */
function bandOf(median: number): PanelBand {
  if (median < 3.5) return 'inappropriate';
  return median < 6.5 ? 'uncertain' : 'appropriate';
}

/** Percentiles are kept in tenths and IPRAS in thousandths, so that `>` is decided exactly. */
function spreadOf(sorted: readonly number[], rule: PercentileRule) {
  const p30 = percentileInTenths(sorted, 3, rule);
  const p70 = percentileInTenths(sorted, 7, rule);
  const ipr = (p70 - p30) * 100;
  const ipras = 2350 + 75 * Math.abs(100 - (p30 + p70));
  return {
    p30: p30 / 10,
    p70: p70 / 10,
    ipr: ipr / 1000,
    ipras: ipras / 1000,
    disagreementIndex: ipr / ipras,
    disagreement: ipr > ipras,
  };
}

function percentileInTenths(sorted: readonly number[], tenths: number, rule: PercentileRule) {
  const n = sorted.length;
  const rank = rule === 'weibull' ? (n + 1) * tenths : (n - 1) * tenths + 10;
  const clamped = Math.min(Math.max(rank, 10), n * 10);
  const below = at(sorted, Math.floor(clamped / 10));
  const above = at(sorted, Math.ceil(clamped / 10));
  return below * 10 + (clamped % 10) * (above - below);
}

function classicOf(ratings: readonly number[], band: PanelBand) {
  const row = CLASSIC_ROWS.find(({ from, to }) => ratings.length >= from && ratings.length <= to);
  if (row === undefined) return { classicDisagreement: null, agreement: null };
  const { low, high } = countRegions(ratings);
  return {
    classicDisagreement: low >= row.extremeAtLeast && high >= row.extremeAtLeast,
    agreement: ratings.length - countInBand(ratings, band) <= row.outsideAtMost,
  };
}

/** How many ratings lie in the three-point region that a band stands for. */
export function countInBand(ratings: readonly number[], band: PanelBand): number {
  const { low, middle, high } = countRegions(ratings);
  return { inappropriate: low, uncertain: middle, appropriate: high }[band];
}

function definitionOf(rule: PercentileRule): string {
  const rank = rule === 'weibull' ? 'weibull, rank (n+1)p kept within 1 to n' : 'linear, rank (n−1)p+1';
  return (
    'RAND/UCLA Appropriateness Method (RAND MR-1269, 2001): disagreement when IPR > IPRAS, ' +
    `IPRAS = 2.35 + 1.5 × |5 − (P30+P70)/2|; percentiles ${rank}; half medians go up; ` +
    'classic agreement and disagreement by the table for panels of 8 to 16.'
  );
}

function cautionsOf(
  n: number,
  disagreement: boolean,
  classicDisagreement: boolean | null,
  ruleMatters: boolean,
): string[] {
  const cautions: string[] = [];
  if (n < 8) cautions.push('Fewer than 8 ratings: show counts, not verdicts.');
  if (n > 16) cautions.push('The classic table covers panels of 8 to 16 only.');
  if (ruleMatters) {
    cautions.push('The other percentile rule gives the opposite answer on disagreement.');
  }
  if (classicDisagreement !== null && classicDisagreement !== disagreement) {
    cautions.push('The classic definition and IPRAS differ on disagreement; the verdict follows IPRAS.');
  }
  return cautions;
}

/** The value at a rank counted from 1. */
function at(sorted: readonly number[], rank: number): number {
  return sorted[rank - 1] as number;
}
