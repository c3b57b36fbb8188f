import type { Side } from '@kerfside/calc/vocabulary/case.js';
import type { RimSector, Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { STRUCTURES } from './danger-zones';
import { HOURS, quadrantOf } from './rim-geometry';
import { ordinal, sectorAt } from './rim-order';
import { hourWords, screwHour, screwWords, stateWords } from './rim-words';

interface TableProps {
  side: Side | null;
  sectors: readonly RimSector[];
  screws: readonly Screw[];
  lost: readonly number[];
}

/** What the drawing shows, for readers that can't see it. */
export function RimTable({ side, sectors, screws, lost }: TableProps) {
  const unplaced = screws.filter((screw) => screwHour(screw, side) === null);
  return (
    <>
      <table>
        <caption>Rim clock, hour by hour</caption>
        <thead>
          <tr>
            <th scope="col">Hour</th>
            <th scope="col">State</th>
            <th scope="col">Cut</th>
            <th scope="col">Screws</th>
            <th scope="col">Behind it</th>
            <th scope="col">Note</th>
          </tr>
        </thead>
        <tbody>
          {HOURS.map((hour) => (
            <Row key={hour} {...{ hour, side, screws }} sector={sectorAt(sectors, hour)} isLost={lost.includes(hour)} />
          ))}
        </tbody>
      </table>
      {unplaced.length > 0 && <p>Screws whose place is not known: {unplaced.map(screwWords).join('; ')}.</p>}
    </>
  );
}

interface RowProps {
  hour: number;
  side: Side | null;
  sector: RimSector;
  screws: readonly Screw[];
  isLost: boolean;
}

function Row({ hour, side, sector, screws, isLost }: RowProps) {
  const quadrant = side && quadrantOf(hour, side);
  // one in the middle of a quadrant is told at the hour before it
  const here = screws.filter((screw) => Math.floor(screwHour(screw, side) ?? -1) === hour);
  return (
    <tr>
      <th scope="row">{hourWords(hour, side)}</th>
      <td>{isLost ? `${stateWords(sector)}, bone lost` : stateWords(sector)}</td>
      <td>{sector.order ? ordinal(sector.order) : 'no place'}</td>
      <td>{here.length ? here.map(screwWords).join('; ') : 'none'}</td>
      <td>{quadrant ? STRUCTURES[quadrant] : ''}</td>
      <td>{sector.note}</td>
    </tr>
  );
}
