import fc from 'fast-check';
import { krippendorffAlpha, type AlphaLevel } from './krippendorff-alpha.js';

/** Words of numbers or letters, `*` for a missing value; letters become 1, 2, 3 … */
const table = (...rows: string[]) =>
  rows.map((row) =>
    row.split(' ').map((cell) => {
      if (cell === '*') return null;
      return /\d/.test(cell) ? Number(cell) : cell.charCodeAt(0) - 96;
    }),
  );

const FOUR_OBSERVERS = table(
  '1 2 3 3 2 1 4 1 2 * * *',
  '1 2 3 3 2 2 4 1 2 5 * 3',
  '* 3 3 3 2 3 4 2 2 5 1 *',
  '1 2 3 3 2 4 4 1 2 5 1 *',
);
const THREE_CODERS = table(
  '* * * * * 3 4 1 2 1 1 3 3 * 3',
  '1 * 2 1 3 3 4 3 * * * * * * *',
  '* * 2 1 3 4 4 * 2 1 1 3 3 * 4',
);
const BINARY = table('0 1 0 0 0 0 0 0 1 0', '1 1 1 0 0 1 0 0 0 0');
const LETTERS = table('a a b b d c c c e d d a', 'b a b b b c c c e d d d');

describe('krippendorffAlpha', () => {
  // Krippendorff's four observers and twelve units. Nominal .743, ordinal .815 and ratio .797 in
  // the doctests of the fast-krippendorff package; more digits, and interval, by the formula in Python.
  test.each<[AlphaLevel, number]>([
    ['nominal', 0.743421],
    ['ordinal', 0.815388],
    ['interval', 0.849107],
    ['ratio', 0.797403],
  ])('four observers, %s', (level, value) => {
    expect(krippendorffAlpha({ level, data: FOUR_OBSERVERS }).value).toBeCloseTo(value, 6);
  });

  // Three coders and fifteen units: nominal .691 and interval .811 in Wikipedia's article and the
  // same doctests; ordinal and ratio by the formula in Python.
  test.each<[AlphaLevel, number]>([
    ['nominal', 0.691358],
    ['ordinal', 0.806721],
    ['interval', 0.810845],
    ['ratio', 0.808944],
  ])('three coders, %s', (level, value) => {
    expect(krippendorffAlpha({ level, data: THREE_CODERS }).value).toBeCloseTo(value, 6);
  });

  // Krippendorff, Computing Krippendorff's alpha-reliability: 0.095 and 0.692 (from memory);
  // digits by the formula in Python.
  test('two observers, binary and nominal', () => {
    expect(krippendorffAlpha({ level: 'nominal', data: BINARY }).value).toBeCloseTo(0.095238, 6);
    expect(krippendorffAlpha({ level: 'nominal', data: LETTERS }).value).toBeCloseTo(0.691964, 6);
  });

  test('agreement is 1 and a unit with one value changes nothing', () => {
    const data = table('1 2 3', '1 2 3');
    expect(krippendorffAlpha({ level: 'interval', data }).value).toBe(1);
    const withLone = FOUR_OBSERVERS.map((row, i) => [...row, i === 0 ? 5 : null]);
    const { value } = krippendorffAlpha({ level: 'ordinal', data: withLone });
    expect(value).toBe(krippendorffAlpha({ level: 'ordinal', data: FOUR_OBSERVERS }).value);
  });

  test.each([
    [table('3 3 3', '3 3 *'), 'identical'],
    [table('1 2 3'), 'No unit has two values'],
    [table('1 * 3', '* 2 *'), 'No unit has two values'],
    [[], 'No unit has two values'],
  ])('%j is undefined: %s', (data, reason) => {
    const { value, why } = krippendorffAlpha({ level: 'ordinal', data });
    expect(value).toBeNull();
    expect(why).toContain(reason);
  });

  test.each([
    ['nominal', [[1, 2], [1]], 'data[1]', 'shape'],
    ['nominal', [[1, 'x']], 'data[0][1]', 'type'],
    ['ratio', [[1, -2], [1, 2]], 'data[0][1]', 'range'],
    ['weekly', [[1, 2], [1, 2]], 'level', 'choice'],
    [null, [[1, 2], [1, 2]], 'level', 'required'],
    ['nominal', null, 'data', 'required'],
  ])('level %s with %j is refused at %s', (level, data, field, code) => {
    const body = { level: level as AlphaLevel, data: data as number[][] };
    expect(() => krippendorffAlpha(body)).toThrow(expect.objectContaining({ field, code }));
  });

  const cell = fc.option(fc.integer({ min: 1, max: 5 }), { nil: null });
  const data = fc.array(fc.array(cell, { minLength: 8, maxLength: 8 }), { minLength: 2, maxLength: 6 });

  test('permuting raters or units changes nothing', () => {
    fc.assert(
      fc.property(data, fc.constantFrom<AlphaLevel>('nominal', 'ordinal', 'interval', 'ratio'), (rows, level) => {
        const turned = [...rows].reverse().map((row) => [...row].reverse());
        const { value } = krippendorffAlpha({ level, data: rows });
        const other = krippendorffAlpha({ level, data: turned }).value;
        if (value === null) expect(other).toBeNull();
        else expect(other).toBeCloseTo(value, 10);
      }),
    );
  });

  // By definition interval alpha ignores shifts and ratio alpha ignores the unit of measurement.
  test('interval ignores a shift, ratio a factor, ordinal any rising change', () => {
    fc.assert(
      fc.property(data, (rows) => {
        const changed = (change: (value: number) => number) =>
          rows.map((row) => row.map((value) => (value === null ? null : change(value))));
        const same = (level: AlphaLevel, change: (value: number) => number) => {
          const { value } = krippendorffAlpha({ level, data: rows });
          const other = krippendorffAlpha({ level, data: changed(change) }).value;
          if (value === null) expect(other).toBeNull();
          else expect(other).toBeCloseTo(value, 10);
        };
        same('interval', (value) => 3 * value - 7);
        same('ratio', (value) => 2.5 * value);
        same('ordinal', (value) => value ** 3);
        same('nominal', (value) => (value * 2) % 5);
      }),
    );
  });
});
