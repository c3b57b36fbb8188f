import { CalcInputError } from '../common/calc-input-error.js';
import { consensus, type ConsensusInput } from './consensus.js';

const votes = (high: number, middle: number, low: number) => [
  ...Array<number>(high).fill(8),
  ...Array<number>(middle).fill(5),
  ...Array<number>(low).fill(2),
];

describe('consensus', () => {
  // Diamond IR et al., J Clin Epidemiol 2014;67:401 (75 %); shares worked by hand: 7/9 = 77.8 %,
  // 6/8 = 75.0 %, 6/9 = 66.7 %.
  test.each([
    [7, 2, 0, true],
    [6, 1, 1, true],
    [6, 3, 0, false],
  ])('75 %%: %i high, %i middle, %i low', (high, middle, low, reached) => {
    const answer = consensus({ ratings: votes(high, middle, low), rule: 'three-quarters' });
    expect(answer).toMatchObject({ reached, direction: 'for', k: high, n: high + middle + low });
  });

  // 70/15 as in core-outcome studies (PMC8024512, table 1): 20 % low is too many, 10 % is not.
  test.each([
    [7, 1, 2, false],
    [7, 2, 1, true],
    [14, 3, 3, false],
    [14, 4, 2, true],
  ])('70/15: %i high, %i middle, %i low', (high, middle, low, reached) => {
    expect(consensus({ ratings: votes(high, middle, low), rule: 'seventy-fifteen' }).reached).toBe(reached);
  });

  test('both share rules can settle against', () => {
    const ratings = votes(1, 1, 8);
    expect(consensus({ ratings, rule: 'three-quarters' })).toMatchObject({ reached: true, direction: 'against', k: 8 });
    expect(consensus({ ratings, rule: 'seventy-fifteen' })).toMatchObject({ reached: true, direction: 'against', k: 8 });
  });

  // RAND MR-1269: a split panel has no consensus, whatever its median.
  test.each([
    [[7, 7, 8, 8, 8, 8, 9, 9, 9], true, 'for', 9],
    [[1, 1, 1, 1, 9, 9, 9, 9, 9], false, 'for', 5],
    [[4, 5, 5, 5, 5, 5, 6, 6, 6], false, 'unsettled', 9],
    [[1, 1, 1, 2, 2, 2, 3, 3, 5], true, 'against', 8],
  ])('RAND on %j', (ratings, reached, direction, k) => {
    expect(consensus({ ratings, rule: 'rand' })).toMatchObject({ reached, direction, k });
  });

  // scipy 1.17.1, stats.binomtest(7, 9).proportion_ci(0.95, 'wilson').
  test('the share comes with its n, abstentions and Wilson interval', () => {
    const answer = consensus({ ratings: votes(7, 2, 0), rule: 'three-quarters', abstentions: 3 });
    expect(answer).toMatchObject({ k: 7, n: 9, abstentions: 3 });
    expect(answer.low).toBeCloseTo(0.4525889691069889, 12);
    expect(answer.high).toBeCloseTo(0.9367748928821533, 12);
  });

  test.each([
    [{ ratings: [5], rule: 'majority' }, 'rule'],
    [{ ratings: [5] }, 'rule'],
    [{ ratings: [], rule: 'rand' }, 'ratings'],
    [{ ratings: [5], rule: 'rand', abstentions: -1 }, 'abstentions'],
  ])('%j is refused at %s', (body, field) => {
    expect(() => consensus(body as unknown as ConsensusInput)).toThrow(CalcInputError);
    expect(() => consensus(body as unknown as ConsensusInput)).toThrow(expect.objectContaining({ field }));
  });
});
