import { RunningOrder } from '@/components/running-order/running-order';
import { Section } from '@/components/section';
import { formatTime } from '@/lib/dates';
import { quantity } from '@/lib/units';
import { useMediaQuery } from '@/lib/use-media-query';
import type { AgendaItem, Meeting } from '../api/get-meeting';
import { orderStart } from '../slot-clock';
import styles from './run.module.css';

interface OrderPanelProps {
  meeting: Meeting;
  current: AgendaItem | null;
  now: number;
  choose: (itemId: string) => void;
}

/** The running order as it was planned, with the clock's place in it; pressing a case takes it up. */
export function OrderPanel({ meeting, current, now, choose }: OrderPanelProps) {
  const { items, minutes } = meeting;
  const startsAt = orderStart(meeting);
  const isNarrow = useMediaQuery('(max-width: 640px)');
  const start = Date.parse(startsAt);
  return (
    <Section title="Running order">
      <RunningOrder
        label="Running order"
        slots={items}
        startsAt={startsAt}
        minutes={minutes}
        neededPx={isNarrow ? 72 : 60}
        now={(now - start) / 60_000}
        currentId={current?.id}
        isDone={({ state }) => state !== 'listed'}
      >
        {({ slot, from, fits }) => (
          <button type="button" className={styles.slot} aria-current={current?.id === slot.id || undefined} onClick={() => choose(slot.id)}>
            <span className={styles.title}>
              <span>{slot.code}</span> {slot.title}
            </span>
            <span className={styles.about}>
              {quantity(slot.minutes, 'minutes')}
              {fits ? `, planned ${formatTime(new Date(start + from * 60_000))}` : ', does not fit'}
              {slot.state !== 'listed' && <strong>{slot.state === 'decided' ? 'Decided' : 'Deferred'}</strong>}
            </span>
          </button>
        )}
      </RunningOrder>
    </Section>
  );
}
