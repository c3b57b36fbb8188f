import fc from 'fast-check';
import { calculateRemovalGeometry } from './removal-geometry.js';
import type { RemovalGeometryInput } from './removal-geometry.js';

// Source: volume between two hemispheres (elementary geometry), tabulated with independent code (Python).
test.each([
  [50, [4.086, 8.499, 13.251, 18.355, 23.824]],
  [54, [4.752, 9.856, 15.325, 21.17, 27.405]],
  [58, [5.468, 11.314, 17.549, 24.186, 31.238]],
])('shell of %d mm, kerf of 1 to 5 mm', (shellOuterMm, volumes) => {
  volumes.forEach((expected, i) => {
    const { boneCm3, radialMm } = calculateRemovalGeometry({ shellOuterMm, bladeKerfMm: i + 1 });
    expect(boneCm3).toBeCloseTo(expected, 3);
    expect(radialMm).toBe(i + 1);
  });
});

test.each([
  [54, 56, 1, 4.752],
  [54, 58, 2, 9.856],
  [54, 60, 3, 15.325],
  [50, 54, 2, 8.499],
  [58, 62, 2, 11.314],
  [54, 54, 0, 0],
])('from %d to %d mm', (shellOuterMm, nextShellMm, radialMm, expected) => {
  const result = calculateRemovalGeometry({ shellOuterMm, nextShellMm });
  expect(result.radialMm).toBe(radialMm);
  expect(result.boneCm3).toBeCloseTo(expected, 3);
});

test('a shell that subtends 165 degrees', () => {
  // Share 1 − cos 82.5° = 0.86947 of the hemisphere.
  expect(calculateRemovalGeometry({ shellOuterMm: 54, bladeKerfMm: 2, subtendedDeg: 165 }).boneCm3).toBeCloseTo(8.57, 3);
});

describe('properties', () => {
  const shell = fc.double({ min: 30, max: 80, noNaN: true });
  const kerf = fc.double({ min: 0.1, max: 10, noNaN: true });

  test('more than the thin layer 2πr²t, and nearly it when thin', () => {
    fc.assert(
      fc.property(shell, kerf, (shellOuterMm, bladeKerfMm) => {
        const thin = (2 * Math.PI * (shellOuterMm / 2) ** 2 * bladeKerfMm) / 1000;
        expect(calculateRemovalGeometry({ shellOuterMm, bladeKerfMm }).boneCm3).toBeGreaterThan(thin);
      }),
    );
    const { boneCm3 } = calculateRemovalGeometry({ shellOuterMm: 54, bladeKerfMm: 0.001 });
    expect(boneCm3 / ((2 * Math.PI * 27 ** 2 * 0.001) / 1000)).toBeCloseTo(1, 3);
  });

  test('grows with the kerf, the shell and the angle', () => {
    fc.assert(
      fc.property(shell, kerf, fc.double({ min: 10, max: 170, noNaN: true }), (shellOuterMm, bladeKerfMm, subtendedDeg) => {
        const volume = (input: Partial<RemovalGeometryInput>) =>
          calculateRemovalGeometry({ shellOuterMm, bladeKerfMm, subtendedDeg, ...input }).boneCm3;
        const base = volume({});
        expect(volume({ bladeKerfMm: bladeKerfMm + 1 })).toBeGreaterThan(base);
        expect(volume({ shellOuterMm: shellOuterMm + 1 })).toBeGreaterThan(base);
        expect(volume({ subtendedDeg: subtendedDeg + 1 })).toBeGreaterThan(base);
      }),
    );
  });

  test('a kerf and the next shell that is twice the kerf larger cost the same', () => {
    fc.assert(
      fc.property(shell, kerf, (shellOuterMm, bladeKerfMm) => {
        const byKerf = calculateRemovalGeometry({ shellOuterMm, bladeKerfMm }).boneCm3;
        const bySize = calculateRemovalGeometry({ shellOuterMm, nextShellMm: shellOuterMm + 2 * bladeKerfMm }).boneCm3;
        expect(bySize).toBeCloseTo(byKerf, 9);
      }),
    );
  });
});

test.each([
  [{ bladeKerfMm: 2, nextShellMm: 58 }, 'nextShellMm', 'exactly-one'],
  [{}, 'bladeKerfMm', 'exactly-one'],
  [{ nextShellMm: 53.9 }, 'nextShellMm', 'smaller-than-shell'],
  [{ bladeKerfMm: -1 }, 'bladeKerfMm', 'range'],
  [{ bladeKerfMm: 2, subtendedDeg: 0 }, 'subtendedDeg', 'range'],
  [{ bladeKerfMm: 2, subtendedDeg: 180.1 }, 'subtendedDeg', 'range'],
  [{ bladeKerfMm: 2, shellOuterMm: 0 }, 'shellOuterMm', 'range'],
  [{ bladeKerfMm: 2, shellOuterMm: null }, 'shellOuterMm', 'required'],
])('refuses %j', (change, field, code) => {
  const body = { shellOuterMm: 54, ...change } as RemovalGeometryInput;
  expect(() => calculateRemovalGeometry(body)).toThrow(expect.objectContaining({ field, code }));
});

test('calls itself a lower bound', () => {
  expect(calculateRemovalGeometry({ shellOuterMm: 54, bladeKerfMm: 2 }).cautions.join(' ')).toContain('lower bound');
});
