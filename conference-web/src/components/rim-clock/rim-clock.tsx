import type { Side } from '@kerfside/calc/vocabulary/case.js';
import type { RimSector, Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { type KeyboardEvent, type ReactNode, useId, useRef, useState } from 'react';
import { RimDrawing } from './rim-drawing';
import { RimEditor } from './rim-editor';
import { hourAfter } from './rim-geometry';
import { cornersFor, RimLegend, ZoneName } from './rim-legend';
import { sectorAt, toggleOrder, withSector } from './rim-order';
import { RimTable } from './rim-table';
import { clockSummary, sectorWords } from './rim-words';
import styles from './rim-clock.module.css';

const VIEW = '-142 -142 284 284';
const MOVES: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };
const STATE_KEYS: Record<string, RimSector['state']> = { f: 'fixed', r: 'free', s: 'slow', n: null };

interface RimClockProps {
  /** Anterior is at 3 for a right hip and at 9 for a left one; without a side neither it nor the danger zones are drawn. */
  side: Side | null;
  sectors: readonly RimSector[];
  screws: readonly Screw[];
  /** Makes it changeable. Gets all sectors that say something, by hour. */
  onChange?: (sectors: RimSector[]) => void;
  /** Hours at which bone was lost. */
  lost?: readonly number[];
  /** Makes these hours changeable instead of the plan. */
  onLostChange?: (hours: number[]) => void;
}

/**
 * The shell seen face on from the patient's side, with the plan to divide the bone round it. Hours are those of the
 * drawing: 12 superior, 6 inferior, anterior at 3 for a right hip and mirrored to 9 for a left one.
 */
export function RimClock({ side, sectors, screws, onChange, lost = [], onLostChange }: RimClockProps) {
  const tableId = useId();
  const [hour, setHour] = useState(12);
  const isChangeable = Boolean(onChange ?? onLostChange);
  const picture = { side, sectors, screws, lost };
  return (
    <div className={styles.clock}>
      <div className={styles.face}>
        {side && cornersFor(side).map((quadrant) => <ZoneName key={quadrant} quadrant={quadrant} />)}
        {isChangeable ? (
          <ChangeableDrawing {...{ ...picture, hour, setHour, onChange, onLostChange }} />
        ) : (
          <svg viewBox={VIEW} role="img" aria-label={clockSummary(side, sectors, screws)} aria-details={tableId}>
            <RimDrawing {...picture} />
          </svg>
        )}
      </div>
      {onChange && <RimEditor {...{ hour, side, sectors, onChange }} />}
      <RimLegend side={side} withLost={lost.length > 0 || Boolean(onLostChange)} />
      <div className="visually-hidden" id={tableId}>
        <RimTable {...picture} />
      </div>
    </div>
  );
}

interface ChangeableProps extends Pick<RimClockProps, 'side' | 'sectors' | 'screws' | 'onChange' | 'onLostChange'> {
  lost: readonly number[];
  hour: number;
  setHour: (hour: number) => void;
}

const toggled = (hours: readonly number[], hour: number) =>
  hours.includes(hour) ? hours.filter((other) => other !== hour) : [...hours, hour].sort((one, other) => one - other);

function ChangeableDrawing({ side, sectors, screws, lost, hour, setHour, onChange, onLostChange }: ChangeableProps) {
  const drawing = useRef<SVGSVGElement>(null);
  const hintId = useId();
  // by the time of the click, the focus has already chosen the hour
  const wasChosen = useRef(false);
  const act = (at: number) => {
    onChange?.(toggleOrder(sectors, at));
    onLostChange?.(toggled(lost, at));
  };
  const goTo = (next: number) => {
    setHour(next);
    drawing.current?.querySelector<SVGElement>(`[data-sector="${next}"]`)?.focus();
  };
  const press = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const key = event.key.toLowerCase();
    const move = MOVES[event.key];
    if (move) goTo(hourAfter(hour, move));
    else if (key === ' ' || key === 'enter') act(hour);
    else if (onChange && key in STATE_KEYS) onChange(withSector(sectors, hour, { state: STATE_KEYS[key] ?? null }));
    else return;
    event.preventDefault();
  };
  const wrap = (at: number, shape: ReactNode) => (
    <g
      key={at}
      role="button"
      data-sector={at}
      tabIndex={at === hour ? 0 : -1}
      className={`${styles.sector} ${at === hour ? styles.chosen : ''}`}
      aria-label={sectorWords(sectorAt(sectors, at), side, lost.includes(at))}
      aria-pressed={onLostChange ? lost.includes(at) : undefined}
      // the first press chooses the hour, the next one numbers it, so that a slip changes nothing
      onPointerDown={() => (wasChosen.current = at === hour)}
      // a screen reader's press has no pointer (detail 0) and was meant for this hour
      onClick={(event) => (wasChosen.current || !onChange || event.detail === 0 ? act(at) : goTo(at))}
      onFocus={() => setHour(at)}
    >
      {shape}
    </g>
  );
  return (
    <>
      <svg ref={drawing} viewBox={VIEW} role="group" aria-label={clockSummary(side, sectors, screws)} aria-describedby={hintId} onKeyDown={press}>
        <RimDrawing {...{ side, sectors, screws, lost, wrap }} />
      </svg>
      <p id={hintId} className={styles.hint}>
        {onChange
          ? 'Press an hour to choose it, once more to number it. Keys: arrows move, Space numbers, F fixed, R free, S slow part, N not settled.'
          : 'Press an hour where bone was lost, once more to take it back. Keys: arrows move, Space marks.'}
      </p>
    </>
  );
}
