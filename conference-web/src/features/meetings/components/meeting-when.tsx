import { formatDate, formatDay, formatTime, localZone, zoneName } from '@/lib/dates';
import { clocksAgree } from '../zoned-time';

interface MeetingWhenProps {
  startsAt: string;
  minutes: number;
  timeZone: string;
}

/** When a meeting is by the reader's own clock, with the conference's time beside it where that is another. */
export function MeetingWhen({ startsAt, minutes, timeZone }: MeetingWhenProps) {
  const zone = localZone();
  const end = new Date(new Date(startsAt).getTime() + minutes * 60_000);
  const span = (of: string) => `${formatTime(startsAt, of)}–${formatTime(end, of)}`;
  return (
    <span>
      <time dateTime={startsAt}>
        {formatDay(startsAt, zone)}, {span(zone)}
      </time>
      {!clocksAgree(startsAt, zone, timeZone) && (
        <span className="label-text" style={{ display: 'block' }}>
          {formatDate(startsAt, zone) !== formatDate(startsAt, timeZone) && `${formatDay(startsAt, timeZone)}, `}
          {span(timeZone)} {zoneName(startsAt, timeZone)} at the conference
        </span>
      )}
    </span>
  );
}
