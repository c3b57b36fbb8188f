import { ATTENDANCE_STATES, ATTENDANCE_WORDS, type AttendanceState } from '@kerfside/calc/vocabulary/meetings.js';
import { DISCIPLINE_WORDS, RATING_ROLES, type Role, ROLE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { FormProblem } from '@/components/form-problem';
import { Section } from '@/components/section';
import { counted } from '@/lib/units';
import type { Meeting } from '../api/get-meeting';
import { useSetAttendance } from '../api/run-meeting';
import { byDiscipline } from '../by-discipline';
import styles from './run.module.css';

const isHere = (state: AttendanceState | null) => state === 'present' || state === 'remote';

/** What the quorum still lacks, in words. */
export function quorumWords({ quorum }: Pick<Meeting, 'quorum'>): string {
  return quorum.met ? 'Quorum met' : `No quorum: ${quorum.missing.join('; ')}`;
}

/** Who is here, by discipline; ticked by chair or coordinator, read by all others. */
export function AttendancePanel({ meeting }: { meeting: Meeting }) {
  const { mutate, error } = useSetAttendance(meeting.id);
  const here = meeting.attendance.filter(({ state }) => isHere(state)).length;
  return (
    <Section title={`Attendance: ${here} of ${meeting.attendance.length}`}>
      <p role="status" className={styles.quorum} data-met={meeting.quorum.met || undefined}>
        {quorumWords(meeting)}.
      </p>
      <FormProblem error={error} />
      {byDiscipline(meeting.attendance).map(([discipline, rows]) => (
        <div key={discipline} className={styles.discipline} role="group" aria-label={DISCIPLINE_WORDS[discipline]}>
          <h3>
            {DISCIPLINE_WORDS[discipline]}
            <span>{counted(rows.filter(({ state }) => isHere(state)).length, 'here', 'here')}</span>
          </h3>
          <ul>
            {rows.map((row) => (
              <li key={row.person.id}>
                <Member row={row} />
                <AttendanceChoice
                  row={row}
                  isFixed={!meeting.actions.writeAttendance || !(row.role in ROLE_WORDS)}
                  onChange={(state) => mutate({ personId: row.person.id, state })}
                />
              </li>
            ))}
          </ul>
        </div>
      ))}
    </Section>
  );
}

type Row = Meeting['attendance'][number];

function Member({ row }: { row: Row }) {
  const role = row.role as Role;
  const word = ROLE_WORDS[role] ?? 'No longer a member';
  const counts = RATING_ROLES.includes(role);
  return (
    <span className={styles.member}>
      {row.person.name}
      <span>
        {word}
        {counts ? '' : ', not counted'}
      </span>
    </span>
  );
}

interface ChoiceProps {
  row: Row;
  isFixed: boolean;
  onChange: (state: AttendanceState | null) => void;
}

function AttendanceChoice({ row, isFixed, onChange }: ChoiceProps) {
  if (isFixed) return <span className="label-text">{row.state ? ATTENDANCE_WORDS[row.state] : 'Not noted'}</span>;
  return (
    <span className={styles.choice} role="group" aria-label={row.person.name}>
      {ATTENDANCE_STATES.map((state) => (
        <button key={state} type="button" aria-pressed={row.state === state} onClick={() => onChange(row.state === state ? null : state)}>
          {ATTENDANCE_WORDS[state]}
        </button>
      ))}
    </span>
  );
}
