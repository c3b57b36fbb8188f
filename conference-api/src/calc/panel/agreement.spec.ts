import { agreement, type AgreementInput } from './agreement.js';

describe('agreement', () => {
  // Values as in the statistics' own checks: statsmodels' tests (kappa), fast-krippendorff's
  // doctest (alpha, to three digits), the formula for equal rankings (W).
  test('each method answers with its figure, no reason and its definition', () => {
    const kappa = agreement({ method: 'fleiss-kappa', counts: [[7, 1], [3, 5]] });
    expect(kappa.value).toBeCloseTo(0.161905, 6);
    expect(kappa).toEqual({ value: kappa.value, why: null, definition: expect.stringContaining('Fleiss'), cautions: [] });

    const data = [
      [1, 2, 3, 3, 2, 1, 4, 1, 2, null, null, null],
      [1, 2, 3, 3, 2, 2, 4, 1, 2, 5, null, 3],
      [null, 3, 3, 3, 2, 3, 4, 2, 2, 5, 1, null],
      [1, 2, 3, 3, 2, 4, 4, 1, 2, 5, 1, null],
    ];
    const alpha = agreement({ method: 'krippendorff-alpha', level: 'ordinal', data });
    expect(alpha.value).toBeCloseTo(0.815, 3);
    expect(alpha.why).toBeNull();
    expect(alpha.definition).toContain('ordinal');

    const w = agreement({ method: 'kendall-w', scores: [[1, 2, 3], [1, 2, 3]] });
    expect(w).toMatchObject({ value: 1, why: null, df: 2, chiSquare: 4, uncorrected: 1 });
    expect(w.definition).toContain('Kendall');
  });

  test('where undefined: no value and a reason', () => {
    const kappa = agreement({ method: 'fleiss-kappa', counts: [[5, 0], [5, 0]] });
    expect(kappa).toMatchObject({ value: null, why: expect.stringContaining('one category') });
    const w = agreement({ method: 'kendall-w', scores: [[1, 2, 3]] });
    expect(w).toMatchObject({ value: null, p: null, why: expect.stringContaining('judges') });
  });

  test.each([
    [{}, 'method', 'required'],
    [{ method: 'cohen-kappa', counts: [[1]] }, 'method', 'choice'],
    [{ method: 'fleiss-kappa' }, 'counts', 'required'],
    [{ method: 'krippendorff-alpha', data: [[1, 2]] }, 'level', 'required'],
    [{ method: 'krippendorff-alpha', level: 'nominal' }, 'data', 'required'],
    [{ method: 'kendall-w' }, 'scores', 'required'],
    [{ method: 'fleiss-kappa', counts: [[1, 1]], scores: [[1]] }, 'scores', 'not-used'],
  ])('%j is refused at %s as %s', (body, field, code) => {
    expect(() => agreement(body as AgreementInput)).toThrow(expect.objectContaining({ field, code }));
  });

  test('null for another method’s field is the same as leaving it out', () => {
    expect(agreement({ method: 'fleiss-kappa', counts: [[7, 1], [3, 5]], data: null, level: null }).why).toBeNull();
  });
});
