import { brierScore, calibrationBins, type SettledForecast } from './forecasts.js';

const forecast = (probability: number, happened: boolean): SettledForecast => ({ probability, happened });

describe('forecasts', () => {
  // By hand from Brier's formula: (0.3² + 0.1² + 0.8² + 0²)/4 = 0.185.
  test('Brier score', () => {
    const forecasts = [forecast(0.7, true), forecast(0.1, false), forecast(0.8, false), forecast(1, true)];
    expect(brierScore({ forecasts }).brier).toBeCloseTo(0.185, 12);
    expect(brierScore({ forecasts: [forecast(0.5, true), forecast(0.5, false)] }).brier).toBe(0.25);
    expect(brierScore({ forecasts: [] })).toMatchObject({ brier: null, n: 0, why: expect.any(String) });
  });

  // scipy 1.17.1, stats.binomtest(7, 9).proportion_ci(0.95, 'wilson').
  test('calibration by ten bins, each with its count and interval', () => {
    const forecasts = [
      ...Array.from({ length: 7 }, () => forecast(0.75, true)),
      ...Array.from({ length: 2 }, () => forecast(0.79, false)),
      forecast(1, true),
      forecast(0, false),
    ];
    const bins = calibrationBins({ forecasts });
    expect(bins.map(({ n }) => n)).toEqual([1, 0, 0, 0, 0, 0, 0, 9, 0, 1]);
    const bin = bins[7];
    expect(bin).toMatchObject({ from: 0.7, to: 0.8, happened: 7 });
    expect(bin?.meanForecast).toBeCloseTo((7 * 0.75 + 2 * 0.79) / 9, 12);
    expect(bin?.low).toBeCloseTo(0.4525889691069889, 12);
    expect(bins[1]).toMatchObject({ n: 0, share: null, low: null });
  });

  test.each([
    [[{ probability: 1.2, happened: true }], 'forecasts[0].probability'],
    [[{ probability: 0.2, happened: 1 }], 'forecasts[0].happened'],
    [[{ probability: null, happened: true }], 'forecasts[0].probability'],
  ])('%j is refused', (forecasts, field) => {
    const body = { forecasts: forecasts as SettledForecast[] };
    expect(() => brierScore(body)).toThrow(expect.objectContaining({ field }));
    expect(() => calibrationBins(body)).toThrow(expect.objectContaining({ field }));
  });
});
