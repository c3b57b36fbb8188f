import type { RimSector } from '@kerfside/calc/vocabulary/case-content.js';
import { HOURS, hourAfter } from './rim-geometry';

/** What is said of an hour; an empty sector where nothing is. */
export const sectorAt = (sectors: readonly RimSector[], hour: number): RimSector => sectors.find((sector) => sector.hour === hour) ?? { hour };

const orderOf = (sector: RimSector) => sector.order ?? null;
const saysSomething = ({ state, order, note }: RimSector) => Boolean(state) || (order !== null && order !== undefined) || Boolean(note);

/** The sectors that say something, by hour from 1 to 12. */
const kept = (sectors: RimSector[]) => sectors.filter(saysSomething).sort((one, other) => one.hour - other.hour);

/** The same with one sector changed. */
export function withSector(sectors: readonly RimSector[], hour: number, changes: Partial<RimSector>): RimSector[] {
  const others = sectors.filter((sector) => sector.hour !== hour);
  return kept([...others, { ...sectorAt(sectors, hour), ...changes }]);
}

/** The place that the next sector gets. */
export const nextOrder = (sectors: readonly RimSector[]): number => Math.min(12, Math.max(0, ...sectors.map((sector) => orderOf(sector) ?? 0)) + 1);

/** Puts an hour at the end of the cutting order, or takes it out, and the later ones move up. */
export function toggleOrder(sectors: readonly RimSector[], hour: number): RimSector[] {
  const place = orderOf(sectorAt(sectors, hour));
  if (place === null) return withSector(sectors, hour, { order: nextOrder(sectors) });
  const closedUp = sectors.map((sector) => {
    const order = orderOf(sector);
    return order !== null && order > place ? { ...sector, order: order - 1 } : sector;
  });
  return withSector(closedUp, hour, { order: null });
}

/** Numbers every hour that has no place yet, going round from one hour. */
export function orderRound(sectors: readonly RimSector[], from: number, direction: 'clockwise' | 'anticlockwise'): RimSector[] {
  const step = direction === 'clockwise' ? 1 : -1;
  return HOURS.reduce<RimSector[]>((done, _, index) => {
    const hour = hourAfter(from, index * step);
    return orderOf(sectorAt(done, hour)) === null ? toggleOrder(done, hour) : done;
  }, [...sectors]);
}

export const withoutOrder = (sectors: readonly RimSector[]): RimSector[] => kept(sectors.map((sector) => ({ ...sector, order: null })));

const ENDINGS: Record<number, string> = { 1: 'st', 2: 'nd', 3: 'rd' };

/** `1st`, `12th`. */
export const ordinal = (place: number): string => `${place}${(place < 4 && ENDINGS[place]) || 'th'}`;
