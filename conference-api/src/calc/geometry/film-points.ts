import { CalcInputError } from '../common/calc-input-error.js';

/** A place on an image, in pixels: x to the viewer's right, y down. */
export interface FilmPoint {
  x: number;
  y: number;
}

/** The points, if they are numbers and enough of them; CalcInputError for the field otherwise. */
export function readPoints(points: readonly FilmPoint[], least: number, field: string): readonly FilmPoint[] {
  if (!Array.isArray(points) || points.length < least) throw new CalcInputError(field, 'too-few', `Set at least ${least} points.`);
  points.forEach(({ x, y }, index) => {
    if (!Number.isFinite(x) || !Number.isFinite(y)) throw new CalcInputError(`${field}[${index}]`, 'type', 'A point has two finite numbers.');
  });
  return points;
}

export const distance = (a: FilmPoint, b: FilmPoint) => Math.hypot(a.x - b.x, a.y - b.y);

export const centroid = (points: readonly FilmPoint[]): FilmPoint => ({
  x: points.reduce((sum, point) => sum + point.x, 0) / points.length,
  y: points.reduce((sum, point) => sum + point.y, 0) / points.length,
});
