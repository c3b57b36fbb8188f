import { meetingDates } from '@kerfside/calc/planning/meeting-dates.js';
import { CalcInputError } from '@kerfside/calc/common/calc-input-error.js';
import { formatDay, formatTime, zoneName } from '@/lib/dates';
import styles from './conferences.module.css';

interface Slot {
  timeZone: string;
  start: string;
  rrule: string;
}

function datesOf(slot: Slot): { utc: string[]; cautions: string[] } | { wrong: string } {
  try {
    return meetingDates({ ...slot, count: 4 });
  } catch (error) {
    return { wrong: error instanceof CalcInputError ? error.message : 'This rule gives no date.' };
  }
}

/** What the slot means, before it is saved. */
export function NextDates({ slot }: { slot: Slot }) {
  const dates = datesOf(slot);
  if ('wrong' in dates) return <p className={`${styles.dates} ${styles.wrong}`}>{dates.wrong}</p>;
  return (
    <div className={styles.dates} role="status">
      <span className="label-text">The first meetings: </span>
      {dates.utc.map((at) => `${formatDay(at, slot.timeZone)}, ${formatTime(at, slot.timeZone)} ${zoneName(at, slot.timeZone)}`).join('; ')}
      {dates.cautions.map((caution) => (
        <div key={caution}>{caution}</div>
      ))}
    </div>
  );
}
