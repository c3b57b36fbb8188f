import fc from 'fast-check';
import { agendaFill, type AgendaFillInput, type AgendaItem } from './agenda-fill.js';

/** Items named 1, 2, 3 … as published instances number them. */
const numbered = (minutes: number[], priorities: number[]): AgendaItem[] =>
  minutes.map((value, i) => ({ id: String(i + 1), minutes: value, priority: priorities[i] as number }));

const AGENDA = numbered([20, 15, 10, 15, 10, 5], [9, 7, 6, 6, 3, 2]);

describe('agendaFill', () => {
  // Instances P01 and P02 of Florida State University's public knapsack_01 set; the third is a
  // textbook instance on which filling by ratio gives 160.
  test.each([
    [165, [23, 31, 29, 44, 53, 38, 63, 85, 89, 82], [92, 57, 49, 68, 60, 43, 67, 84, 87, 72], 309, 165, '1,2,3,4,6'],
    [26, [12, 7, 11, 8, 9], [24, 13, 23, 15, 16], 51, 26, '2,3,4'],
    [50, [10, 20, 30], [60, 100, 120], 220, 50, '2,3'],
  ])('published instance of capacity %i', (minutes, sizes, worths, priority, usedMinutes, chosen) => {
    const answer = agendaFill({ minutes, items: numbered(sizes, worths) });
    expect(answer).toMatchObject({ priority, usedMinutes, chosen: chosen.split(',') });
  });

  // Instance P08 of the same set (24 items, capacity 6404180): optimum 13549094 (from memory).
  test('a hard published instance of 24 items', () => {
    const sizes = [
      382745, 799601, 909247, 729069, 467902, 44328, 34610, 698150, 823460, 903959, 853665, 551830,
      610856, 670702, 488960, 951111, 323046, 446298, 931161, 31385, 496951, 264724, 224916, 169684,
    ];
    const worths = [
      825594, 1677009, 1676628, 1523970, 943972, 97426, 69666, 1296457, 1679693, 1902996, 1844992,
      1049289, 1252836, 1319836, 953277, 2067538, 675367, 853655, 1826027, 65731, 901489, 577243,
      466257, 369261,
    ];
    const answer = agendaFill({ minutes: 6404180, items: numbered(sizes, worths) });
    expect([answer.priority, answer.usedMinutes]).toEqual([13549094, 6402560]);
  });

  // By exhaustive search in Python; at 30 minutes {1,3} and {2,3,6} tie and the earlier-given win.
  test.each([
    [45, 22, 45, '1,2,3'],
    [60, 28, 60, '1,2,3,4'],
    [30, 15, 30, '1,3'],
    [0, 0, 0, ''],
  ])('an agenda of %i minutes', (minutes, priority, usedMinutes, chosen) => {
    const answer = agendaFill({ minutes, items: AGENDA });
    expect(answer).toMatchObject({ priority, usedMinutes, chosen: chosen === '' ? [] : chosen.split(',') });
  });

  // Worked by hand: 15 + 5 and 10 + 5 use 35 minutes; three items would need 60.
  test('the change-over counts for each chosen item', () => {
    const answer = agendaFill({ minutes: 45, changeoverMinutes: 5, items: AGENDA });
    expect(answer).toMatchObject({ chosen: ['1', '2'], usedMinutes: 45, priority: 16 });
    expect(agendaFill({ minutes: 35, changeoverMinutes: 5, items: AGENDA.slice(1, 4) })).toMatchObject({
      chosen: ['2', '3'],
      usedMinutes: 35,
    });
  });

  test('must-haves come first and take their minutes off', () => {
    const items = AGENDA.map((item) => ({ ...item, mustHave: item.id === '5' }));
    // Worked by hand: of the 35 minutes left, 1, 3 and 6 make 17; 1 and 2 only 16, 2, 3 and 6 only 15.
    expect(agendaFill({ minutes: 45, items })).toMatchObject({
      chosen: ['1', '3', '5', '6'],
      priority: 20,
      usedMinutes: 45,
    });
  });

  test('must-haves that do not fit together: the best of them, nothing else, and a caution', () => {
    const items: AgendaItem[] = [
      { id: 'a', minutes: 20, priority: 5, mustHave: true },
      { id: 'b', minutes: 5, priority: 50 },
      { id: 'c', minutes: 25, priority: 6, mustHave: true },
      { id: 'd', minutes: 30, priority: 6, mustHave: true },
    ];
    const answer = agendaFill({ minutes: 30, items });
    expect(answer).toMatchObject({ chosen: ['c'], usedMinutes: 25, priority: 6 });
    expect(answer.cautions.join()).toContain('Left out: a, d.');
  });

  test('ties go to fewer minutes, then to earlier-given items', () => {
    const item = (id: string, minutes: number, priority: number) => ({ id, minutes, priority });
    expect(agendaFill({ minutes: 30, items: [item('long', 30, 5), item('short', 20, 5)] }).chosen).toEqual(['short']);
    expect(agendaFill({ minutes: 20, items: [item('x', 20, 5), item('y', 20, 5)] }).chosen).toEqual(['x']);
    expect(agendaFill({ minutes: 20, items: [item('y', 20, 5), item('x', 20, 5)] }).chosen).toEqual(['y']);
  });

  test('an item of no minutes is taken; one longer than the meeting never is, with a caution', () => {
    const items = [
      { id: 'note', minutes: 0, priority: 1 },
      { id: 'epic', minutes: 90, priority: 99 },
      { id: 'case', minutes: 20, priority: 5 },
    ];
    const answer = agendaFill({ minutes: 20, items });
    expect(answer).toMatchObject({ chosen: ['note', 'case'], usedMinutes: 20, priority: 6 });
    expect(answer.cautions.join()).toContain('epic');
  });

  test('decimals are added exactly', () => {
    // 0.1 + 0.2 is 0.30000000000000004 in binary and would not fit.
    const items = numbered([0.1, 0.2], [0.7, 0.1]);
    expect(agendaFill({ minutes: 0.3, items })).toMatchObject({ chosen: ['1', '2'], usedMinutes: 0.3, priority: 0.8 });
    expect(agendaFill({ minutes: 0.3, changeoverMinutes: 0.000001, items }).chosen).toEqual(['1']);
    expect(agendaFill({ minutes: 22.5, items: numbered([7.5, 15, 7.25], [1, 2, 1.5]) })).toMatchObject({
      chosen: ['2', '3'],
      usedMinutes: 22.25,
      priority: 3.5,
    });
  });

  test.each([
    [{ minutes: -1 }, 'minutes', 'range'],
    [{ minutes: null }, 'minutes', 'required'],
    [{ minutes: 0.1234567 }, 'minutes', 'too-precise'],
    [{ changeoverMinutes: -1 }, 'changeoverMinutes', 'range'],
    [{ items: null }, 'items', 'required'],
    [{ items: [5] }, 'items[0]', 'type'],
    [{ items: [{ id: 'a', minutes: 1 }] }, 'items[0].priority', 'required'],
    [{ items: [{ id: 'a', minutes: -1, priority: 1 }] }, 'items[0].minutes', 'range'],
    [{ items: [{ id: 'a', minutes: '5', priority: 1 }] }, 'items[0].minutes', 'type'],
    [{ items: [{ id: '', minutes: 5, priority: 1 }] }, 'items[0].id', 'required'],
    [{ items: [{ id: 7, minutes: 5, priority: 1 }] }, 'items[0].id', 'type'],
    [{ items: [{ id: 'a', minutes: 5, priority: 1, mustHave: 'yes' }] }, 'items[0].mustHave', 'type'],
    [{ items: [{ id: 'a', minutes: 5, priority: 1, colour: 'red' }] }, 'items[0].colour', 'unknown-field'],
    [{ items: [...numbered([1], [1]), ...numbered([1], [1])] }, 'items[1].id', 'duplicate'],
  ])('%j is refused at %s as %s', (change, field, code) => {
    const body = { minutes: 30, items: [], ...change } as unknown as AgendaFillInput;
    expect(() => agendaFill(body)).toThrow(expect.objectContaining({ field, code }));
  });

  // Brute force over all subsets, with the tie rule written out as a comparison of sets.
  test('equal to brute force on small random cases', () => {
    const item = fc.record({
      minutes: fc.integer({ min: 0, max: 24 }).map((quarters) => quarters / 4),
      priority: fc.integer({ min: 0, max: 12 }).map((halves) => halves / 2),
      mustHave: fc.boolean().map((flag) => flag || null),
    });
    const meeting = fc.record({
      minutes: fc.integer({ min: 0, max: 80 }).map((quarters) => quarters / 4),
      changeoverMinutes: fc.constantFrom(0, 0.5, 1),
      drawn: fc.array(item, { maxLength: 8 }),
      withMust: fc.boolean(),
    });
    fc.assert(
      fc.property(meeting, ({ minutes, changeoverMinutes, drawn, withMust }) => {
        const items = drawn.map((entry, i) => ({ id: `i${i}`, ...entry, mustHave: withMust ? entry.mustHave : null }));
        const answer = agendaFill({ minutes, changeoverMinutes, items });
        expect({ chosen: answer.chosen, used: answer.usedMinutes, priority: answer.priority }).toEqual(
          bruteForce(minutes, changeoverMinutes, items),
        );
      }),
      { numRuns: 400 },
    );
  });

  test.each([
    [60, 20, 1],
    [500, 90, 1],
    [500, 240, 2],
  ])('%i items for %i minutes take less than a few seconds', (n, minutes, parts) => {
    const items = Array.from({ length: n }, (_, i) => ({
      id: `i${i}`,
      minutes: 5 + ((i * 7919) % (30 * parts)) / parts,
      priority: 1 + ((i * 104729) % 97),
    }));
    const started = performance.now();
    const answer = agendaFill({ minutes, changeoverMinutes: 1, items });
    expect(performance.now() - started).toBeLessThan(5000);
    expect(answer.usedMinutes).toBeLessThanOrEqual(minutes);
    expect(answer.chosen.length).toBeGreaterThan(0);
  });

  test('a search that would not end in time is refused, not guessed', () => {
    const powers = Array.from({ length: 40 }, (_, i) => 2 ** (i % 29) + 1);
    const body = { minutes: 2 ** 28, items: numbered(powers, powers) };
    expect(() => agendaFill(body)).toThrow(expect.objectContaining({ field: 'items', code: 'too-hard' }));
  });
});

