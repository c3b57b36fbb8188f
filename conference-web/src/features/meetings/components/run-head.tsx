import { Button } from '@radix-ui/themes';
import { Confirm } from '@/components/confirm';
import { formatTime } from '@/lib/dates';
import { counted, quantity } from '@/lib/units';
import type { Meeting } from '../api/get-meeting';
import { useCloseMeeting, useStartMeeting } from '../api/run-meeting';
import { driftWords, forecast, type SlotClock } from '../slot-clock';
import { quorumWords } from './attendance-panel';
import styles from './run.module.css';

/** The time, where the running order has got to, and the quorum: what the chair looks up at. */
export function RunHead({ meeting, clock, now }: { meeting: Meeting; clock: SlotClock; now: number }) {
  const { endsAt, driftMinutes, overMinutes } = forecast(meeting, clock, now);
  const isLeading = meeting.state === 'running' && meeting.actions.run;
  return (
    <div className={styles.head}>
      <p className={styles.time}>
        <span className="visually-hidden">It is </span>
        {formatTime(new Date(now))}
      </p>
      {isLeading && meeting.items.length > 0 && (
        <p className={styles.drift}>
          <strong>{driftWords(driftMinutes)}</strong>
          <span>
            Ends {formatTime(endsAt)}
            {overMinutes >= 1 && `, ${quantity(Math.round(overMinutes), 'minutes')} past the meeting’s end`}
          </span>
        </p>
      )}
      <p className={styles.drift}>
        <strong>{quorumWords(meeting)}</strong>
      </p>
    </div>
  );
}

export function StartMeeting({ meeting }: { meeting: Meeting }) {
  const { mutateAsync } = useStartMeeting(meeting.id);
  return (
    <Confirm title="Start this meeting" confirmWord="Start meeting" onConfirm={() => mutateAsync()} trigger={<Button>Start meeting</Button>}>
      {isEarly(meeting) ? `It is planned for ${formatTime(meeting.startsAt)}. ` : ''}
      From its start on the agenda stands as it is, and second rounds can be opened.
    </Confirm>
  );
}

const isEarly = ({ startsAt }: Meeting) => Date.parse(startsAt) - Date.now() > 15 * 60_000;

export function CloseMeeting({ meeting, onClosed }: { meeting: Meeting; onClosed: () => void }) {
  const { mutateAsync } = useCloseMeeting(meeting.id);
  const left = meeting.items.filter(({ state }) => state === 'listed');
  return (
    <Confirm
      title="Close this meeting"
      confirmWord="Close meeting"
      onConfirm={() => mutateAsync().then(onClosed)}
      trigger={<Button variant={left.length > 0 ? 'soft' : 'solid'}>Close meeting</Button>}
    >
      {left.length > 0
        ? `${counted(left.length, 'case')} without a decision (${left.map(({ code }) => code).join(', ')}) ${left.length === 1 ? 'goes' : 'go'} back to open, for a later meeting. `
        : 'Every case is decided or deferred. '}
      Attendance can not be changed afterwards.
    </Confirm>
  );
}
