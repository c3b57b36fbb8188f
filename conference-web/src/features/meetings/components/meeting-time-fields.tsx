import { TextField } from '@/components/field';
import { formatDay, formatTime, localZone, zoneName } from '@/lib/dates';
import { clocksAgree, instantOf } from '../zoned-time';

export interface MeetingTimes {
  /** By the conference's clocks, `YYYY-MM-DDTHH:mm`. */
  wall: string;
  minutes: number;
}

interface MeetingTimeFieldsProps {
  timeZone: string;
  value: MeetingTimes;
  onChange: (value: MeetingTimes) => void;
  errors: Record<string, string>;
}

/** Start and length of a meeting, typed in the conference's time and read back in one's own. */
export function MeetingTimeFields({ timeZone, value, onChange, errors }: MeetingTimeFieldsProps) {
  const at = instantOf(value.wall, timeZone);
  return (
    <>
      <TextField
        label="Starts"
        type="datetime-local"
        required
        hint={`In the conference’s time, ${timeZone.replaceAll('_', ' ')}.`}
        error={errors.startsAt}
        value={value.wall}
        onChange={({ target }) => onChange({ ...value, wall: target.value })}
      />
      {at && !clocksAgree(at, timeZone, localZone()) && (
        <p className="label-text" role="status">
          {formatDay(at)}, {formatTime(at)} {zoneName(at)} where you are.
        </p>
      )}
      <TextField
        label="Length in minutes"
        type="number"
        min={5}
        max={480}
        required
        error={errors.minutes}
        value={value.minutes || ''}
        onChange={({ target }) => onChange({ ...value, minutes: target.valueAsNumber || 0 })}
      />
    </>
  );
}