/** Quarters and halves are exact in binary, so plain sums do. */
function bruteForce(minutes: number, changeover: number, items: AgendaItem[]) {
  const sum = (set: number[], of: (item: AgendaItem) => number) =>
    set.reduce((total, i) => total + of(items[i] as AgendaItem), 0);
  const used = (set: number[]) => sum(set, (item) => item.minutes + changeover);
  const worth = (set: number[]) => sum(set, (item) => item.priority);
  const all = items.map((_, i) => i);
  const must = all.filter((i) => items[i]?.mustHave);
  const mustFit = used(must) <= minutes;
  let best: number[] | null = null;
  for (let bits = 0; bits < 2 ** items.length; bits += 1) {
    const set = all.filter((i) => bits & (1 << i));
    if (used(set) > minutes) continue;
    if (mustFit ? must.some((i) => !set.includes(i)) : set.some((i) => !must.includes(i))) continue;
    if (best === null || isBetter(set, best)) best = set;
  }
  const chosen = best ?? [];
  return { chosen: chosen.map((i) => items[i]?.id), used: used(chosen), priority: worth(chosen) };

  function isBetter(a: number[], b: number[]): boolean {
    if (worth(a) !== worth(b)) return worth(a) > worth(b);
    if (used(a) !== used(b)) return used(a) < used(b);
    const differing = all.find((i) => a.includes(i) !== b.includes(i));
    return differing !== undefined && a.includes(differing);
  }
}
