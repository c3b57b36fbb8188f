import type { RimSector } from '@kerfside/calc/vocabulary/case-content.js';
import { anteriorHour, hourAfter, placeOf, pointAt, quadrantOf } from './rim-geometry';
import { orderRound, ordinal, toggleOrder, withSector } from './rim-order';

const orders = (sectors: RimSector[]) => sectors.map(({ hour, order }) => [hour, order ?? null]);

describe('the cutting order', () => {
  it('gives each hour the next place', () => {
    const two = toggleOrder(toggleOrder([], 11), 2);
    expect(orders(two)).toEqual([
      [2, 2],
      [11, 1],
    ]);
  });

  it('closes up when an hour is taken out, and keeps what else was said of it', () => {
    const start: RimSector[] = [
      { hour: 1, order: 1 },
      { hour: 2, order: 2, state: 'fixed', note: 'spur' },
      { hour: 3, order: 3 },
    ];
    expect(toggleOrder(start, 2)).toEqual([
      { hour: 1, order: 1 },
      { hour: 2, order: null, state: 'fixed', note: 'spur' },
      { hour: 3, order: 2 },
    ]);
  });

  it('goes round from an hour in either direction, past hours that have a place', () => {
    const clockwise = orderRound([{ hour: 2, order: 1 }], 1, 'clockwise');
    expect(clockwise.find(({ hour }) => hour === 3)?.order).toBe(3);
    expect(clockwise.find(({ hour }) => hour === 12)?.order).toBe(12);
    const back = orderRound([], 1, 'anticlockwise');
    expect([1, 12, 2].map((hour) => back.find((sector) => sector.hour === hour)?.order)).toEqual([1, 2, 12]);
  });

  it('drops a sector that says nothing more', () => {
    expect(withSector([{ hour: 5, state: 'slow' }], 5, { state: null })).toEqual([]);
  });

  it.each([
    [1, '1st'],
    [2, '2nd'],
    [3, '3rd'],
    [4, '4th'],
    [11, '11th'],
    [12, '12th'],
  ])('words place %i as %s', (place, words) => expect(ordinal(place)).toBe(words));
});

// Facing a right hip from the patient's side, the patient's front is on the viewer's right: plain anatomy, no source needed.
describe('the clock by anatomy', () => {
  it('has anterior at 3 of a right hip and at 9 of a left one', () => {
    expect([anteriorHour('right'), anteriorHour('left')]).toEqual([3, 9]);
    expect([placeOf(3, 'right'), placeOf(9, 'right'), placeOf(3, 'left'), placeOf(9, 'left')]).toEqual(['anterior', 'posterior', 'posterior', 'anterior']);
  });

  it('mirrors the quadrants', () => {
    expect([1, 2, 4, 5, 7, 8, 10, 11].map((hour) => quadrantOf(hour, 'right'))).toEqual([
      'anterosuperior',
      'anterosuperior',
      'anteroinferior',
      'anteroinferior',
      'posteroinferior',
      'posteroinferior',
      'posterosuperior',
      'posterosuperior',
    ]);
    expect([1, 4, 7, 10].map((hour) => quadrantOf(hour, 'left'))).toEqual(['posterosuperior', 'posteroinferior', 'anteroinferior', 'anterosuperior']);
    expect([12, 3, 6, 9].map((hour) => quadrantOf(hour, 'left'))).toEqual([null, null, null, null]);
  });

  it('tells no anterior or posterior without a side', () => {
    expect([placeOf(12, null), placeOf(3, null), placeOf(6, null)]).toEqual(['superior', null, 'inferior']);
  });

  it('draws 12 on top, 3 on the right of the drawing, and goes round', () => {
    expect([pointAt(12, 10), pointAt(3, 10), pointAt(6, 10), pointAt(9, 10)]).toEqual([
      { x: 0, y: -10 },
      { x: 10, y: 0 },
      { x: 0, y: 10 },
      { x: -10, y: 0 },
    ]);
    expect([hourAfter(12, 1), hourAfter(1, -1), hourAfter(6, 13)]).toEqual([1, 12, 7]);
  });
});
