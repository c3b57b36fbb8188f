import fc from 'fast-check';
import { calculateCupEllipse } from './cup-ellipse.js';
import type { CupEllipseInput } from './cup-ellipse.js';
import { axisFromAngles } from './cup-axis.js';

// Source: arcsine of short over long axis (Lewinnek 1978, formula from memory); numbers computed
// with independent code (Python).
test.each([
  [50, 10, 11.537],
  [54, 14, 15.026],
  [48, 24, 30],
  [60, 5.2, 4.972],
  [50, 0, 0],
  [50, 50, 90],
])('axes %d and %d give %d degrees', (majorPx, minorPx, expected) => {
  expect(calculateCupEllipse({ majorPx, minorPx }).anteversionDeg).toBeCloseTo(expected, 3);
});

test('agrees with the ellipse that a circle of that version projects to', () => {
  // Orthographic projection of a circle along the anterior axis: short over long = |axis · anterior|.
  fc.assert(
    fc.property(fc.double({ min: 0, max: 89, noNaN: true }), fc.double({ min: 1, max: 89, noNaN: true }), (version, inclination) => {
      const { y } = axisFromAngles('radiographic', { inclinationDeg: inclination, anteversionDeg: version });
      expect(calculateCupEllipse({ majorPx: 1000, minorPx: 1000 * Math.abs(y) }).anteversionDeg).toBeCloseTo(version, 6);
    }),
  );
});

test('says that the sign is not known', () => {
  expect(calculateCupEllipse({ majorPx: 50, minorPx: 10 }).cautions.join(' ')).toContain('sign is not known');
});

test.each([
  [{ majorPx: 50, minorPx: 50.1 }, 'minorPx', 'longer-than-major'],
  [{ majorPx: 0, minorPx: 0 }, 'majorPx', 'range'],
  [{ majorPx: 50, minorPx: -1 }, 'minorPx', 'range'],
  [{ majorPx: null, minorPx: 1 }, 'majorPx', 'required'],
  [{ majorPx: Number.NaN, minorPx: 1 }, 'majorPx', 'type'],
])('refuses %j', (input, field, code) => {
  expect(() => calculateCupEllipse(input as CupEllipseInput)).toThrow(expect.objectContaining({ field, code }));
});
