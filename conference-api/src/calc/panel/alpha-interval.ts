import { requireInteger, requireNumber } from '../common/input-checks.js';
import { seededRandom } from './seeded-random.js';
import { alphaOf, readAlphaInput, type AlphaInput } from './krippendorff-alpha.js';

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
  const { values, units } = pairable;
  const { value, why } = alphaOf(level, values, units);
  const definition = `Percentile bootstrap over units, ${resamples} resamples, seed ${seed}.`;
  if (value === null) {
    return { value, why, low: null, high: null, resamplesUsed: 0, definition, cautions: [] };
  }

  const random = seededRandom(seed);
  const alphas: number[] = [];
  for (let i = 0; i < resamples; i += 1) {
    const drawn = units.map(() => units[Math.floor(random() * units.length)] as (typeof units)[number]);
    const alpha = alphaOf(level, values, drawn).value;
    if (alpha !== null) alphas.push(alpha);
  }
  alphas.sort((a, b) => a - b);
  const tail = (1 - confidence) / 2;
  return {
    value,
    why,
    low: quantile(alphas, tail),
    high: quantile(alphas, 1 - tail),
    resamplesUsed: alphas.length,
    definition,
    cautions: cautionsOf(units.length, resamples - alphas.length),
  };
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
