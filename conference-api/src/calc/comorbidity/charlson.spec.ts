import fc from 'fast-check';
import { calculateCharlson, CHARLSON_CONDITIONS, tenYearSurvivalAt } from './charlson.js';
import type { CharlsonInput } from './charlson.js';

const index = (conditions: string[], ageYears?: number | null) => calculateCharlson({ conditions, ageYears });

describe('Charlson index of 1987', () => {
  // Source: weights in Charlson and others 1987 as in PMC7946705 Table 4.
  test.each([
    [1, ['myocardial-infarction', 'congestive-heart-failure', 'peripheral-vascular-disease', 'cerebrovascular-disease', 'dementia', 'chronic-pulmonary-disease', 'connective-tissue-disease', 'ulcer-disease', 'mild-liver-disease', 'diabetes']],
    [2, ['hemiplegia', 'moderate-or-severe-renal-disease', 'diabetes-with-end-organ-damage', 'any-tumor', 'leukemia', 'lymphoma']],
    [3, ['moderate-or-severe-liver-disease']],
    [6, ['metastatic-solid-tumor', 'aids']],
  ])('weight %i', (weight, names) => {
    for (const name of names) expect(index([name]).score).toBe(weight);
  });

  test('has the 19 conditions of the table', () => {
    expect(CHARLSON_CONDITIONS).toHaveLength(19);
  });

  // Worked by hand from the weights and the age points.
  test.each([
    [['myocardial-infarct', 'diabetes'], 72, 2, 5],
    [['metastatic-solid-tumor', 'any-tumor'], 58, 6, 7],
    [[], 81, 0, 4],
    [['mild-liver-disease', 'moderate-or-severe-liver-disease'], 40, 3, 3],
    [['diabetes', 'diabetes-with-end-organ-damage'], 40, 2, 2],
    [['leukemia', 'lymphoma', 'any-tumor'], 40, 6, 6],
  ])('%j at %i', (conditions, age, score, ageAdjusted) => {
    expect(index(conditions, age)).toMatchObject({ score, ageAdjusted });
  });

  // Source: age points of 1994 as on fpnotebook: none under 50, one a decade from 50, four from 80.
  test.each([
    [0, 0], [40, 0], [49, 0], [49.9, 0], [50, 1], [59, 1], [60, 2], [69, 2], [70, 3], [79, 3], [80, 4], [90, 4], [104, 4],
  ])('age %d adds %i', (age, points) => {
    expect(index([], age).ageAdjusted).toBe(points);
  });

  test('age not known: no age-adjusted score and no survival', () => {
    expect(index(['aids'], null)).toMatchObject({ score: 6, ageAdjusted: null, tenYearSurvival: null });
    expect(index(['aids'])).toMatchObject({ ageAdjusted: null });
  });

  test('a condition given twice, or in two spellings, counts once', () => {
    expect(index(['dementia', 'dementia']).score).toBe(1);
    expect(index(['any-tumour', 'any-tumor']).score).toBe(2);
  });

  // Source: 0.983^(e^(0.9·score)), fpnotebook; percentages computed with independent code (Python).
  test.each([[0, 98.3], [1, 95.87], [2, 90.15], [3, 77.48], [4, 53.39], [5, 21.36], [6, 2.25]])('ten-year survival at %i', (score, percent) => {
    expect(tenYearSurvivalAt(score) * 100).toBeCloseTo(percent, 2);
  });

  test('survival goes with the age-adjusted score', () => {
    expect(index(['diabetes'], 72).tenYearSurvival! * 100).toBeCloseTo(53.39, 2);
  });

  test('one more condition never lowers the score', () => {
    const names = fc.constantFrom(...CHARLSON_CONDITIONS);
    fc.assert(
      fc.property(fc.array(names), names, (conditions, extra) => {
        expect(index([...conditions, extra]).score).toBeGreaterThanOrEqual(index(conditions).score);
      }),
    );
  });

  test.each([
    [{ conditions: ['gout'] }, 'conditions', 'choice'],
    [{ conditions: ['toString'] }, 'conditions', 'choice'],
    [{ conditions: [7] }, 'conditions', 'type'],
    [{ conditions: null }, 'conditions', 'required'],
    [{ conditions: 'diabetes' }, 'conditions', 'type'],
    [{ conditions: [], ageYears: -1 }, 'ageYears', 'range'],
    [{ conditions: [], ageYears: 131 }, 'ageYears', 'range'],
  ])('refuses %j', (input, field, code) => {
    expect(() => calculateCharlson(input as unknown as CharlsonInput)).toThrow(expect.objectContaining({ field, code }));
  });
});
