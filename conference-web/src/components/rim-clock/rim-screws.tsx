import type { Side } from '@kerfside/calc/vocabulary/case.js';
import type { Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { pointAt } from './rim-geometry';
import { screwHour, screwWords } from './rim-words';
import styles from './rim-clock.module.css';

const RIM = 64;
const DEEPEST = { mm: 70, radius: 20 };

/** The farther from the ring, the longer the screw; one of unknown length stands at the ring. */
const radiusFor = (lengthMm: number | null | undefined) =>
  lengthMm ? RIM - (Math.min(lengthMm, DEEPEST.mm) / DEEPEST.mm) * (RIM - DEEPEST.radius) : RIM;

/** Screws as dots at their hour and depth; hollow where the length or the exact hour is not known. */
export const RimScrews = ({ screws, side }: { screws: readonly Screw[]; side: Side | null }) =>
  screws.map((screw) => {
    const hour = screwHour(screw, side);
    if (hour === null) return null;
    const head = pointAt(hour, RIM + 4);
    const tip = pointAt(hour, radiusFor(screw.lengthMm));
    const isVague = !screw.lengthMm || !screw.hour;
    return (
      <g key={screw.id} data-screw={screw.id} pointerEvents="none">
        <title>{screwWords(screw)}</title>
        <path d={`M${head.x} ${head.y}L${tip.x} ${tip.y}`} className={styles['screw-line']} />
        <circle cx={tip.x} cy={tip.y} r="4.5" className={isVague ? styles['screw-vague'] : styles.screw} />
        {screw.tipInsidePelvis && <circle cx={tip.x} cy={tip.y} r="8" className={styles['screw-deep']} />}
      </g>
    );
  });
