import { PersonLine } from '@/components/person-line';
import type { Round } from '../api/get-rounds';
import styles from './ratings.module.css';

/** Why the panel rated as it did, in its own words. */
export function Reasons({ rounds }: { rounds: Round[] }) {
  return rounds.map(({ number, reasons }) =>
    reasons && reasons.length > 0 ? (
      <section key={number} className={styles.reasons} aria-label={`Reasons given in round ${number}`}>
        <h3>Reasons given in round {number}</h3>
        <ul>
          {reasons.map(({ text, person }, index) => (
            <li key={index}>
              <p className={styles.reason}>{text}</p>
              {person && <PersonLine person={person} />}
            </li>
          ))}
        </ul>
      </section>
    ) : null,
  );
}
