import { Button } from '@radix-ui/themes';
import { quantity } from '@/lib/units';
import type { AgendaItem } from '../api/get-meeting';
import { clockFace, type SlotClock, spentOn } from '../slot-clock';
import styles from './run.module.css';

interface SlotTimerProps {
  item: AgendaItem;
  clock: SlotClock;
  now: number;
  onStart: () => void;
  onStop: () => void;
}

/** What is left of the current case's minutes. Read out once a minute at most, not every second. */
export function SlotTimer({ item, clock, now, onStart, onStop }: SlotTimerProps) {
  const spent = spentOn(clock, item.id, now);
  const left = item.minutes * 60_000 - spent;
  const isTicking = clock.currentId === item.id && clock.since !== null;
  const share = Math.min(1, spent / (item.minutes * 60_000));
  const minutesLeft = Math.ceil(left / 60_000);
  return (
    <div className={styles.timer} data-over={left < 0 || undefined}>
      <div>
        <span className={styles.face} aria-hidden="true">
          {clockFace(left)}
        </span>
        <span className="visually-hidden" role="status">
          {minutesLeft > 0 ? `${minutesLeft} min left of ${item.minutes}` : 'The minutes are used up'}
        </span>
        <span className="label-text">
          {left < 0 ? 'over its ' : 'left of '}
          {quantity(item.minutes, 'minutes')}
        </span>
      </div>
      <div className={styles.bar} aria-hidden="true">
        <div style={{ width: `${share * 100}%` }} />
      </div>
      <Button variant="soft" color="gray" highContrast onClick={isTicking ? onStop : onStart}>
        {isTicking ? 'Stop clock' : spent > 0 ? 'Go on' : 'Start clock'}
      </Button>
    </div>
  );
}
