import type { Side } from '@kerfside/calc/vocabulary/case.js';
import type { QUADRANT } from '@kerfside/calc/vocabulary/case-content.js';

/*
 * The convention of the clock. The shell is seen face on, as somebody sees it who stands at the patient's side and
 * looks at the socket: 12 is superior, 6 is inferior. Who faces the right hip of a patient has the patient's front on
 * the right hand, so anterior is at 3 for a right hip, and at 9 for a left one. Hours are those of the drawing: 3 of a
 * left hip is posterior.
 */

export type Quadrant = keyof typeof QUADRANT;

/** From the top, clockwise. */
export const HOURS = [12, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11] as const;

export const anteriorHour = (side: Side): 3 | 9 => (side === 'right' ? 3 : 9);

/** Any number of hours on from another, 1 to 12. */
export const hourAfter = (hour: number, by: number): number => ((((hour - 1 + by) % 12) + 12) % 12) + 1;

export interface Point {
  x: number;
  y: number;
}

/** Where an hour (fractions too) lies at a distance from the centre; y grows downwards as on a screen. */
export function pointAt(hour: number, radius: number): Point {
  const angle = (hour / 12) * 2 * Math.PI;
  return { x: round(radius * Math.sin(angle)), y: round(-radius * Math.cos(angle)) };
}

const round = (value: number) => Math.round(value * 100) / 100 + 0;

/** The outline of a piece of a ring between two hours, clockwise. */
export function ringPiece(from: number, to: number, inner: number, outer: number): string {
  const [a, b, c, d] = [pointAt(from, outer), pointAt(to, outer), pointAt(to, inner), pointAt(from, inner)];
  return `M${a.x} ${a.y}A${outer} ${outer} 0 0 1 ${b.x} ${b.y}L${c.x} ${c.y}A${inner} ${inner} 0 0 0 ${d.x} ${d.y}Z`;
}

/** A line along the ring between two hours, clockwise. */
export function arcLine(from: number, to: number, radius: number): string {
  const [a, b] = [pointAt(from, radius), pointAt(to, radius)];
  return `M${a.x} ${a.y}A${radius} ${radius} 0 0 1 ${b.x} ${b.y}`;
}

/** The hour in the middle of a quadrant: 1.5 for the anterosuperior one of a right hip. */
export function quadrantMiddle(quadrant: Quadrant, side: Side): number {
  const isRightOfDrawing = quadrant.startsWith('antero') === (side === 'right');
  const isUpper = quadrant.endsWith('superior');
  if (isRightOfDrawing) return isUpper ? 1.5 : 4.5;
  return isUpper ? 10.5 : 7.5;
}

/** The quadrant of an hour; null for the four that lie between two. */
export function quadrantOf(hour: number, side: Side): Quadrant | null {
  const quadrants: Quadrant[] = ['anterosuperior', 'anteroinferior', 'posterosuperior', 'posteroinferior'];
  return quadrants.find((quadrant) => Math.abs(quadrantMiddle(quadrant, side) - hour) < 1.5) ?? null;
}

/** Where an hour is on the patient: 'superior', 'anterosuperior'. Only superior and inferior without a side. */
export function placeOf(hour: number, side: Side | null): string | null {
  if (hour === 12) return 'superior';
  if (hour === 6) return 'inferior';
  if (!side) return null;
  if (hour === anteriorHour(side)) return 'anterior';
  if (hour === hourAfter(anteriorHour(side), 6)) return 'posterior';
  return quadrantOf(hour, side);
}
