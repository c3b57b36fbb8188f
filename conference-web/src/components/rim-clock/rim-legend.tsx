import type { Side } from '@kerfside/calc/vocabulary/case.js';
import { QUADRANT } from '@kerfside/calc/vocabulary/case-content.js';
import { STRUCTURES } from './danger-zones';
import { anteriorHour, type Quadrant } from './rim-geometry';
import styles from './rim-clock.module.css';

/** A quadrant and what lies behind it, in the corner of the drawing where it is. */
export const ZoneName = ({ quadrant }: { quadrant: Quadrant }) => (
  <p className={styles.zone}>
    <strong>{QUADRANT[quadrant]}</strong>
    {STRUCTURES[quadrant]}
  </p>
);

/** The four corners of the drawing from top left, mirrored for the side. */
export const cornersFor = (side: Side): Quadrant[] =>
  side === 'right'
    ? ['posterosuperior', 'anterosuperior', 'posteroinferior', 'anteroinferior']
    : ['anterosuperior', 'posterosuperior', 'anteroinferior', 'posteroinferior'];

const Swatch = ({ of, children }: { of: string; children: string }) => (
  <li>
    <svg width="22" height="16" viewBox="0 0 22 16" aria-hidden="true">
      {of === 'screw' ? (
        <circle cx="11" cy="8" r="4.5" className={styles.screw} />
      ) : of === 'lost' ? (
        <rect x="1" y="5" width="20" height="6" className={styles.lost} />
      ) : (
        <rect x="1.5" y="1.5" width="19" height="13" className={`${styles.piece} ${styles[of] ?? ''}`} />
      )}
      {of === 'slow' && [5, 11, 17].map((x) => <circle key={x} cx={x} cy="8" r="1.3" className={styles['slow-dot']} />)}
    </svg>
    {children}
  </li>
);

export function RimLegend({ side, withLost }: { side: Side | null; withLost: boolean }) {
  return (
    <div className={styles.legend}>
      <ul>
        <Swatch of="fixed">fixed, to be divided</Swatch>
        <Swatch of="slow">slow part</Swatch>
        <Swatch of="free">free</Swatch>
        <Swatch of="unsettled">not settled</Swatch>
        <Swatch of="screw">screw, deeper towards the middle</Swatch>
        {withLost && <Swatch of="lost">bone lost</Swatch>}
      </ul>
      <p>
        Seen face on from the patient’s side: 12 is superior
        {side ? `, anterior is at ${anteriorHour(side)} for this ${side} hip` : '; the side is not known, so anterior and posterior are not drawn'}. Numbers in the
        ring are the cutting order. The dashed lines mark where the bone gives way slowly: inferior and the medial wall.
        {side && ' Hatched: structures behind the wall; the borders of the quadrants are approximate.'}
      </p>
    </div>
  );
}
