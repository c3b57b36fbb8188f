import fc from 'fast-check';
import { CalcInputError } from '../common/calc-input-error.js';
import { calculateCupOrientation } from './cup-orientation.js';
import type { CupAngles, CupOrientationInput, OrientationDefinition } from './cup-orientation.js';

const convert = (from: OrientationDefinition, inclinationDeg: number, anteversionDeg: number, pelvicTiltDeg?: number) =>
  calculateCupOrientation({ from, inclinationDeg, anteversionDeg, pelvicTiltDeg });

function expectAngles(actual: CupAngles, [inclination, version]: readonly [number, number], digits = 3) {
  expect(actual.inclinationDeg).toBeCloseTo(inclination, digits);
  expect(actual.anteversionDeg).toBeCloseTo(version, digits);
}

describe('three definitions of cup orientation', () => {
  // Source: definitions of Murray, J Bone Joint Surg Br 1993;75-B:228. Numbers computed with
  // independent code (Python, vectors) from those definitions, to three decimals.
  test.each([
    ['radiographic', 40, 15, [40, 15], [38.381, 19.279], [42.274, 22.629]],
    ['radiographic', 45, 20, [45, 20], [41.641, 27.236], [48.359, 27.236]],
    ['radiographic', 30, 5, [30, 5], [29.874, 5.769], [30.376, 9.925]],
    ['radiographic', 50, -10, [50, -10], [48.974, -15.34], [50.727, -12.962]],
    ['operative', 40, 20, [41.763, 15.189], [40, 20], [43.958, 22.176]],
    ['anatomical', 45, 20, [43.219, 13.995], [41.641, 18.882], [45, 20]],
  ] as const)('from %s %d/%d', (from, inclination, version, radiographic, operative, anatomical) => {
    const result = convert(from, inclination, version);
    expectAngles(result.radiographic, radiographic);
    expectAngles(result.operative, operative);
    expectAngles(result.anatomical, anatomical);
  });

  // Source: rotation of the axis about the transverse axis, computed with independent code (Python).
  test.each([
    [10, [42.241, 22.543]],
    [-10, [38.749, 7.261]],
    [0, [40, 15]],
  ] as const)('40/15 with %d degrees of posterior tilt', (tilt, expected) => {
    expectAngles(convert('radiographic', 40, 15, tilt).radiographic, expected);
  });

  // Source: Lewinnek and others, J Bone Joint Surg Am 1978;60:217: 40±10 and 15±10, edges inside.
  test.each([
    [40, 15, true, true],
    [50, 25, true, true],
    [30, 5, true, true],
    [50.1, 15, false, true],
    [29.9, 15, false, true],
    [40, 4.9, true, false],
    [40, 25.1, true, false],
    [40, -15, true, false],
  ])('zone for %d/%d', (inclinationDeg, anteversionDeg, inclination, anteversion) => {
    expect(convert('radiographic', inclinationDeg, anteversionDeg).safeZone).toEqual({ inclination, anteversion });
  });

  test('the zone is judged on radiographic angles, after tilt', () => {
    expect(convert('operative', 40, 27).safeZone.anteversion).toBe(true);
    expect(convert('radiographic', 40, 22, 10).safeZone.anteversion).toBe(false);
  });

  test('an edge of the zone stays inside after converting to and fro', () => {
    const { operative, anatomical } = convert('radiographic', 50, 25);
    for (const [from, angles] of [['operative', operative], ['anatomical', anatomical]] as const) {
      const back = convert(from, angles.inclinationDeg, angles.anteversionDeg);
      expect(back.safeZone).toEqual({ inclination: true, anteversion: true });
    }
  });

  test('names the source and cautions that the zone does not protect', () => {
    const { definition, cautions } = convert('radiographic', 40, 15);
    expect(definition).toContain('1993;75-B:228');
    // Abdel and others, Clin Orthop Relat Res 2016;474:386: 120 of 206 dislocations inside.
    expect(cautions.join(' ')).toContain('58 %');
  });

  test.each([
    [{ from: 'surgical' }, 'from', 'choice'],
    [{ inclinationDeg: -0.1 }, 'inclinationDeg', 'range'],
    [{ inclinationDeg: 90.1 }, 'inclinationDeg', 'range'],
    [{ inclinationDeg: null }, 'inclinationDeg', 'required'],
    [{ anteversionDeg: 90 }, 'anteversionDeg', 'range'],
    [{ anteversionDeg: -90 }, 'anteversionDeg', 'range'],
    [{ anteversionDeg: '15' }, 'anteversionDeg', 'type'],
    [{ pelvicTiltDeg: 46 }, 'pelvicTiltDeg', 'range'],
  ])('refuses %j', (change, field, code) => {
    const body = { from: 'radiographic', inclinationDeg: 40, anteversionDeg: 15, ...change } as CupOrientationInput;
    expect(() => calculateCupOrientation(body)).toThrow(CalcInputError);
    expect(() => calculateCupOrientation(body)).toThrow(expect.objectContaining({ field, code }));
  });
});

