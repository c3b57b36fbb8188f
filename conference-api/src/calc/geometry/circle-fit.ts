import { CalcInputError } from '../common/calc-input-error.js';
import { centroid, type FilmPoint, readPoints } from './film-points.js';

export interface FittedCircle {
  centre: FilmPoint;
  /** px */
  radius: number;
  /** Root mean square distance of the points from the circle, px. */
  residual: number;
}

const STEPS = 50;

/**
 * The circle through three points, or the one of least squared distances to more of them (px).
 * Begins with the algebraic fit of Kåsa and refines it by Gauss–Newton steps on the distances.
 * CalcInputError `points`: fewer than three, or all on one line.
 * Source: elementary geometry; Kåsa I. IEEE Trans Instrum Meas 1976;25:8 (from memory).
 */
export function fitCircle(points: readonly FilmPoint[]): FittedCircle {
  readPoints(points, 3, 'points');
  const middle = centroid(points);
  const spread = Math.max(...points.map((point) => Math.hypot(point.x - middle.x, point.y - middle.y)));
  if (spread === 0) throw onOneLine();
  // around the middle and in units of the spread, so that large pixel numbers lose no digits
  const local = points.map((point) => ({ x: (point.x - middle.x) / spread, y: (point.y - middle.y) / spread }));
  let { x, y, r } = algebraic(local);
  for (let step = 0; step < STEPS; step++) {
    const change = gaussNewton(local, x, y, r);
    x += change.x;
    y += change.y;
    r += change.r;
    if (Math.hypot(change.x, change.y, change.r) < 1e-12) break;
  }
  const squares = local.map((point) => (Math.hypot(point.x - x, point.y - y) - r) ** 2);
  return {
    centre: { x: middle.x + x * spread, y: middle.y + y * spread },
    radius: r * spread,
    residual: Math.sqrt(squares.reduce((a, b) => a + b, 0) / squares.length) * spread,
  };
}

function algebraic(points: readonly FilmPoint[]): { x: number; y: number; r: number } {
  const sum = (term: (point: FilmPoint) => number) => points.reduce((total, point) => total + term(point), 0);
  const [xx, xy, yy] = [sum(({ x }) => x * x), sum(({ x, y }) => x * y), sum(({ y }) => y * y)];
  const bx = sum(({ x, y }) => x * (x * x + y * y)) / 2;
  const by = sum(({ x, y }) => y * (x * x + y * y)) / 2;
  const determinant = xx * yy - xy * xy;
  if (determinant < 1e-9 * (xx + yy) ** 2) throw onOneLine();
  const x = (bx * yy - by * xy) / determinant;
  const y = (by * xx - bx * xy) / determinant;
  return { x, y, r: Math.sqrt(x * x + y * y + (xx + yy) / points.length) };
}

/** One step for x, y, r by the normal equations of the distances. */
function gaussNewton(points: readonly FilmPoint[], x: number, y: number, r: number): { x: number; y: number; r: number } {
  const rows = points.map((point) => {
    const d = Math.hypot(point.x - x, point.y - y) || 1e-12;
    return [(x - point.x) / d, (y - point.y) / d, -1, r - d] as const;
  });
  const at = (i: number, j: number) => rows.reduce((sum, row) => sum + row[i]! * row[j]!, 0);
  const m = [0, 1, 2].map((i) => [0, 1, 2, 3].map((j) => at(i, j)));
  const det = (a: number, b: number, c: number) =>
    m[0]![a]! * (m[1]![b]! * m[2]![c]! - m[1]![c]! * m[2]![b]!) - m[0]![b]! * (m[1]![a]! * m[2]![c]! - m[1]![c]! * m[2]![a]!) + m[0]![c]! * (m[1]![a]! * m[2]![b]! - m[1]![b]! * m[2]![a]!);
  const whole = det(0, 1, 2);
  if (Math.abs(whole) < 1e-14) return { x: 0, y: 0, r: 0 };
  return { x: det(3, 1, 2) / whole, y: det(0, 3, 2) / whole, r: det(0, 1, 3) / whole };
}

const onOneLine = () => new CalcInputError('points', 'on-one-line', 'The points lie on one line: set them round the edge.');
