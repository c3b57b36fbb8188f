import { CalcInputError } from '../common/calc-input-error.js';
import { angleAt, hipCentre, inclination, legLengthDifference, lengthOf, migration, placementError, versionFromRim } from './film-measures.js';
import type { FilmPoint } from './film-points.js';
import { scaleFromCircle, scaleFromSpacing } from './film-scale.js';

const LINE: [FilmPoint, FilmPoint] = [
  { x: 500, y: 800 },
  { x: 900, y: 800 },
];
const turned = (point: FilmPoint, degrees: number): FilmPoint => {
  const angle = (degrees * Math.PI) / 180;
  return { x: point.x * Math.cos(angle) - point.y * Math.sin(angle), y: point.x * Math.sin(angle) + point.y * Math.cos(angle) };
};

describe('scale', () => {
  // elementary proportion: a 32 mm head of 192 px gives 0.166667 mm a pixel; 28 mm of 33.6 is magnified 1.2 times
  it('comes from a head of known size', () => {
    expect(scaleFromCircle(32, 192).mmPerPx).toBeCloseTo(0.166667, 6);
    expect(lengthOf([{ x: 0, y: 0 }, { x: 0, y: 270 }], scaleFromCircle(32, 192).mmPerPx).value).toBeCloseTo(45, 9);
    expect(lengthOf([{ x: 0, y: 0 }, { x: 50, y: 0 }], scaleFromCircle(22.225, 26.4).mmPerPx).value).toBeCloseTo(42.093, 3);
  });
  it.each([
    ['a pixel of nothing', () => scaleFromSpacing(0)],
    ['a head of 3 mm', () => scaleFromCircle(3, 100)],
    ['a circle of 2 px', () => scaleFromCircle(32, 2)],
    ['no number', () => scaleFromSpacing(NaN)],
  ])('refuses %s', (_, make) => expect(make).toThrow(CalcInputError));
});

describe('guided measures', () => {
  it('reads inclination against the line, however the film is turned', () => {
    for (const by of [0, 7, -12])
      for (const degrees of [30, 45, 62]) {
        const angle = (degrees * Math.PI) / 180;
        const rim: [FilmPoint, FilmPoint] = [{ x: 900, y: 600 }, { x: 900 + 300 * Math.cos(angle), y: 600 - 300 * Math.sin(angle) }];
        const points = [...rim, ...LINE].map((point) => turned(point, by)) as [FilmPoint, FilmPoint, FilmPoint, FilmPoint];
        expect(inclination([points[0], points[1]], [points[2], points[3]]).value).toBeCloseTo(degrees, 9);
      }
  });

  // arcsin(24/48) is 30 degrees; 14/54 gives 15.026
  it.each([[48, 24, 30], [54, 14, 15.026], [50, 10, 11.537]])('reads version from an ellipse of %d by %d', (major, minor, expected) => {
    const rim = [0.2, 1.1, 1.9, 2.8, 3.6, 4.7, 5.5].map((turn) => turned({ x: 10 * major * Math.cos(turn), y: 10 * minor * Math.sin(turn) }, 40));
    expect(versionFromRim(rim).value).toBeCloseTo(expected, 3);
  });

  // a 28 mm head of 175 px; centres 240 and 110 px above the line: 38.4 and 17.6 mm, 20.8 mm between them (elementary proportion)
  it('reads heights, and the way between two dates', () => {
    const { mmPerPx } = scaleFromCircle(28, 175);
    const after = hipCentre({ x: 1000, y: 560 }, LINE, mmPerPx);
    const before = hipCentre({ x: 1000, y: 690 }, LINE, mmPerPx);
    expect([after.height.value, before.height.value]).toEqual([expect.closeTo(38.4, 9), expect.closeTo(17.6, 9)]);
    expect(migration(before, after)).toMatchObject({ upMm: expect.closeTo(20.8, 9), outMm: expect.closeTo(0, 9) });
    expect(after.offset.value).toBeCloseTo(16, 9);
    expect(hipCentre({ x: 400, y: 560 }, LINE, mmPerPx).offset.value).toBeCloseTo(16, 9);
    // 6 to the side and 18 up are 18.974 in all (Pythagoras)
    const moved = { height: { value: 18, unit: 'mm', error: 0 }, offset: { value: 6, unit: 'mm', error: 0 } } as const;
    const still = { height: { value: 0, unit: 'mm', error: 0 }, offset: { value: 0, unit: 'mm', error: 0 } } as const;
    expect(migration(still, moved).resultantMm).toBeCloseTo(18.974, 3);
  });

  // a 36 mm head of 216 px; trochanters 312 and 252 px below the line: 52 and 42 mm, 10 mm longer (elementary proportion)
  it('reads leg length with its sign', () => {
    const { mmPerPx } = scaleFromCircle(36, 216);
    const [long, short] = [{ x: 300, y: 1112 }, { x: 1100, y: 1052 }];
    expect(legLengthDifference(long, short, LINE, mmPerPx).value).toBeCloseTo(10, 9);
    expect(legLengthDifference(short, long, [LINE[1], LINE[0]], mmPerPx).value).toBeCloseTo(-10, 9);
  });

  it('reads a right angle', () => {
    expect(angleAt([{ x: 0, y: 10 }, { x: 0, y: 0 }, { x: 10, y: 0 }]).value).toBeCloseTo(90, 9);
  });

  it('says what two pixels of misplacing would change', () => {
    // both ends of a length off by 2 px along it: root of 2² + 2²
    expect(placementError(([a, b]) => b!.x - a!.x, [{ x: 0, y: 0 }, { x: 100, y: 0 }])).toBeCloseTo(Math.hypot(2, 2), 9);
    const near = inclination([{ x: 0, y: 0 }, { x: 30, y: 30 }], LINE).error;
    const far = inclination([{ x: 0, y: 0 }, { x: 300, y: 300 }], LINE).error;
    expect(far).toBeLessThan(near);
  });

  it('refuses teardrops that lie on one another', () => {
    expect(() => hipCentre({ x: 0, y: 0 }, [LINE[0], LINE[0]], 1)).toThrow(CalcInputError);
  });
});
