import { agendaChanges, mergeAgendas, sameAgenda } from './agenda-draft';

const agenda = (...entries: [string, number][]) => entries.map(([caseId, minutes]) => ({ caseId, minutes }));
const base = agenda(['a', 15], ['b', 20], ['c', 10]);

test('two agendas are the same only with the same cases, minutes and order', () => {
  expect(sameAgenda(base, agenda(['a', 15], ['b', 20], ['c', 10]))).toBe(true);
  expect(sameAgenda(base, agenda(['b', 20], ['a', 15], ['c', 10]))).toBe(false);
  expect(sameAgenda(base, agenda(['a', 15], ['b', 25], ['c', 10]))).toBe(false);
  expect(sameAgenda(base, agenda(['a', 15], ['b', 20]))).toBe(false);
});

test('changes are told one by one', () => {
  const name = (id: string) => id.toUpperCase();
  expect(agendaChanges(base, agenda(['c', 10], ['a', 25], ['d', 5]), name)).toEqual(['D put on, 5 min', 'B taken off', 'A: 15 → 25 min', 'Another order']);
  expect(agendaChanges(base, base, name)).toEqual([]);
  expect(agendaChanges(base, agenda(['d', 5], ['a', 15], ['b', 20], ['c', 10]), name)).toEqual(['D put on, 5 min']);
});

describe('putting two agendas together', () => {
  test('keeps my order and brings what they put on and took off', () => {
    const mine = agenda(['c', 10], ['a', 15], ['b', 20]);
    const theirs = agenda(['a', 15], ['c', 10], ['d', 30]);
    expect(mergeAgendas(base, mine, theirs)).toEqual(agenda(['c', 10], ['a', 15], ['d', 30]));
  });

  test('takes their minutes only where mine were left alone', () => {
    const mine = agenda(['a', 30], ['b', 20], ['c', 10]);
    const theirs = agenda(['a', 40], ['b', 25], ['c', 10]);
    expect(mergeAgendas(base, mine, theirs)).toEqual(agenda(['a', 30], ['b', 25], ['c', 10]));
  });

  test('keeps what I put on, and does not bring back what I took off', () => {
    const mine = agenda(['a', 15], ['c', 10], ['e', 5]);
    expect(mergeAgendas(base, mine, base)).toEqual(mine);
  });

  test('lists a case that both put on once', () => {
    const both = agenda(['a', 15], ['b', 20], ['c', 10], ['d', 12]);
    expect(mergeAgendas(base, both, agenda(['a', 15], ['b', 20], ['c', 10], ['d', 8]))).toEqual(both);
  });
});
