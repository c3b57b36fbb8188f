import { requireInteger, requireNumber } from '../common/input-checks.js';
import { seededRandom } from './seeded-random.js';
import { alphaOf, readAlphaInput, type AlphaInput, type AlphaLevel, type PairableUnits } from './krippendorff-alpha.js';

export interface AlphaIntervalInput extends AlphaInput {
  /** Resamples, 100–10000; default 1000. */
  resamples?: number | null;
  /** Start of the generator, a whole number 0–4294967295; default 1. */
  seed?: number | null;
  /** Coverage between 0.5 and 0.999; default 0.95. */
  confidence?: number | null;
}

export interface AlphaInterval {
  value: number | null;
  why: string | null;
  low: number | null;
  high: number | null;
  /** Resamples whose alpha was defined; the interval rests on these. */
  resamplesUsed: number;
  definition: string;
  cautions: string[];
}

const FEW_UNITS = 20;

/**
 * Krippendorff's alpha with a percentile bootstrap interval: units are drawn with
 * replacement, and resamples whose alpha is undefined are left out and counted.
 * The same seed gives the same interval.
 *
 * Source: Efron's percentile bootstrap over units (common practice; Krippendorff's
 * own procedure, which resamples pairs under a fixed De, gives other numbers).
 *
 * @throws CalcInputError as `krippendorffAlpha`, and for settings out of range.
 */
export function alphaInterval(input: AlphaIntervalInput): AlphaInterval {
  const { level, pairable } = readAlphaInput(input);
  const resamples = requireInteger(input.resamples ?? 1000, 'resamples', 100, 10_000);
  const seed = requireInteger(input.seed ?? 1, 'seed', 0, 0xffff_ffff);
  const confidence = requireNumber(input.confidence ?? 0.95, 'confidence', 0.5, 0.999);
  const { value, why } = alphaOf(level, pairable);
  const definition = `Percentile bootstrap over units, ${resamples} resamples, seed ${seed}.`;
  if (value === null) {
    return { value, why, low: null, high: null, resamplesUsed: 0, definition, cautions: [] };
  }

  const unitCount = pairable.units.length;
  const alphas = resampledAlphas(level, pairable, resamples, seed);
  alphas.sort((a, b) => a - b);
  const tail = (1 - confidence) / 2;
  return {
    value,
    why,
    low: quantile(alphas, tail),
    high: quantile(alphas, 1 - tail),
    resamplesUsed: alphas.length,
    definition,
    cautions: cautionsOf(unitCount, resamples - alphas.length),
  };
}

/** The defined alphas of so many draws of all units with replacement. */
function resampledAlphas(level: AlphaLevel, pairable: PairableUnits, resamples: number, seed: number): number[] {
  const random = seededRandom(seed);
  const unitCount = pairable.units.length;
  const drawn = new Int32Array(unitCount);
  const alphas: number[] = [];
  for (let i = 0; i < resamples; i += 1) {
    drawn.fill(0);
    for (let draw = 0; draw < unitCount; draw += 1) {
      const unit = Math.floor(random() * unitCount);
      drawn[unit] = (drawn[unit] as number) + 1;
    }
    const { value } = alphaOf(level, pairable, drawn);
    if (value !== null) alphas.push(value);
  }
  return alphas;
}

function cautionsOf(units: number, undefinedResamples: number): string[] {
  const cautions: string[] = [];
  if (units < FEW_UNITS) cautions.push(`Only ${units} units: the interval is rough.`);
  if (undefinedResamples > 0) {
    cautions.push(`${undefinedResamples} resamples had no defined alpha and were left out.`);
  }
  return cautions;
}

/** Linear interpolation at rank (n−1)p+1; null for an empty list. */
function quantile(sorted: readonly number[], p: number): number | null {
  if (sorted.length === 0) return null;
  const rank = (sorted.length - 1) * p;
  const below = sorted[Math.floor(rank)] as number;
  const above = sorted[Math.ceil(rank)] as number;
  return below + (rank - Math.floor(rank)) * (above - below);
}
