import fc from 'fast-check';
import { proportion, type ProportionInput } from './proportion.js';

describe('proportion', () => {
  // Newcombe RG. Stat Med 1998;17:857, table I, method 3 (as reproduced in public test suites).
  test.each([
    [81, 263, 0.2553, 0.3662],
    [15, 148, 0.0624, 0.1605],
    [0, 20, 0, 0.1611],
    [1, 29, 0.0061, 0.1718],
    [29, 29, 0.883, 1],
  ])('Newcombe: %i of %i', (successes, n, low, high) => {
    const answer = proportion({ successes, n });
    expect(answer.low).toBeCloseTo(low, 4);
    expect(answer.high).toBeCloseTo(high, 4);
  });

  // scipy 1.17.1, stats.binomtest(k, n).proportion_ci(0.95, 'wilson').
  test.each([
    [81, 263, 0.2552885198782742, 0.36620957698280004],
    [7, 9, 0.4525889691069889, 0.9367748928821533],
    [8, 10, 0.4901624715366418, 0.9433178485456248],
    [10, 10, 0.7224672001371109, 1],
    [0, 10, 0, 0.27753279986288926],
    [1, 1, 0.20654931437723745, 1],
    [3, 4000, 0.0002550997283718513, 0.002202904396395083],
  ])('scipy: %i of %i', (successes, n, low, high) => {
    const answer = proportion({ successes, n });
    expect(answer.low).toBeCloseTo(low, 12);
    expect(answer.high).toBeCloseTo(high, 12);
  });

  test('the interval lies within 0 to 1, holds the share and mirrors', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 100_000 }), fc.double({ min: 0, max: 1, noNaN: true }), (n, share) => {
        const successes = Math.round(n * share);
        const { low, high } = proportion({ successes, n });
        expect(low).toBeGreaterThanOrEqual(0);
        expect(high).toBeLessThanOrEqual(1);
        expect(low).toBeLessThanOrEqual(successes / n);
        expect(high).toBeGreaterThanOrEqual(successes / n);
        const mirrored = proportion({ successes: n - successes, n });
        expect(mirrored.low).toBeCloseTo(1 - high, 10);
      }),
    );
  });

  test('none and all are exact at their end', () => {
    expect(proportion({ successes: 0, n: 7 }).low).toBe(0);
    expect(proportion({ successes: 7, n: 7 }).high).toBe(1);
  });

  test.each([
    [{ successes: 0, n: 0 }, 'n', 'undefined'],
    [{ successes: 5, n: 4 }, 'successes', 'range'],
    [{ successes: -1, n: 4 }, 'successes', 'range'],
    [{ successes: 1.5, n: 4 }, 'successes', 'integer'],
    [{ successes: 1, n: null }, 'n', 'required'],
    [{ successes: '1', n: 4 }, 'successes', 'type'],
  ])('%j is refused at %s as %s', (body, field, code) => {
    expect(() => proportion(body as unknown as ProportionInput)).toThrow(expect.objectContaining({ field, code }));
  });
});
