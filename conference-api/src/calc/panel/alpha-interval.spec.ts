import { alphaInterval } from './alpha-interval.js';
import { seededRandom } from './seeded-random.js';

/** Panels of six that mostly agree, from a fixed generator. */
function ratings(units: number): number[][] {
  const random = seededRandom(99);
  const truth = Array.from({ length: units }, () => 1 + Math.floor(random() * 9));
  return Array.from({ length: 6 }, () =>
    truth.map((value) => Math.min(9, Math.max(1, value + Math.floor(random() * 3) - 1))),
  );
}

describe('alphaInterval', () => {
  test('the same seed gives the same interval, another seed another', () => {
    const data = ratings(40);
    const first = alphaInterval({ level: 'ordinal', data, seed: 5 });
    expect(alphaInterval({ level: 'ordinal', data, seed: 5 })).toEqual(first);
    expect(alphaInterval({ level: 'ordinal', data, seed: 6 }).low).not.toBe(first.low);
  });

  test('it holds the figure, stays at or below 1 and narrows with more units', () => {
    const width = (units: number) => {
      const { value, low, high } = alphaInterval({ level: 'ordinal', data: ratings(units) });
      expect(low as number).toBeLessThan(value as number);
      expect(high as number).toBeGreaterThan(value as number);
      expect(high as number).toBeLessThanOrEqual(1);
      return (high as number) - (low as number);
    };
    // The width falls about with the root of the units: 16 times as many, about a quarter.
    const ratio = width(640) / width(40);
    expect(ratio).toBeGreaterThan(0.1);
    expect(ratio).toBeLessThan(0.5);
  });

  test('more confidence is wider', () => {
    const data = ratings(60);
    const wide = alphaInterval({ level: 'interval', data, confidence: 0.99 });
    const narrow = alphaInterval({ level: 'interval', data, confidence: 0.8 });
    expect(wide.low as number).toBeLessThan(narrow.low as number);
    expect(wide.high as number).toBeGreaterThan(narrow.high as number);
  });

  test('full agreement is 1 to 1; undefined resamples are left out and counted', () => {
    const answer = alphaInterval({ level: 'nominal', data: [[1, 2], [1, 2]] });
    expect(answer).toMatchObject({ value: 1, low: 1, high: 1 });
    // Half of all draws of two units from two take one of them twice.
    expect(answer.resamplesUsed).toBeGreaterThan(430);
    expect(answer.resamplesUsed).toBeLessThan(570);
    expect(answer.cautions.join()).toContain(`${1000 - answer.resamplesUsed} resamples`);
  });

  test('undefined alpha has no interval', () => {
    const answer = alphaInterval({ level: 'nominal', data: [[1, 1], [1, 1]] });
    expect(answer).toMatchObject({ value: null, low: null, high: null, resamplesUsed: 0 });
    expect(answer.why).toContain('identical');
  });

  test.each([
    [{ resamples: 10 }, 'resamples'],
    [{ seed: -1 }, 'seed'],
    [{ confidence: 1 }, 'confidence'],
  ])('%j is refused', (settings, field) => {
    expect(() => alphaInterval({ level: 'nominal', data: [[1, 2], [1, 2]], ...settings })).toThrow(
      expect.objectContaining({ field }),
    );
  });
});
