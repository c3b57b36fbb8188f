import { ATTENDANCE_WORDS } from '@kerfside/calc/vocabulary/meetings.js';
import { DISCIPLINE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { Facts } from '@/components/section';
import { byDiscipline } from '../by-discipline';
import type { Meeting } from '../api/get-meeting';

/** Who was there, to read. */
export function AttendanceList({ meeting }: { meeting: Meeting }) {
  const known = meeting.attendance.filter(({ state }) => state !== null);
  if (known.length === 0) return <p className="label-text">Nobody’s attendance was recorded.</p>;
  return (
    <Facts
      facts={byDiscipline(known).map(([discipline, rows]) => [
        DISCIPLINE_WORDS[discipline],
        rows.map(({ person, state }) => `${person.name} (${ATTENDANCE_WORDS[state!].toLowerCase()})`).join(', '),
      ])}
    />
  );
}
