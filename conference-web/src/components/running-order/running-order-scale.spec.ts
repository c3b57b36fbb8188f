import { clockTicks, indexAfterDrag, layOutSlots, moved, pixelsPerMinute } from './running-order-scale';

// Plain arithmetic of minutes, worked by hand; no source outside.
const slots = (...minutes: number[]) => minutes.map((each, index) => ({ id: `case-${index + 1}`, minutes: each }));

describe('slots on the time ruler', () => {
  test('follow one another and leave what is over free', () => {
    const { placed, plannedMinutes, freeMinutes, overMinutes } = layOutSlots(slots(15, 20, 10), 60);
    expect(placed.map(({ from, to }) => [from, to])).toEqual([[0, 15], [15, 35], [35, 45]]);
    expect(placed.every(({ fits }) => fits)).toBe(true);
    expect({ plannedMinutes, freeMinutes, overMinutes }).toEqual({ plannedMinutes: 45, freeMinutes: 15, overMinutes: 0 });
  });

  test('fit when the last one ends with the meeting', () => {
    const { placed, freeMinutes, overMinutes } = layOutSlots(slots(30, 30), 60);
    expect(placed.map(({ fits }) => fits)).toEqual([true, true]);
    expect({ freeMinutes, overMinutes }).toEqual({ freeMinutes: 0, overMinutes: 0 });
  });

  test('stand below the line from the first that would end too late, a short one after it too', () => {
    const { placed, freeMinutes, overMinutes } = layOutSlots(slots(20, 20, 25, 5), 60);
    expect(placed.map(({ fits }) => fits)).toEqual([true, true, false, false]);
    expect(freeMinutes).toBe(20);
    expect(overMinutes).toBe(10);
  });

  test('stand all below the line when the first is longer than the meeting', () => {
    const { placed, freeMinutes } = layOutSlots(slots(61, 5), 60);
    expect(placed.map(({ fits }) => fits)).toEqual([false, false]);
    expect(freeMinutes).toBe(60);
  });

  test('are none on an empty agenda', () => {
    expect(layOutSlots([], 45)).toEqual({ placed: [], plannedMinutes: 0, freeMinutes: 45, overMinutes: 0 });
  });
});

describe('pixels for a minute', () => {
  test('give the shortest slot the height it needs', () => {
    expect(pixelsPerMinute(slots(10, 20), 60, 60)).toBe(6);
  });
  test('keep a long meeting within bounds though a slot is short', () => {
    expect(pixelsPerMinute(slots(1, 60), 480, 60) * 480).toBeLessThanOrEqual(2600);
  });
  test('never fall below what can be read', () => {
    expect(pixelsPerMinute([], 480, 44)).toBeGreaterThanOrEqual(4);
  });
});

describe('clock ticks', () => {
  test('stand at round times though the meeting starts at none', () => {
    const ticks = clockTicks('2026-12-09T07:32:00Z', 60, 6);
    expect(ticks[0]).toEqual({ minute: 3, isNamed: false });
    expect(ticks.filter(({ isNamed }) => isNamed).map(({ minute }) => minute)).toEqual([13, 28, 43]);
  });
  test('leave the times of start and end alone', () => {
    const named = clockTicks('2026-12-09T07:30:00Z', 60, 6).filter(({ isNamed }) => isNamed);
    expect(named.map(({ minute }) => minute)).toEqual([15, 30, 45]);
  });
});

describe('dragging', () => {
  const middles = [10, 30, 60];
  test('changes nothing until a neighbour’s middle is passed', () => {
    expect(indexAfterDrag(middles, 0, 29)).toBe(0);
    expect(indexAfterDrag(middles, 0, 31)).toBe(1);
  });
  test('goes past several at once, both ways', () => {
    expect(indexAfterDrag(middles, 0, 200)).toBe(2);
    expect(indexAfterDrag(middles, 2, -5)).toBe(0);
  });
  test('moves one entry and keeps the others’ order', () => {
    expect(moved(['a', 'b', 'c', 'd'], 0, 2)).toEqual(['b', 'c', 'a', 'd']);
    expect(moved(['a', 'b', 'c', 'd'], 3, 0)).toEqual(['d', 'a', 'b', 'c']);
    expect(moved(['a', 'b'], 1, 9)).toEqual(['a', 'b']);
  });
});
