import type { Side } from '@kerfside/calc/vocabulary/case.js';
import { HEAD_DRIVE, QUADRANT, type RimSector, type Screw, SECTOR_STATE } from '@kerfside/calc/vocabulary/case-content.js';
import { counted, quantity } from '@/lib/units';
import { HOURS, placeOf, quadrantMiddle } from './rim-geometry';
import { sectorAt } from './rim-order';

/** `12 o’clock, superior`. */
export function hourWords(hour: number, side: Side | null): string {
  const place = placeOf(hour, side);
  return `${hour} o’clock${place ? `, ${place}` : ''}`;
}

export const stateWords = ({ state }: RimSector): string => (state ? SECTOR_STATE[state] : 'Not settled');

/** All that is said of a sector, for a reader that can't see the drawing. */
export function sectorWords(sector: RimSector, side: Side | null, isLost: boolean): string {
  // the number as it is drawn, for those who speak what they see
  const cut = sector.order ? `cut ${sector.order}` : 'no place in the order';
  const words = [stateWords(sector), cut, sector.note ?? '', isLost ? 'bone lost' : ''].filter(Boolean);
  return `${hourWords(sector.hour, side)}: ${words.join('; ')}`;
}

export function screwWords(screw: Screw): string {
  const where = screw.hour ? `${screw.hour} o’clock` : screw.quadrant ? QUADRANT[screw.quadrant].toLowerCase() : 'place not known';
  const depth = screw.lengthMm ? quantity(screw.lengthMm, 'mm') : 'length not known';
  const drive = `head drive ${screw.headDrive ? HEAD_DRIVE[screw.headDrive].toLowerCase() : 'not known'}`;
  return [where, depth, drive, screw.tipInsidePelvis ? 'tip inside the pelvis' : ''].filter(Boolean).join(', ');
}

/** The hour (or the middle of the quadrant) at which a screw is drawn; null where neither is known. */
export function screwHour(screw: Screw, side: Side | null): number | null {
  if (screw.hour) return screw.hour;
  return screw.quadrant && side ? quadrantMiddle(screw.quadrant, side) : null;
}

/** The drawing in one sentence. */
export function clockSummary(side: Side | null, sectors: readonly RimSector[], screws: readonly Screw[]): string {
  const order = HOURS.map((hour) => sectorAt(sectors, hour))
    .filter((sector) => sector.order)
    .sort((one, other) => one.order! - other.order!)
    .map(({ hour }) => hour);
  const cutting = order.length ? `Cutting order: ${order.join(', ')}.` : 'No cutting order yet.';
  return `Rim clock of the ${side ? `${side} hip` : 'hip, side not known'}. ${cutting} ${counted(screws.length, 'screw')}.`;
}
