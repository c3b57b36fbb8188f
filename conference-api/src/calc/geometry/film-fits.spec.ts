import * as fc from 'fast-check';
import { CalcInputError } from '../common/calc-input-error.js';
import { fitCircle } from './circle-fit.js';
import { fitEllipse } from './ellipse-fit.js';

const onEllipse = (cx: number, cy: number, major: number, minor: number, angleDeg: number, turns: number[]) =>
  turns.map((turn) => {
    const [u, v] = [(major / 2) * Math.cos(turn), (minor / 2) * Math.sin(turn)];
    const angle = (angleDeg * Math.PI) / 180;
    return { x: cx + u * Math.cos(angle) - v * Math.sin(angle), y: cy + u * Math.sin(angle) + v * Math.cos(angle) };
  });

describe('fitting a circle', () => {
  // elementary geometry: the circle through (0,0), (6,0), (0,8) has its centre at (3,4) and the radius 5
  it('goes through three points', () => {
    const { centre, radius, residual } = fitCircle([{ x: 0, y: 0 }, { x: 6, y: 0 }, { x: 0, y: 8 }]);
    expect([centre.x, centre.y, radius, residual]).toEqual([expect.closeTo(3, 9), expect.closeTo(4, 9), expect.closeTo(5, 9), expect.closeTo(0, 9)]);
  });

  it('finds any circle again from points on an arc of it', () => {
    fc.assert(
      fc.property(fc.double({ min: -4000, max: 4000, noNaN: true }), fc.double({ min: -4000, max: 4000, noNaN: true }), fc.double({ min: 5, max: 900, noNaN: true }), (cx, cy, r) => {
        const found = fitCircle(onEllipse(cx, cy, 2 * r, 2 * r, 0, [0.2, 0.9, 1.7, 2.6, 3.3]));
        expect(found.radius).toBeCloseTo(r, 4);
        expect(found.centre.x).toBeCloseTo(cx, 4);
        expect(found.centre.y).toBeCloseTo(cy, 4);
      }),
    );
  });

  it('refuses points on a line, too few, and what is no number', () => {
    for (const points of [[{ x: 0, y: 0 }, { x: 1, y: 1 }, { x: 2, y: 2 }], [{ x: 0, y: 0 }, { x: 1, y: 0 }], [{ x: 5, y: 5 }, { x: 5, y: 5 }, { x: 5, y: 5 }], [{ x: NaN, y: 0 }, { x: 1, y: 0 }, { x: 0, y: 1 }]])
      expect(() => fitCircle(points)).toThrow(CalcInputError);
  });
});

describe('fitting an ellipse', () => {
  it('finds any ellipse again from points round it', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 3000, noNaN: true }),
        fc.double({ min: 0, max: 3000, noNaN: true }),
        fc.double({ min: 60, max: 800, noNaN: true }),
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        fc.double({ min: -89, max: 89, noNaN: true }),
        (cx, cy, major, ratio, angle) => {
          const found = fitEllipse(onEllipse(cx, cy, major, major * ratio, angle, [0.1, 0.9, 1.8, 2.7, 3.9, 4.6, 5.6]));
          expect(found.major).toBeCloseTo(major, 3);
          expect(found.minor).toBeCloseTo(major * ratio, 3);
          expect(Math.abs(Math.sin(((found.angleDeg - angle) * Math.PI) / 180))).toBeLessThan(1e-4);
        },
      ),
    );
  });

  it('refuses too few points and points on a line', () => {
    expect(() => fitEllipse([0, 1, 2, 3].map((x) => ({ x, y: x * x })))).toThrow(CalcInputError);
    expect(() => fitEllipse([0, 1, 2, 3, 4, 5].map((x) => ({ x, y: 2 * x })))).toThrow(CalcInputError);
  });
});
