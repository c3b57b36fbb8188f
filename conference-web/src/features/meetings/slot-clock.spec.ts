import { chooseSlot, clockFace, driftWords, EMPTY_CLOCK, forecast, spentOn, startClock, stopClock } from './slot-clock';

// Minutes worked by hand; no source outside.
const START = Date.parse('2026-12-09T07:30:00Z');
const minute = (count: number) => START + count * 60_000;
const item = (id: string, minutes: number, state: 'listed' | 'decided' | 'deferred' = 'listed') => ({ id, minutes, state });
const meeting = (...items: ReturnType<typeof item>[]) => ({ startsAt: '2026-12-09T07:30:00Z', startedAt: null as string | null, minutes: 60, items });

describe('the time of a slot', () => {
  test('runs from when its case is chosen', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'a', minute(0), true);
    expect(spentOn(clock, 'a', minute(7))).toBe(7 * 60_000);
    expect(spentOn(clock, 'b', minute(7))).toBe(0);
  });

  test('goes on from where it was when the case is taken up again', () => {
    let clock = chooseSlot(EMPTY_CLOCK, 'a', minute(0), true);
    clock = chooseSlot(clock, 'b', minute(5), true);
    clock = chooseSlot(clock, 'a', minute(8), true);
    expect(spentOn(clock, 'a', minute(10))).toBe(7 * 60_000);
    expect(spentOn(clock, 'b', minute(10))).toBe(3 * 60_000);
  });

  test('is not begun anew by choosing the same case twice', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'a', minute(0), true);
    expect(spentOn(chooseSlot(clock, 'a', minute(6), true), 'a', minute(9))).toBe(9 * 60_000);
  });

  test('stands while the clock is stopped', () => {
    let clock = stopClock(chooseSlot(EMPTY_CLOCK, 'a', minute(0), true), minute(4));
    expect(spentOn(clock, 'a', minute(30))).toBe(4 * 60_000);
    clock = startClock(clock, minute(30));
    expect(spentOn(clock, 'a', minute(31))).toBe(5 * 60_000);
  });

  test('does not run before the meeting has started', () => {
    expect(spentOn(chooseSlot(EMPTY_CLOCK, 'a', minute(0), false), 'a', minute(9))).toBe(0);
  });
});

describe('the drift of the running order', () => {
  test('is none while each case keeps to its minutes', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'b', minute(20), true);
    const { driftMinutes, endsAt } = forecast(meeting(item('a', 20, 'decided'), item('b', 15), item('c', 10)), clock, minute(28));
    expect(driftMinutes).toBeCloseTo(0);
    expect(endsAt.getTime()).toBe(minute(45));
  });

  test('counts a late start', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'a', minute(6), true);
    expect(forecast(meeting(item('a', 20), item('b', 15)), clock, minute(10)).driftMinutes).toBeCloseTo(6);
  });

  test('grows only once a case uses more than its minutes', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'a', minute(0), true);
    const order = meeting(item('a', 10), item('b', 15));
    expect(forecast(order, clock, minute(10)).driftMinutes).toBeCloseTo(0);
    expect(forecast(order, clock, minute(14)).driftMinutes).toBeCloseTo(4);
  });

  test('falls when a case is decided early or deferred', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'c', minute(12), true);
    const { driftMinutes } = forecast(meeting(item('a', 20, 'decided'), item('b', 15, 'deferred'), item('c', 10)), clock, minute(12));
    expect(driftMinutes).toBeCloseTo(-23);
  });

  test('says how far past the meeting’s end it will go', () => {
    const clock = chooseSlot(EMPTY_CLOCK, 'a', minute(0), true);
    expect(forecast(meeting(item('a', 40), item('b', 30)), clock, minute(0)).overMinutes).toBeCloseTo(10);
    expect(forecast(meeting(item('a', 40)), clock, minute(0)).overMinutes).toBe(0);
  });

  test('begins where the meeting did when that was hours away from its planned time', () => {
    const order = meeting(item('a', 20), item('b', 15));
    const clock = chooseSlot(EMPTY_CLOCK, 'a', minute(600), true);
    const later = { ...order, startedAt: new Date(minute(600)).toISOString() };
    expect(forecast(later, clock, minute(605)).driftMinutes).toBeCloseTo(0);
    const slightlyLate = { ...order, startedAt: new Date(minute(10)).toISOString() };
    expect(forecast(slightlyLate, chooseSlot(EMPTY_CLOCK, 'a', minute(10), true), minute(10)).driftMinutes).toBeCloseTo(10);
  });

  test.each([[0.4, 'On time'], [-0.4, 'On time'], [3.6, '4 min behind'], [-3.2, '3 min ahead']])('reads %d as %s', (drift, words) => {
    expect(driftWords(drift)).toBe(words);
  });
});

test.each([[0, '0:00'], [65_000, '1:05'], [-65_900, '−1:05'], [-400, '0:00'], [3_661_000, '61:01']])('%d ms shows as %s', (ms, face) => {
  expect(clockFace(ms)).toBe(face);
});
