import { CalcInputError } from '../common/calc-input-error.js';
import { centroid, type FilmPoint, readPoints } from './film-points.js';

export interface FittedEllipse {
  centre: FilmPoint;
  /** Full lengths of the axes, px. */
  major: number;
  minor: number;
  /** Direction of the major axis from the image's x axis, degrees, over −90 to 90; y points down. */
  angleDeg: number;
}

type Triple = [number, number, number];

/**
 * The ellipse of least squared algebraic distances to five or more points (px).
 * CalcInputError `points`: fewer than five, or no ellipse goes near them.
 * Source: direct fit of Fitzgibbon, in the numerically stable form of Halíř and Flusser (WSCG 1998), from memory;
 * checked against points of known ellipses.
 */
export function fitEllipse(points: readonly FilmPoint[]): FittedEllipse {
  readPoints(points, 5, 'points');
  const middle = centroid(points);
  const spread = Math.max(...points.map((point) => Math.hypot(point.x - middle.x, point.y - middle.y)));
  if (spread === 0) throw noEllipse();
  const conic = directFit(points.map((point) => ({ x: (point.x - middle.x) / spread, y: (point.y - middle.y) / spread })));
  const local = fromConic(conic);
  return {
    centre: { x: middle.x + local.centre.x * spread, y: middle.y + local.centre.y * spread },
    major: local.major * spread,
    minor: local.minor * spread,
    angleDeg: local.angleDeg,
  };
}

/** a x² + b xy + c y² + d x + e y + f = 0 with 4ac − b² > 0. */
function directFit(points: readonly FilmPoint[]): number[] {
  const quadratic = points.map(({ x, y }): Triple => [x * x, x * y, y * y]);
  const linear = points.map(({ x, y }): Triple => [x, y, 1]);
  const scatter = (left: Triple[], right: Triple[]) => [0, 1, 2].map((i) => [0, 1, 2].map((j) => left.reduce((sum, row, k) => sum + row[i]! * right[k]![j]!, 0)));
  const s2 = scatter(quadratic, linear);
  const inverse = invert(scatter(linear, linear));
  const t = [0, 1, 2].map((i) => [0, 1, 2].map((j) => -[0, 1, 2].reduce((sum, k) => sum + inverse[i]![k]! * s2[j]![k]!, 0)));
  const m = scatter(quadratic, quadratic).map((row, i) => row.map((value, j) => value + [0, 1, 2].reduce((sum, k) => sum + s2[i]![k]! * t[k]![j]!, 0)));
  const reduced = [m[2]!.map((value) => value / 2), m[1]!.map((value) => -value), m[0]!.map((value) => value / 2)];
  const first = eigenvalues(reduced)
    .map((value) => eigenvector(reduced, value))
    .find(([a, b, c]) => 4 * a * c - b * b > 1e-12);
  if (!first) throw noEllipse();
  return [...first, ...t.map((row) => row.reduce((sum, value, k) => sum + value * first[k]!, 0))];
}

function fromConic([a, b, c, d, e, f]: number[]): FittedEllipse {
  const discriminant = 4 * a! * c! - b! * b!;
  const x = (b! * e! - 2 * c! * d!) / discriminant;
  const y = (b! * d! - 2 * a! * e!) / discriminant;
  const constant = f! + (d! * x + e! * y) / 2;
  const root = Math.hypot(a! - c!, b!);
  // the sign of the conic is free: both squares are positive for a real ellipse
  const squares = [(-2 * constant) / (a! + c! + root), (-2 * constant) / (a! + c! - root)];
  if (!squares.every((square) => square > 0 && Number.isFinite(square))) throw noEllipse();
  const axes = squares.map((square) => 2 * Math.sqrt(square));
  // the eigenvector of the smaller curvature is the long axis
  const alongDeg = (Math.atan2(b!, a! - c!) * 90) / Math.PI + (axes[0]! < axes[1]! ? 90 : 0);
  const angleDeg = ((((alongDeg + 90) % 180) + 180) % 180) - 90;
  return { centre: { x, y }, major: Math.max(...axes), minor: Math.min(...axes), angleDeg };
}

function invert(m: number[][]): number[][] {
  const cofactor = (i: number, j: number) => {
    const [r1, r2] = [0, 1, 2].filter((row) => row !== i) as [number, number];
    const [c1, c2] = [0, 1, 2].filter((column) => column !== j) as [number, number];
    return (m[r1]![c1]! * m[r2]![c2]! - m[r1]![c2]! * m[r2]![c1]!) * ((i + j) % 2 ? -1 : 1);
  };
  const determinant = [0, 1, 2].reduce((sum, j) => sum + m[0]![j]! * cofactor(0, j), 0);
  if (Math.abs(determinant) < 1e-12) throw noEllipse();
  return [0, 1, 2].map((i) => [0, 1, 2].map((j) => cofactor(j, i) / determinant));
}

/** Real roots of the characteristic polynomial of a 3 × 3 matrix. */
function eigenvalues(m: number[][]): number[] {
  const trace = m[0]![0]! + m[1]![1]! + m[2]![2]!;
  const minor = (i: number, j: number) => m[i]![i]! * m[j]![j]! - m[i]![j]! * m[j]![i]!;
  const minors = minor(0, 1) + minor(0, 2) + minor(1, 2);
  const determinant =
    m[0]![0]! * minor(1, 2) - m[0]![1]! * (m[1]![0]! * m[2]![2]! - m[1]![2]! * m[2]![0]!) + m[0]![2]! * (m[1]![0]! * m[2]![1]! - m[1]![1]! * m[2]![0]!);
  const shift = trace / 3;
  const p = minors - (trace * trace) / 3;
  const q = -determinant + (trace * minors) / 3 - (2 * trace ** 3) / 27;
  const inner = (q / 2) ** 2 + (p / 3) ** 3;
  if (inner > 0) return [Math.cbrt(-q / 2 + Math.sqrt(inner)) + Math.cbrt(-q / 2 - Math.sqrt(inner)) + shift];
  const angle = Math.acos(Math.max(-1, Math.min(1, ((3 * q) / (2 * p || 1)) * Math.sqrt(-3 / (p || -1)))));
  return [0, 1, 2].map((k) => 2 * Math.sqrt(-p / 3) * Math.cos((angle - 2 * Math.PI * k) / 3) + shift);
}

function eigenvector(m: number[][], value: number): Triple {
  const rows = m.map((row, i) => row.map((entry, j) => entry - (i === j ? value : 0)) as Triple);
  const candidates = [cross(rows[0]!, rows[1]!), cross(rows[0]!, rows[2]!), cross(rows[1]!, rows[2]!)];
  const best = candidates.reduce((a, b) => (Math.hypot(...a) >= Math.hypot(...b) ? a : b));
  const length = Math.hypot(...best) || 1;
  return best.map((entry) => entry / length) as Triple;
}

const cross = (a: Triple, b: Triple): Triple => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];

const noEllipse = () => new CalcInputError('points', 'no-ellipse', 'No ellipse goes near these points: set them round the whole edge.');
