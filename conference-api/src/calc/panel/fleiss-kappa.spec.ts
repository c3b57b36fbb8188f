import fc from 'fast-check';
import { fleissKappa } from './fleiss-kappa.js';

/** Ratings of 30 patients by six raters in five diagnoses, each line one patient. */
const DIAGNOSES_1971 = `
  444444 222555 233335 555555 222444 113333 333355 113334 114444 555555
  144444 124444 222333 144444 224445 333335 111455 111112 224444 133555
  555555 244444 224555 114444 144445 222224 111155 224444 133333 555555`;

const diagnosisCounts = DIAGNOSES_1971.trim()
  .split(/\s+/)
  .map((patient) => [1, 2, 3, 4, 5].map((code) => [...patient].filter((rating) => rating === String(code)).length));

describe('fleissKappa', () => {
  // Data and 0.210 in statsmodels' own tests (test_inter_rater.py, table1); more digits by
  // the formula in Python.
  test('14 raters, 10 cases, 5 categories', () => {
    const counts = [
      [0, 0, 0, 0, 14], [0, 2, 6, 4, 2], [0, 0, 3, 5, 6], [0, 3, 9, 2, 0], [2, 2, 8, 1, 1],
      [7, 7, 0, 0, 0], [3, 2, 6, 3, 0], [2, 5, 3, 2, 2], [6, 5, 2, 1, 0], [0, 2, 2, 3, 7],
    ];
    expect(fleissKappa({ counts }).value).toBeCloseTo(0.209931, 6);
  });

  // Fleiss 1971; the value is R's irr::kappam.fleiss as quoted in statsmodels' test_inter_rater.py.
  test('the diagnoses of the 1971 paper', () => {
    expect(diagnosisCounts).toHaveLength(30);
    expect(fleissKappa({ counts: diagnosisCounts }).value).toBeCloseTo(0.4302445, 7);
  });

  // The first two from statsmodels' tests; the third is a published worked example
  // (statpages.info data); digits by the formula in Python.
  test.each([
    [[[7, 1], [3, 5]], 0.161905],
    [[[6, 1, 0], [0, 7, 0]], 0.708333],
    [[[1, 2, 1], [2, 2, 0], [0, 1, 3], [3, 1, 0], [4, 0, 0]], 0.193548],
    [[[7, 0], [0, 7]], 1],
  ])('%j', (counts, value) => {
    expect(fleissKappa({ counts }).value).toBeCloseTo(value, 6);
  });

  test.each([
    [[[5, 0], [5, 0]], 'one category'],
    [[[1, 0], [0, 1]], 'two ratings'],
    [[[0, 0], [0, 0]], 'two ratings'],
    [[[3, 1], [2, 1]], 'unequal'],
    [[], 'no cases'],
    [[[], []], 'no cases'],
  ])('%j is undefined: %s', (counts, reason) => {
    const { value, why } = fleissKappa({ counts });
    expect(value).toBeNull();
    expect(why).toContain(reason);
  });

  test.each([
    [[[1, 2], [3]], 'counts[1]', 'shape'],
    [[[1, -2]], 'counts[0][1]', 'range'],
    [[[1, 2.5]], 'counts[0][1]', 'integer'],
    [[[1, null]], 'counts[0][1]', 'required'],
    [[1, 2], 'counts[0]', 'type'],
    [null, 'counts', 'required'],
  ])('%j is refused at %s', (counts, field, code) => {
    expect(() => fleissKappa({ counts: counts as number[][] })).toThrow(expect.objectContaining({ field, code }));
  });

  test('the order of cases and of categories changes nothing', () => {
    const rowOf = fc.array(fc.integer({ min: 0, max: 2 }), { minLength: 6, maxLength: 6 });
    fc.assert(
      fc.property(fc.array(rowOf, { minLength: 1, maxLength: 12 }), (ratings) => {
        const counts = ratings.map((row) => [0, 1, 2].map((c) => row.filter((rating) => rating === c).length));
        const turned = [...counts].reverse().map((row) => [...row].reverse());
        const { value } = fleissKappa({ counts });
        const other = fleissKappa({ counts: turned }).value;
        if (value === null) expect(other).toBeNull();
        else expect(other).toBeCloseTo(value, 12);
      }),
    );
  });
});
