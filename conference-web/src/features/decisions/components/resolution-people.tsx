import { DISCIPLINE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { counted } from '@/lib/units';
import type { Decision } from '../api/list-decisions-of-case';
import { attendeeWords, presentByDiscipline } from '../present';
import styles from './resolution.module.css';

/** Who was there, by discipline. */
export function Present({ decision }: { decision: Decision }) {
  const { attendance, quorumMissing } = decision;
  return (
    <section className={styles.part}>
      <h2>Present</h2>
      {attendance.length === 0 ? (
        <p>No attendance was recorded.</p>
      ) : (
        <dl className={styles.present}>
          {presentByDiscipline(attendance).map(({ discipline, people }) => (
            <div key={discipline}>
              <dt>{discipline}</dt>
              <dd>
                {people.map((person) => (
                  <span key={person.name}>{attendeeWords(person)}</span>
                ))}
              </dd>
            </div>
          ))}
        </dl>
      )}
      <p className={styles.small}>
        {counted(attendance.length, 'person', 'people')} present or remote. Quorum {quorumMissing.length === 0 ? 'met' : `not met: lacking ${quorumMissing.join('; ')}`}.
      </p>
    </section>
  );
}

/** In the dissenters' own words. */
export function Dissent({ decision }: { decision: Decision }) {
  const { content, dissenters } = decision;
  return (
    <section className={styles.part}>
      <h2>Dissent</h2>
      {content.dissent.length === 0 && <p>None recorded.</p>}
      {content.dissent.map(({ personId, words }) => {
        const person = dissenters.find(({ id }) => id === personId);
        return (
          <blockquote key={personId} className={styles.dissent}>
            <p>{words}</p>
            <footer>{person ? `${person.name}, ${DISCIPLINE_WORDS[person.discipline].toLowerCase()}, ${person.unit}` : 'A member of the panel'}</footer>
          </blockquote>
        );
      })}
    </section>
  );
}
