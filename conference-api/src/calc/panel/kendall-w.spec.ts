import fc from 'fast-check';
import { kendallW } from './kendall-w.js';

const TEN_ITEMS = [
  [1, 4.5, 2, 4.5, 3, 7.5, 6, 9, 7.5, 10],
  [2.5, 1, 2.5, 4.5, 4.5, 8, 9, 6.5, 10, 6.5],
  [2, 1, 4.5, 4.5, 4.5, 4.5, 8, 8, 8, 10],
];
const NO_TIES = [[1, 3, 2, 5, 4], [2, 1, 3, 4, 5], [3, 1, 2, 5, 4], [3, 2, 1, 4, 5]];
const TIED_SCORES = [[1, 2, 2, 4, 5], [1, 1, 3, 4, 5], [2, 1, 3, 3, 5], [1, 2, 3, 4, 4]];
const ONE_BLANK_JUDGE = [
  [7.2, 7.2, 1, 3, 3, 3],
  [5, 6, 1, 2, 2, 9],
  [4, 4, 4, 1, 8, 8],
  [1, 2, 3, 4, 5, 6],
  [0, 0, 0, 0, 0, 0],
];

describe('kendallW', () => {
  // Kendall's example of three judges and ten items with ties: W = 0.828 (from memory);
  // uncorrected 0.79596 by the formula in Python.
  test('three judges, ten items, ties', () => {
    const { value, uncorrected, df, why } = kendallW({ scores: TEN_ITEMS });
    expect(value).toBeCloseTo(0.82773, 5);
    expect(uncorrected).toBeCloseTo(0.79596, 5);
    expect([df, why]).toEqual([9, null]);
  });

  // scipy 1.17.1, stats.friedmanchisquare (tie-corrected): χ², p, and W = χ²/(m(n−1)).
  test.each([
    [TEN_ITEMS, 22.348739495798313, 0.007837043634552069, 0.8277310924369745],
    [NO_TIES, 12.2, 0.01592436080834918, 0.7625],
    [TIED_SCORES, 14.684210526315793, 0.005403060919780097, 0.9177631578947371],
    [ONE_BLANK_JUDGE, 7.519379844961243, 0.18478856976772837, 0.30077519379844975],
  ])('%j', (scores, chiSquare, p, w) => {
    const answer = kendallW({ scores });
    expect(answer.chiSquare).toBeCloseTo(chiSquare, 10);
    expect(answer.p).toBeCloseTo(p, 12);
    expect(answer.value).toBeCloseTo(w, 12);
  });

  // By hand from the formula: opposed rankings of two judges give 0, equal ones 1.
  test('opposed and equal rankings', () => {
    expect(kendallW({ scores: [[1, 2, 3], [3, 2, 1]] })).toMatchObject({ value: 0, chiSquare: 0, p: 1 });
    expect(kendallW({ scores: [[1, 2, 3], [1, 2, 3], [10, 20, 30]] }).value).toBe(1);
  });

  test.each([
    [[[1, 2, 3]], 'two judges'],
    [[], 'two judges'],
    [[[1], [2]], 'two items'],
    [[[], []], 'two items'],
    [[[4, 4, 4], [2, 2, 2]], 'tied all items'],
  ])('%j is undefined: %s', (scores, reason) => {
    const answer = kendallW({ scores });
    expect(answer).toMatchObject({ value: null, chiSquare: null, df: null, p: null, uncorrected: null });
    expect(answer.why).toContain(reason);
  });

  test('a judge who ties everything is named in a caution', () => {
    expect(kendallW({ scores: ONE_BLANK_JUDGE }).cautions.join()).toContain('1 of 5 judges');
  });

  test.each([
    [[[1, 2], [1]], 'scores[1]', 'shape'],
    [[[1, null], [1, 2]], 'scores[0][1]', 'required'],
    [[[1, 'b'], [1, 2]], 'scores[0][1]', 'type'],
  ])('%j is refused at %s', (scores, field, code) => {
    expect(() => kendallW({ scores: scores as number[][] })).toThrow(expect.objectContaining({ field, code }));
  });

  test('it lies within 0 to 1 and does not change with the order of judges or a rescaled judge', () => {
    const score = fc.integer({ min: 1, max: 6 });
    const table = fc.array(fc.array(score, { minLength: 5, maxLength: 5 }), { minLength: 2, maxLength: 6 });
    fc.assert(
      fc.property(table, (scores) => {
        const { value } = kendallW({ scores });
        fc.pre(value !== null);
        expect(value as number).toBeGreaterThanOrEqual(0);
        expect(value as number).toBeLessThanOrEqual(1 + 1e-12);
        const changed = [...scores].reverse().map((judge, i) => (i === 0 ? judge.map((x) => x ** 3 + 2) : judge));
        expect(kendallW({ scores: changed }).value).toBeCloseTo(value as number, 12);
      }),
    );
  });
});
