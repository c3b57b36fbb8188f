import type { Side } from '@kerfside/calc/vocabulary/case.js';
import type { RimSector, Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { type ReactNode, useId } from 'react';
import { SLOW_HOURS } from './danger-zones';
import { anteriorHour, arcLine, HOURS, pointAt, type Quadrant, quadrantMiddle, ringPiece } from './rim-geometry';
import { sectorAt } from './rim-order';
import { RimScrews } from './rim-screws';
import styles from './rim-clock.module.css';

export const RING = { inner: 72, outer: 106 };
const NUMERALS = 116;
const BAND = { inner: 125, outer: 137, gapHours: 0.45 };

const QUADRANTS: Quadrant[] = ['anterosuperior', 'anteroinferior', 'posterosuperior', 'posteroinferior'];

const Hatch = ({ id }: { id: string }) => (
  <defs>
    <pattern id={`${id}-danger`} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <path d="M0 0V6" className={styles['hatch-line']} />
    </pattern>
    <pattern id={`${id}-slow`} width="7" height="7" patternUnits="userSpaceOnUse">
      <circle cx="2" cy="2" r="1.1" className={styles['slow-dot']} />
    </pattern>
  </defs>
);

/** Hatched bands outside the ring; anterior and posterior change places with the side. */
const DangerBands = ({ id, side }: { id: string; side: Side }) =>
  QUADRANTS.map((quadrant) => {
    const middle = quadrantMiddle(quadrant, side);
    const [from, to] = [middle - 1.5 + BAND.gapHours, middle + 1.5 - BAND.gapHours];
    return (
      <path
        key={quadrant}
        d={ringPiece(from, to, BAND.inner, BAND.outer)}
        fill={`url(#${id}-danger)`}
        className={styles.danger}
        data-quadrant={quadrant}
      />
    );
  });

function Directions({ side }: { side: Side | null }) {
  const middle = (BAND.inner + BAND.outer) / 2;
  const ofHour = (hour: 3 | 9) => (side ? (anteriorHour(side) === hour ? 'Anterior' : 'Posterior') : 'Side not known');
  return (
    <g className={styles.direction}>
      <text y={-middle}>Superior</text>
      <text y={middle}>Inferior</text>
      <text transform={`translate(${middle} 0) rotate(90)`} data-hour="3">
        {ofHour(3)}
      </text>
      <text transform={`translate(${-middle} 0) rotate(-90)`} data-hour="9">
        {ofHour(9)}
      </text>
    </g>
  );
}

interface SectorProps {
  sector: RimSector;
  isLost: boolean;
  slowFill: string;
}

/** Free sectors are filled; those still to be divided stay open. */
export function SectorShape({ sector, isLost, slowFill }: SectorProps) {
  const { hour, state, order } = sector;
  const [from, to] = [hour - 0.5, hour + 0.5];
  const middle = pointAt(hour, (RING.inner + RING.outer) / 2);
  return (
    <>
      <path d={ringPiece(from, to, RING.inner, RING.outer)} className={`${styles.piece} ${styles[state ?? 'unsettled'] ?? ''}`} />
      {state === 'slow' && <path d={ringPiece(from, to, RING.inner, RING.outer)} fill={slowFill} pointerEvents="none" />}
      {isLost && <path d={ringPiece(from + 0.08, to - 0.08, RING.outer - 7, RING.outer)} className={styles.lost} />}
      {order && (
        <text x={middle.x} y={middle.y} className={styles.order}>
          {order}
        </text>
      )}
    </>
  );
}

export interface DrawingProps {
  side: Side | null;
  sectors: readonly RimSector[];
  screws: readonly Screw[];
  lost: readonly number[];
  /** Wraps each sector, where the clock can be changed. */
  wrap?: (hour: number, shape: ReactNode) => ReactNode;
}

/** The picture alone: ring, numerals, directions, danger bands, slow parts and screws. */
export function RimDrawing({ side, sectors, screws, lost, wrap }: DrawingProps) {
  const id = useId().replace(/[^\w-]/g, '');
  return (
    <>
      <Hatch id={id} />
      {side && <DangerBands id={id} side={side} />}
      <Directions side={side} />
      <g className={styles.numeral}>
        {HOURS.map((hour) => (
          <text key={hour} {...pointAt(hour, NUMERALS)}>
            {hour}
          </text>
        ))}
      </g>
      {HOURS.map((hour) => {
        const shape = <SectorShape sector={sectorAt(sectors, hour)} isLost={lost.includes(hour)} slowFill={`url(#${id}-slow)`} />;
        return wrap ? wrap(hour, shape) : <g key={hour}>{shape}</g>;
      })}
      <path d={arcLine(SLOW_HOURS.from - 0.5, SLOW_HOURS.to + 0.5, RING.inner - 5)} className={styles['slow-line']} />
      <circle r="15" className={styles['slow-line']} />
      <text y="0.5" className={styles.medial}>
        medial
      </text>
      <RimScrews screws={screws} side={side} />
    </>
  );
}
