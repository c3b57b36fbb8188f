import fc from 'fast-check';
import { ranking, type Ballot, type RankingInput } from './ranking.js';

/** `5 ACBED` is five ballots A > C > B > E > D; brackets hold ties. */
const ballots = (text: string): Ballot[] =>
  text.split(',').map((entry) => {
    const [count, order = ''] = entry.trim().split(' ');
    const groups = order.match(/\([A-Z]+\)|[A-Z]/g) ?? [];
    return { count: Number(count), order: groups.map((group) => [...group.replace(/[()]/g, '')]) };
  });

const rowsOf = (table: Record<string, Record<string, number>>) =>
  Object.fromEntries(Object.entries(table).map(([a, row]) => [a, Object.values(row).join(' ')]));

describe('ranking', () => {
  // Schulze M. Soc Choice Welf 2011;36:267, the example of 45 voters, with both of its tables.
  test('45 voters, five options, no Condorcet winner', () => {
    const answer = ranking({
      ballots: ballots(
        '5 ACBED, 5 ADECB, 8 BEDAC, 3 CABED, 7 CAEBD, 2 CBADE, 7 DCEBA, 8 EBADC',
      ),
    });
    expect(answer.condorcetWinner).toBeNull();
    expect(answer.ranking).toEqual([['E'], ['A'], ['C'], ['B'], ['D']]);
    expect(rowsOf(answer.pairwise)).toEqual({
      A: '20 26 30 22', B: '25 16 33 18', C: '19 29 17 24', D: '15 12 28 14', E: '23 27 21 31',
    });
    expect(rowsOf(answer.strongestPaths)).toEqual({
      A: '28 28 30 24', B: '25 28 33 24', C: '25 29 29 24', D: '25 28 28 24', E: '25 28 28 31',
    });
    expect(answer.strongestPaths.E?.D).toBe(31);
  });

  // Schulze's second example of 30 voters (result from memory), order by independent code in Python.
  test('30 voters, four options', () => {
    const answer = ranking({
      ballots: ballots(
        '5 ACBD, 2 ACDB, 3 ADCB, 4 BACD, 3 CBDA, 3 CDBA, 1 DACB, 5 DBAC, 4 DCBA',
      ),
    });
    expect(answer.ranking).toEqual([['D'], ['A'], ['C'], ['B']]);
  });

  // The textbook example of a capital for Tennessee (from memory).
  test('a Condorcet winner wins though another leads the first choices', () => {
    const answer = ranking({ ballots: ballots('42 MNCK, 26 NCKM, 15 CKNM, 17 KCNM') });
    expect(answer.condorcetWinner).toBe('N');
    expect(answer.ranking).toEqual([['N'], ['C'], ['K'], ['M']]);
  });

  // Worked by hand: A beats B 6:3, B beats C 7:2, C beats A 5:4.
  test('a cycle is cut at its weakest win', () => {
    const answer = ranking({ ballots: ballots('4 ABC, 3 BCA, 2 CAB') });
    expect(answer.condorcetWinner).toBeNull();
    expect(rowsOf(answer.strongestPaths)).toEqual({ A: '6 6', B: '5 7', C: '5 5' });
    expect(answer.ranking).toEqual([['A'], ['B'], ['C']]);
    expect(answer.cautions.join()).toContain('A, B, C');
  });

  test('an even cycle leaves all tied in one group', () => {
    const answer = ranking({ ballots: ballots('1 ABC, 1 BCA, 1 CAB') });
    expect(answer.ranking).toEqual([['A', 'B', 'C']]);
    expect(answer.cautions.join()).toContain('chair');
  });

  // Worked by hand: B beats A 2:0 among those who tell them apart, B beats C 5:2.
  test('ties count for neither', () => {
    const answer = ranking({ ballots: ballots('3 (AB)C, 2 C(AB), 2 BAC') });
    expect(answer.condorcetWinner).toBe('B');
    expect(answer.pairwise).toEqual({ A: { B: 0, C: 5 }, B: { A: 2, C: 5 }, C: { A: 2, B: 2 } });
  });

  test('options left out are tied last; empty ballots are ignored', () => {
    const full = ranking({ ballots: ballots('3 AB(CD), 2 C(ABD)') });
    const short = ranking({ ballots: [...ballots('3 AB, 2 C'), { count: 1, order: [['D']] }, { count: 9, order: [] }] });
    expect(short.pairwise.A).toEqual({ B: 3, C: 3, D: 3 });
    expect(short.pairwise.C).toEqual({ A: 2, B: 2, D: 2 });
    expect(short.pairwise.D).toEqual({ A: 1, B: 1, C: 1 });
    expect(full.ranking[0]).toEqual(['A']);
    expect(ranking({ ballots: [...ballots('4 ABC'), { count: 9, order: [[]] }] }).pairwise.A).toEqual({ B: 4, C: 4 });
  });

  test('nothing to rank, and one option', () => {
    expect(ranking({ ballots: [] })).toMatchObject({ condorcetWinner: null, ranking: [], pairwise: {}, strongestPaths: {} });
    expect(ranking({ ballots: ballots('2 A') })).toMatchObject({ condorcetWinner: 'A', ranking: [['A']] });
  });

  test('an option may bear any name', () => {
    const answer = ranking({ ballots: [{ count: 2, order: [['__proto__'], ['constructor']] }] });
    expect(answer.ranking).toEqual([['__proto__'], ['constructor']]);
    expect(JSON.stringify(answer.pairwise)).toBe('{"__proto__":{"constructor":2},"constructor":{"__proto__":0}}');
  });

  test.each([
    [{ ballots: null }, 'ballots', 'required'],
    [{ ballots: [7] }, 'ballots[0]', 'type'],
    [{ ballots: [{ count: -1, order: [['A']] }] }, 'ballots[0].count', 'range'],
    [{ ballots: [{ count: 1.5, order: [['A']] }] }, 'ballots[0].count', 'integer'],
    [{ ballots: [{ order: [['A']] }] }, 'ballots[0].count', 'required'],
    [{ ballots: [{ count: 1 }] }, 'ballots[0].order', 'required'],
    [{ ballots: [{ count: 1, order: ['A'] }] }, 'ballots[0].order[0]', 'type'],
    [{ ballots: [{ count: 1, order: [['A', 3]] }] }, 'ballots[0].order[0][1]', 'type'],
    [{ ballots: [{ count: 1, order: [['A'], ['B', 'A']] }] }, 'ballots[0].order', 'duplicate'],
    [{ ballots: [{ count: 1, order: [['A']], weight: 2 }] }, 'ballots[0].weight', 'unknown-field'],
  ])('%j is refused at %s as %s', (body, field, code) => {
    expect(() => ranking(body as unknown as RankingInput)).toThrow(expect.objectContaining({ field, code }));
  });

  const ballot = fc.record({
    count: fc.integer({ min: 1, max: 9 }),
    order: fc.shuffledSubarray(['A', 'B', 'C', 'D', 'E'], { minLength: 1 }).map((names) => names.map((name) => [name])),
  });

  // Criteria that Schulze 2011 proves for his method: anonymity, and that a Condorcet winner comes first.
  test('the order of ballots changes nothing and a Condorcet winner comes first alone', () => {
    fc.assert(
      fc.property(fc.array(ballot, { minLength: 1, maxLength: 9 }), (given) => {
        const answer = ranking({ ballots: given });
        expect(ranking({ ballots: [...given].reverse() })).toEqual(answer);
        if (answer.condorcetWinner !== null) expect(answer.ranking[0]).toEqual([answer.condorcetWinner]);
        expect(answer.ranking.flat().sort()).toEqual([...new Set(given.flatMap(({ order }) => order.flat()))].sort());
      }),
    );
  });

  // Reversal symmetry (Schulze 2011, section 4.4): a sole winner is no winner of the reversed ballots.
  test('turning all ballots round does not keep a sole winner first', () => {
    const complete = fc.record({
      count: fc.integer({ min: 1, max: 9 }),
      order: fc.shuffledSubarray(['A', 'B', 'C', 'D'], { minLength: 4 }).map((names) => names.map((name) => [name])),
    });
    fc.assert(
      fc.property(fc.array(complete, { minLength: 1, maxLength: 7 }), (given) => {
        const first = ranking({ ballots: given }).ranking[0] as string[];
        fc.pre(first.length === 1);
        const turned = given.map(({ count, order }) => ({ count, order: [...order].reverse() }));
        expect(ranking({ ballots: turned }).ranking[0]).not.toEqual(first);
      }),
    );
  });
});
