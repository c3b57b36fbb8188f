import fc from 'fast-check';
import { CalcInputError } from '../common/calc-input-error.js';
import { panel, type PanelInput } from './panel.js';

const ratingsOf = (min: number, max: number) =>
  fc.array(fc.integer({ min: 1, max: 9 }), { minLength: min, maxLength: max });

const fieldOf = (run: () => unknown): string => {
  try {
    run();
  } catch (error) {
    if (error instanceof CalcInputError) return `${error.field} ${error.code}`;
    throw error;
  }
  return 'accepted';
};

describe('panel', () => {
  // IPR, IPRAS and verdict as printed in PMC3467596, TB1 (n = 15; its "2.5" is a misprint
  // for 2.35, since 2.35 + 3.75 is the 6.10 it prints).
  test('the published panel of 15', () => {
    const answer = panel({ ratings: [1, 3, 6, 7, 7, 7, 7, 7, 8, 8, 8, 8, 8, 9, 9] });
    expect(answer).toMatchObject({
      n: 15,
      median: 7,
      p30: 7,
      p70: 8,
      ipr: 1,
      disagreement: false,
      classicDisagreement: false,
      agreement: true,
      band: 'appropriate',
      verdict: 'appropriate',
    });
    expect(answer.ipras).toBeCloseTo(6.1, 12);
    expect(answer.disagreementIndex).toBeCloseTo(0.164, 3);
  });

  // From the formula of RAND MR-1269 by independent code (Python with numpy), both percentile rules.
  test.each([
    [[7, 7, 8, 8, 8, 8, 9, 9, 9], 8, 8, 9, 1, 7.6, 0.132, 0.6, 7.3],
    [[1, 1, 2, 3, 5, 7, 8, 9, 9], 5, 2, 8, 6, 2.35, 2.553, 5.2, 2.35],
    [[4, 5, 5, 5, 5, 5, 6, 6, 6], 5, 5, 6, 1, 3.1, 0.323, 0.6, 2.8],
    [[2, 7, 7, 7, 7, 8, 8, 9, 9], 7, 7, 8, 1, 6.1, 0.164, 1, 6.1],
    [[1, 2, 3, 5, 5, 5, 7, 8, 9], 5, 3, 7, 4, 2.35, 1.702, 2.4, 2.35],
    [[1, 2, 2, 4, 5, 6, 6, 7, 8], 5, 2, 6, 4, 3.85, 1.039, 3.2, 3.25],
    [[3, 3, 4, 5, 6, 7, 8, 8], 5.5, 3.7, 7.3, 3.6, 3.1, 1.161, 2.8, 3.1],
    [[1, 1, 1, 1, 9, 9, 9, 9, 9], 9, 1, 9, 8, 2.35, 3.404, 8, 2.35],
  ])('%j', (ratings, median, p30, p70, ipr, ipras, index, linearIpr, linearIpras) => {
    const weibull = panel({ ratings });
    expect([weibull.median, weibull.p30, weibull.p70]).toEqual([median, p30, p70]);
    expect(weibull.ipr).toBeCloseTo(ipr, 12);
    expect(weibull.ipras).toBeCloseTo(ipras, 12);
    expect(weibull.disagreementIndex).toBeCloseTo(index, 3);
    const linear = panel({ ratings, percentiles: 'linear' });
    expect(linear.ipr).toBeCloseTo(linearIpr, 12);
    expect(linear.ipras).toBeCloseTo(linearIpras, 12);
  });

  // Same source; the two panels on which the percentile rule decides.
  test.each([
    [[1, 2, 2, 4, 5, 6, 6, 7, 8], true, false],
    [[3, 3, 4, 5, 6, 7, 8, 8], true, false],
    [[1, 2, 3, 5, 5, 5, 7, 8, 9], true, true],
    [[7, 7, 8, 8, 8, 8, 9, 9, 9], false, false],
  ])('%j disagrees by weibull %p, by linear %p', (ratings, weibull, linear) => {
    const byWeibull = panel({ ratings, percentiles: 'weibull' });
    expect(byWeibull.disagreement).toBe(weibull);
    expect(panel({ ratings, percentiles: 'linear' }).disagreement).toBe(linear);
    const warned = byWeibull.cautions.some((caution) => caution.includes('other percentile rule'));
    expect(warned).toBe(weibull !== linear);
  });

  // Disagreement is uncertain by definition (RAND MR-1269), whatever the median.
  test('a median of 9 under disagreement is uncertain', () => {
    const answer = panel({ ratings: [1, 1, 1, 1, 9, 9, 9, 9, 9] });
    expect([answer.median, answer.band, answer.verdict]).toEqual([9, 'appropriate', 'uncertain']);
  });

  // Half medians go to the more appropriate band (from memory of RAND MR-1269).
  test.each([
    [[3, 3], 'inappropriate'],
    [[3, 4], 'uncertain'],
    [[6, 6], 'uncertain'],
    [[6, 7], 'appropriate'],
    [[7, 7], 'appropriate'],
  ])('median of %j is %s', (ratings, band) => {
    expect(panel({ ratings }).band).toBe(band);
  });

  // BMC Med Inform Decis Mak 2012;12:93, table 7: ratings in each of 1–3 and 7–9.
  test.each([
    [8, 2, false], [8, 3, true], [10, 3, true], [11, 3, false], [11, 4, true],
    [13, 4, true], [14, 4, false], [14, 5, true], [16, 5, true], [7, 3, null], [17, 6, null],
  ])('of %i ratings, %i in each extreme: disagreement %p', (n, each, expected) => {
    const ratings = [...Array(each).fill(2), ...Array(each).fill(8), ...Array(n - 2 * each).fill(5)];
    expect(panel({ ratings }).classicDisagreement).toBe(expected);
  });

  // The same table: ratings outside the three-point region of the median.
  test.each([
    [8, 2, true], [10, 2, true], [10, 3, false], [11, 3, true], [13, 4, false],
    [14, 4, true], [16, 4, true], [16, 5, false], [7, 1, null], [17, 1, null],
  ])('of %i ratings, %i outside the region: agreement %p', (n, outside, expected) => {
    const ratings = [...Array(outside).fill(5), ...Array(n - outside).fill(8)];
    expect(panel({ ratings }).agreement).toBe(expected);
  });

  test('one rating is counted, with a caution (ranks stay within 1 to n)', () => {
    const answer = panel({ ratings: [8] });
    expect(answer).toMatchObject({ n: 1, median: 8, p30: 8, p70: 8, ipr: 0, disagreementIndex: 0 });
    expect(answer.cautions).toContain('Fewer than 8 ratings: show counts, not verdicts.');
    expect(panel({ ratings: [7, 7, 7, 8, 8, 8, 8, 9] }).cautions).toEqual([]);
  });

  test.each([
    [{ ratings: [] }, 'ratings empty'],
    [{ ratings: null }, 'ratings required'],
    [{}, 'ratings required'],
    [{ ratings: 7 }, 'ratings type'],
    [{ ratings: [7, 8, 9, 0] }, 'ratings[3] range'],
    [{ ratings: [10] }, 'ratings[0] range'],
    [{ ratings: [5, 6.5] }, 'ratings[1] integer'],
    [{ ratings: [5, null] }, 'ratings[1] required'],
    [{ ratings: [5, '6'] }, 'ratings[1] type'],
    [{ ratings: [Number.NaN] }, 'ratings[0] type'],
    [{ ratings: [5], percentiles: 'nearest' }, 'percentiles choice'],
  ])('%j is refused at %s', (body, expected) => {
    expect(fieldOf(() => panel(body as unknown as PanelInput))).toBe(expected);
  });

  test('permuting raters changes nothing', () => {
    fc.assert(
      fc.property(ratingsOf(1, 40), fc.integer(), (ratings, salt) => {
        const shuffled = [...ratings].sort((a, b) => ((a * 31 + salt) % 7) - ((b * 31 + salt) % 7));
        expect(panel({ ratings: shuffled })).toEqual(panel({ ratings }));
      }),
    );
  });

  test('turning the scale round mirrors the figures', () => {
    fc.assert(
      fc.property(ratingsOf(1, 40), fc.constantFrom('weibull' as const, 'linear' as const), (ratings, percentiles) => {
        const answer = panel({ ratings, percentiles });
        const mirrored = panel({ ratings: ratings.map((rating) => 10 - rating), percentiles });
        expect(mirrored.median).toBeCloseTo(10 - answer.median, 12);
        expect(mirrored.ipr).toBeCloseTo(answer.ipr, 12);
        expect(mirrored.ipras).toBeCloseTo(answer.ipras, 12);
        expect(mirrored.disagreement).toBe(answer.disagreement);
      }),
    );
  });

  // The index itself may rise a little, since IPRAS shifts too; the finding may not.
  test('adding a rater at the median never widens IPR or brings disagreement', () => {
    fc.assert(
      fc.property(ratingsOf(1, 40), fc.constantFrom('weibull' as const, 'linear' as const), (ratings, percentiles) => {
        const before = panel({ ratings, percentiles });
        fc.pre(Number.isInteger(before.median));
        const after = panel({ ratings: [...ratings, before.median], percentiles });
        expect(after.median).toBe(before.median);
        expect(after.ipr).toBeLessThanOrEqual(before.ipr);
        expect(after.disagreement && !before.disagreement).toBe(false);
        const newlySplit = before.classicDisagreement === false && after.classicDisagreement === true;
        expect(newlySplit).toBe(false);
      }),
      { numRuns: 2000 },
    );
  });
});
