import { chiSquareSurvival } from './chi-square.js';

describe('chiSquareSurvival', () => {
  // scipy 1.17.1, stats.chi2.sf(x, df).
  test.each([
    [0.5, 1, 0.47950012218695337],
    [3.84, 1, 0.05004352124870519],
    [22.349, 9, 0.007836310920415613],
    [1e-6, 3, 0.9999999997340385],
    [30, 3, 1.3800570312932553e-6],
    [12.2, 4, 0.015924360808349202],
    [200, 5, 2.8406228986415534e-41],
    [120, 100, 0.08440668109369177],
    [700, 2, 9.929590396265143e-153],
  ])('x %p, df %p', (x, df, expected) => {
    expect(chiSquareSurvival(x, df) / expected).toBeCloseTo(1, 11);
  });

  // For two degrees of freedom the survival function is exp(−x/2).
  test.each([0.1, 1, 3.9, 4.1, 20, 60])('two degrees of freedom at %p', (x) => {
    expect(chiSquareSurvival(x, 2) / Math.exp(-x / 2)).toBeCloseTo(1, 11);
  });

  test('certain at 0', () => {
    expect(chiSquareSurvival(0, 4)).toBe(1);
  });
});
