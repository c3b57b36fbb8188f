import { CalcInputError } from '../common/calc-input-error.js';
import { requireArray, requireNumber, requireObject, requireOnlyKnown } from '../common/input-checks.js';
import { wilson } from './proportion.js';

/** A forecast of a yes-or-no outcome, once the outcome is known. */
export interface SettledForecast {
  /** Forecast chance of the outcome, 0–1. */
  probability: number;
  happened: boolean;
}

export interface ForecastScore {
  /** Brier score, 0 (perfect) to 1; null without forecasts. */
  brier: number | null;
  why: string | null;
  n: number;
  definition: string;
  cautions: string[];
}

export interface CalibrationBin {
  /** Forecasts from `from` up to, but without, `to`; the last bin holds 1 too. */
  from: number;
  to: number;
  n: number;
  happened: number;
  /** Mean forecast and share that happened, null for an empty bin. */
  meanForecast: number | null;
  share: number | null;
  /** Wilson's 95 % interval of the share. */
  low: number | null;
  high: number | null;
}

const BINS = 10;
const FEW_FORECASTS = 20;

/**
 * Brier score of settled forecasts: the mean of (probability − outcome)², 0 to 1.
 *
 * Source: Brier GW. Mon Weather Rev 1950;78:1–3, in its one-category form.
 *
 * @throws CalcInputError for a probability outside 0–1 or an outcome that is not true or false.
 */
export function brierScore(input: { forecasts: SettledForecast[] }): ForecastScore {
  const forecasts = readForecasts(input.forecasts);
  const n = forecasts.length;
  const definition = 'Brier score, mean squared difference of forecast and outcome (Brier 1950).';
  if (n === 0) return { brier: null, why: 'No forecast has been settled.', n, definition, cautions: [] };
  const sum = forecasts.reduce((total, { probability, happened }) => total + (probability - Number(happened)) ** 2, 0);
  const cautions = n < FEW_FORECASTS ? [`Only ${n} forecasts: the score says little yet.`] : [];
  return { brier: sum / n, why: null, n, definition, cautions };
}

/**
 * Forecasts gathered in ten equal bins, with what happened in each.
 *
 * Source: the reliability diagram (Murphy AH, Winkler RL. Appl Stat 1977;26:41–47, from memory).
 *
 * @throws CalcInputError as `brierScore`.
 */
export function calibrationBins(input: { forecasts: SettledForecast[] }): CalibrationBin[] {
  const forecasts = readForecasts(input.forecasts);
  return Array.from({ length: BINS }, (_, bin) => {
    const inside = forecasts.filter(({ probability }) => binOf(probability) === bin);
    return { from: bin / BINS, to: (bin + 1) / BINS, ...summarise(inside) };
  });
}

function binOf(probability: number): number {
  return Math.min(Math.floor(probability * BINS), BINS - 1);
}

function summarise(forecasts: readonly SettledForecast[]) {
  const n = forecasts.length;
  const happened = forecasts.filter((forecast) => forecast.happened).length;
  if (n === 0) return { n, happened, meanForecast: null, share: null, low: null, high: null };
  const sum = forecasts.reduce((total, { probability }) => total + probability, 0);
  return { n, happened, meanForecast: sum / n, share: happened / n, ...wilson(happened, n) };
}

function readForecasts(value: unknown): SettledForecast[] {
  return requireArray(value, 'forecasts').map((entry, i) => {
    const path = `forecasts[${i}]`;
    const forecast = requireObject(entry, path);
    requireOnlyKnown(forecast, path, ['probability', 'happened']);
    const { happened } = forecast;
    if (typeof happened !== 'boolean') {
      throw new CalcInputError(`${path}.happened`, 'type', `${path}.happened must be true or false.`);
    }
    return { probability: requireNumber(forecast.probability, `${path}.probability`, 0, 1), happened };
  });
}