describe('properties that follow from the definitions', () => {
  const inclinations = fc.double({ min: 0.5, max: 89.5, noNaN: true });
  const versions = fc.double({ min: -85, max: 85, noNaN: true });
  const definitions = fc.constantFrom<OrientationDefinition>('radiographic', 'operative', 'anatomical');

  test('round trips between any two definitions', () => {
    fc.assert(
      fc.property(definitions, definitions, inclinations, versions, (from, via, inclination, version) => {
        const there = convert(from, inclination, version)[via];
        fc.pre(Math.abs(there.anteversionDeg) < 89.9);
        const back = convert(via, there.inclinationDeg, there.anteversionDeg)[from];
        expectAngles(back, [inclination, version], 6);
      }),
    );
  });

  test('no version: all inclinations are equal and all versions nought', () => {
    fc.assert(
      fc.property(definitions, fc.double({ min: 0, max: 90, noNaN: true }), (from, inclination) => {
        const { radiographic, operative, anatomical } = convert(from, inclination, 0);
        for (const angles of [radiographic, operative, anatomical]) expectAngles(angles, [inclination, 0], 9);
      }),
    );
  });

  test('OI ≤ RI ≤ AI, and radiographic version is the smallest', () => {
    fc.assert(
      fc.property(inclinations, fc.double({ min: 0.1, max: 85, noNaN: true }), (inclination, version) => {
        const { radiographic, operative, anatomical } = convert('radiographic', inclination, version);
        expect(operative.inclinationDeg).toBeLessThanOrEqual(radiographic.inclinationDeg + 1e-9);
        expect(radiographic.inclinationDeg).toBeLessThanOrEqual(anatomical.inclinationDeg + 1e-9);
        expect(radiographic.anteversionDeg).toBeLessThanOrEqual(operative.anteversionDeg + 1e-9);
        expect(radiographic.anteversionDeg).toBeLessThanOrEqual(anatomical.anteversionDeg + 1e-9);
      }),
    );
  });

  test('mirror: opposite version gives the same inclinations and opposite versions', () => {
    fc.assert(
      fc.property(inclinations, versions, (inclination, version) => {
        const one = convert('radiographic', inclination, version).operative;
        const other = convert('radiographic', inclination, -version).operative;
        expectAngles(other, [one.inclinationDeg, -one.anteversionDeg], 9);
      }),
    );
  });

  test('more posterior tilt gives more anteversion, and tilt there and back is nothing', () => {
    fc.assert(
      fc.property(fc.double({ min: 20, max: 60, noNaN: true }), fc.double({ min: -20, max: 30, noNaN: true }), fc.double({ min: 0.5, max: 20, noNaN: true }), (inclination, version, tilt) => {
        const level = convert('radiographic', inclination, version).radiographic;
        const tilted = convert('radiographic', inclination, version, tilt).radiographic;
        expect(tilted.anteversionDeg).toBeGreaterThan(level.anteversionDeg);
        const back = convert('radiographic', tilted.inclinationDeg, tilted.anteversionDeg, -tilt).radiographic;
        expectAngles(back, [inclination, version], 6);
      }),
    );
  });

  test.each([[0, 0], [90, 0], [0, 40], [90, 40], [0, -40]])('stays finite at the limit %d/%d', (inclination, version) => {
    const { radiographic, operative, anatomical } = convert('radiographic', inclination, version);
    for (const angles of [radiographic, operative, anatomical]) {
      expect(Number.isFinite(angles.inclinationDeg) && Number.isFinite(angles.anteversionDeg)).toBe(true);
    }
  });
});
