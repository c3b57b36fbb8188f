import { CalcInputError } from '../common/calc-input-error.js';
import { distance, type FilmPoint, readPoints } from './film-points.js';
import { fitEllipse } from './ellipse-fit.js';

/** One figure read off a film: its unit, and what two pixels of misplacing each point would change. */
export interface FilmFigure {
  value: number;
  unit: 'mm' | 'deg';
  error: number;
}

const PLACEMENT_PX = 2;
const degrees = (radians: number) => (radians * 180) / Math.PI;

/**
 * What a figure changes when every point is off by `px` in each direction, taken as independent: root of the
 * sum of squares of the single changes. Common practice, no source.
 */
export function placementError(measure: (points: readonly FilmPoint[]) => number, points: readonly FilmPoint[], px = PLACEMENT_PX): number {
  const value = measure(points);
  const changes = points.flatMap((point, index) =>
    [
      { x: px, y: 0 },
      { x: 0, y: px },
    ].map(({ x, y }) => measure(points.map((other, place) => (place === index ? { x: point.x + x, y: point.y + y } : other))) - value),
  );
  return Math.hypot(...changes);
}

const figure = (unit: FilmFigure['unit'], measure: (points: readonly FilmPoint[]) => number, points: readonly FilmPoint[]): FilmFigure => ({
  value: measure(points),
  unit,
  error: placementError(measure, points),
});

/** Distance of two points, mm. */
export const lengthOf = (ends: readonly [FilmPoint, FilmPoint], mmPerPx: number): FilmFigure =>
  figure('mm', ([a, b]) => distance(a!, b!) * mmPerPx, readPoints(ends, 2, 'ends'));

/** Angle at the middle one of three points, 0 to 180 degrees. Needs no scale. */
export function angleAt(points: readonly [FilmPoint, FilmPoint, FilmPoint]): FilmFigure {
  readPoints(points, 3, 'points');
  const measure = ([a, apex, b]: readonly FilmPoint[]) => {
    const one = Math.atan2(a!.y - apex!.y, a!.x - apex!.x);
    const two = Math.atan2(b!.y - apex!.y, b!.x - apex!.x);
    return Math.abs(degrees(Math.atan2(Math.sin(one - two), Math.cos(one - two))));
  };
  return figure('deg', measure, points);
}

/** Both teardrops' lowest points: the line that heights and angles are taken from. */
export type TeardropLine = readonly [FilmPoint, FilmPoint];

/**
 * Radiographic inclination: angle of the long axis of the rim to the inter-teardrop line, 0 to 90 degrees.
 * Source: radiographic definition, Murray DW. J Bone Joint Surg Br 1993;75-B:228.
 */
export function inclination(rimEnds: readonly [FilmPoint, FilmPoint], teardrops: TeardropLine): FilmFigure {
  const measure = ([a, b, t1, t2]: readonly FilmPoint[]) => {
    const between = Math.atan2(b!.y - a!.y, b!.x - a!.x) - Math.atan2(t2!.y - t1!.y, t2!.x - t1!.x);
    return degrees(Math.asin(Math.min(1, Math.abs(Math.sin(between)))));
  };
  return figure('deg', measure, apart([...rimEnds, ...teardrops], 'teardrops'));
}

/**
 * Version from the ellipse of the rim, unsigned: one film does not tell ante- from retroversion. 0 to 90 degrees.
 * Source: arcsine of short over long axis (Lewinnek and others 1978, formula from memory).
 */
export function versionFromRim(rim: readonly FilmPoint[]): FilmFigure {
  const measure = (points: readonly FilmPoint[]) => {
    const { major, minor } = fitEllipse(points);
    return degrees(Math.asin(minor / major));
  };
  return figure('deg', measure, readPoints(rim, 5, 'rim'));
}

/** Height of a point above the inter-teardrop line and its distance along it from the nearer teardrop, mm. */
export interface CentrePosition {
  height: FilmFigure;
  offset: FilmFigure;
}

/** Hip centre against the teardrops, mm: height is positive above the line, offset is away from the midline. */
export function hipCentre(centre: FilmPoint, teardrops: TeardropLine, mmPerPx: number): CentrePosition {
  const points = apart([centre, ...teardrops], 'teardrops');
  return {
    height: figure('mm', (moved) => heightPx(moved) * mmPerPx, points),
    offset: figure('mm', (moved) => offsetPx(moved) * mmPerPx, points),
  };
}

/**
 * Leg length: perpendicular distances of the lesser trochanters below the inter-teardrop line, operated minus other
 * side, mm. Positive: the operated leg is longer. Common practice, no source; the sign is this project's.
 */
export function legLengthDifference(operated: FilmPoint, other: FilmPoint, teardrops: TeardropLine, mmPerPx: number): FilmFigure {
  const measure = ([one, two, t1, t2]: readonly FilmPoint[]) => (heightPx([two!, t1!, t2!]) - heightPx([one!, t1!, t2!])) * mmPerPx;
  return figure('mm', measure, apart([operated, other, ...teardrops], 'teardrops'));
}

/** How far a hip centre went between two dates, mm: up, outwards, and in all. Each film has its own scale. */
export function migration(before: CentrePosition, after: CentrePosition): { upMm: number; outMm: number; resultantMm: number; errorMm: number } {
  const upMm = after.height.value - before.height.value;
  const outMm = after.offset.value - before.offset.value;
  return {
    upMm,
    outMm,
    resultantMm: Math.hypot(upMm, outMm),
    errorMm: Math.hypot(before.height.error, after.height.error, before.offset.error, after.offset.error),
  };
}

function heightPx([point, t1, t2]: readonly FilmPoint[]): number {
  // left to right, so that up on the image is positive whichever teardrop was set first
  const [left, right] = t1!.x <= t2!.x ? [t1!, t2!] : [t2!, t1!];
  return ((point!.x - left.x) * (right.y - left.y) - (point!.y - left.y) * (right.x - left.x)) / distance(left, right);
}

function offsetPx([point, t1, t2]: readonly FilmPoint[]): number {
  const along = ((point!.x - t1!.x) * (t2!.x - t1!.x) + (point!.y - t1!.y) * (t2!.y - t1!.y)) / distance(t1!, t2!);
  return along < distance(t1!, t2!) / 2 ? -along : along - distance(t1!, t2!);
}

function apart(points: readonly FilmPoint[], field: string): readonly FilmPoint[] {
  readPoints(points, 2, field);
  const [t1, t2] = points.slice(-2);
  if (distance(t1!, t2!) < 10) throw new CalcInputError(field, 'too-close', 'The teardrops lie on one another: set one on each side.');
  return points;
}
