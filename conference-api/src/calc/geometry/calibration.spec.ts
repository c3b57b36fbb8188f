import fc from 'fast-check';
import { calculateCalibration } from './calibration.js';
import type { CalibrationInput } from './calibration.js';

// Source: true over measured size of the prosthetic head; numbers worked by independent code
// (Python); 22.225 mm is 7/8 inch.
test.each([
  [32, 192, 0.166667, [270, 222], [45, 37]],
  [28, 175, 0.16, [240, 110, 130], [38.4, 17.6, 20.8]],
  [36, 216, 0.166667, [312, 252], [52, 42]],
  [28, 33.6, 0.833333, [10], [8.333]],
  [36, 42, 0.857143, [24], [20.571]],
  [22.225, 26.4, 0.841856, [50], [42.093]],
])('%d mm on %d px', (trueMm, measuredPx, mmPerPx, lengthsPx, lengthsMm) => {
  const result = calculateCalibration({ trueMm, measuredPx, lengthsPx });
  expect(result.mmPerPx).toBeCloseTo(mmPerPx, 6);
  expect(result.lengthsMm).toHaveLength(lengthsMm.length);
  result.lengthsMm.forEach((length, i) => expect(length).toBeCloseTo(lengthsMm[i]!, 3));
});

test('lengths keep their ratio, and the object measured has its true size', () => {
  const size = fc.double({ min: 1, max: 500, noNaN: true });
  fc.assert(
    fc.property(size, size, size, (trueMm, measuredPx, length) => {
      const { lengthsMm } = calculateCalibration({ trueMm, measuredPx, lengthsPx: [measuredPx, length, 2 * length] });
      expect(lengthsMm[0]).toBeCloseTo(trueMm, 9);
      expect(lengthsMm[2]! / lengthsMm[1]!).toBeCloseTo(2, 9);
    }),
  );
});

test('no lengths is an empty list', () => {
  expect(calculateCalibration({ trueMm: 28, measuredPx: 100, lengthsPx: null }).lengthsMm).toEqual([]);
});

test.each([
  [{ trueMm: 0 }, 'trueMm', 'range'],
  [{ trueMm: -28 }, 'trueMm', 'range'],
  [{ measuredPx: 0 }, 'measuredPx', 'range'],
  [{ measuredPx: null }, 'measuredPx', 'required'],
  [{ lengthsPx: [10, -1] }, 'lengthsPx', 'range'],
  [{ lengthsPx: ['10'] }, 'lengthsPx', 'type'],
  [{ lengthsPx: [null] }, 'lengthsPx', 'required'],
  [{ lengthsPx: 10 }, 'lengthsPx', 'type'],
  [{ lengthsPx: new Array(1001).fill(1) }, 'lengthsPx', 'too-many'],
])('refuses bad input %#', (change, field, code) => {
  const body = { trueMm: 28, measuredPx: 175, lengthsPx: [1], ...change } as CalibrationInput;
  expect(() => calculateCalibration(body)).toThrow(expect.objectContaining({ field, code }));
});
