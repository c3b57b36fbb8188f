import { type CSSProperties, type ReactNode, useRef } from 'react';
import { formatTime } from '@/lib/dates';
import { quantity } from '@/lib/units';
import { clockTicks, layOutSlots, type PlacedSlot, pixelsPerMinute, type Slot } from './running-order-scale';
import { useSlotDrag } from './use-slot-drag';
import styles from './running-order.module.css';

interface RunningOrderProps<T extends Slot> {
  /** Read out as the list's name. */
  label: string;
  slots: T[];
  startsAt: string;
  minutes: number;
  timeZone?: string;
  /** Height in pixels that the shortest slot's content needs. */
  neededPx?: number;
  /** Minutes after the start where the clock stands now; a line is drawn there. */
  now?: number | null;
  currentId?: string | null;
  /** Slots that are over: drawn pale. */
  isDone?: (slot: T) => boolean;
  /** Lets a slot be dragged by what is marked `data-drag-handle` in it. */
  onMove?: (from: number, to: number) => void;
  children: (placed: PlacedSlot<T>, index: number) => ReactNode;
}

// between the meeting's end and what does not fit: room for the words
const BELOW_PX = 52;

const minutesLong = (minutes: number) => `calc(var(--per-minute) * ${minutes})`;

/** The agenda as a time ruler: slots to the scale of their minutes, the meeting's end as a line, the rest below it. */
export function RunningOrder<T extends Slot>(props: RunningOrderProps<T>) {
  const { label, slots, startsAt, minutes, timeZone, neededPx = 46, now, currentId, isDone, onMove, children } = props;
  const list = useRef<HTMLOListElement>(null);
  const scale = pixelsPerMinute(slots, minutes, neededPx);
  const { placed, freeMinutes, overMinutes } = layOutSlots(slots, minutes);
  const waiting = placed.filter(({ fits }) => !fits);
  const below = waiting.reduce((sum, { slot }) => sum + slot.minutes, 0);
  // what does not fit starts anew under the line
  const shift = waiting[0] ? minutes - waiting[0].from : 0;
  const top = ({ from, fits }: PlacedSlot<T>) => (fits ? from * scale : (from + shift) * scale + BELOW_PX);
  const { drag, begin } = useSlotDrag({
    list,
    ids: slots.map(({ id }) => id),
    middles: () => placed.map((each) => top(each) + (each.slot.minutes * scale) / 2),
    onMove,
  });
  const place = (each: PlacedSlot<T>): CSSProperties => {
    const height = minutesLong(each.slot.minutes);
    if (drag?.id === each.slot.id) return { top: drag.top, height };
    return { top: each.fits ? minutesLong(each.from) : `calc(var(--per-minute) * ${each.from + shift} + ${BELOW_PX}px)`, height };
  };
  const length = { '--per-minute': `${scale}px`, '--print-scale': `${Math.min(2, 120 / Math.max(minutes + below, 1))}mm` } as CSSProperties;
  const all = { height: `calc(var(--per-minute) * ${minutes + below} + ${waiting.length ? BELOW_PX : 0}px)` };
  return (
    <div className={styles.order} style={length} data-dragging={drag ? true : undefined}>
      <div className={styles.ruler} style={all} aria-hidden="true">
        <Ruler {...{ startsAt, minutes, timeZone, scale }} />
        {now !== undefined && now !== null && now >= 0 && now <= minutes && <div className={styles.now} style={{ top: minutesLong(now) }} />}
      </div>
      <div className={styles.field} style={all}>
        {freeMinutes > 0 && (
          <p className={styles.free} style={{ top: minutesLong(minutes - freeMinutes), height: minutesLong(freeMinutes) }}>
            {freeMinutes * scale >= 16 && `${quantity(freeMinutes, 'minutes')} free`}
          </p>
        )}
        <div className={styles.end} style={{ top: minutesLong(minutes) }}>
          {waiting.length > 0 && <p>Does not fit: {quantity(overMinutes, 'minutes')} too long</p>}
        </div>
        <ol ref={list} className={styles.slots} style={all} aria-label={label}>
          {placed.map((each, index) => (
            <li
              key={each.slot.id}
              className={styles.slot}
              style={place(each)}
              onPointerDown={begin(each.slot.id)}
              data-current={currentId === each.slot.id || undefined}
              data-done={isDone?.(each.slot) || undefined}
              data-waiting={!each.fits || undefined}
              data-dragged={drag?.id === each.slot.id || undefined}
            >
              {children(each, index)}
            </li>
          ))}
        </ol>
      </div>
    </div>
  );
}

function Ruler({ startsAt, minutes, timeZone, scale }: { startsAt: string; minutes: number; timeZone?: string; scale: number }) {
  const start = new Date(startsAt).getTime();
  const time = (minute: number) => formatTime(new Date(start + minute * 60_000), timeZone);
  return (
    <>
      {clockTicks(startsAt, minutes, scale).map(({ minute, isNamed }) => (
        <span key={minute} className={isNamed ? styles.named : styles.tick} style={{ top: minutesLong(minute) }}>
          {isNamed && time(minute)}
        </span>
      ))}
      <span className={styles.limit} style={{ top: 0 }}>
        {time(0)}
      </span>
      <span className={styles.limit} style={{ top: minutesLong(minutes) }}>
        {time(minutes)}
      </span>
    </>
  );
}
