import { formatDateTime } from '@/lib/dates';
import type { Ballot, Round } from '../api/get-rounds';
import styles from './ratings.module.css';

/** What I gave in a round; the earlier ones stay on record. */
export function OwnBallots({ round }: { round: Round }) {
  const all = [...(round.mine ? [round.mine] : []), ...[...round.earlier].sort((a, b) => b.revision - a.revision)];
  if (all.length === 0) return null;
  return (
    <details className={styles.record}>
      <summary>
        {round.earlier.length === 0 ? `My rating in round ${round.number}` : `My ratings in round ${round.number}: changed ${times(round.earlier.length)}`}
      </summary>
      <ol>
        {all.map((ballot) => (
          <li key={ballot.revision}>
            <BallotText ballot={ballot} round={round} isNow={ballot === round.mine} />
          </li>
        ))}
      </ol>
    </details>
  );
}

const times = (count: number) => (count === 1 ? 'once' : `${count} times`);

function BallotText({ ballot, round, isNow }: { ballot: Ballot; round: Round; isNow: boolean }) {
  const titleOf = (id: string) => round.options.find((option) => option.id === id)?.title ?? id;
  return (
    <>
      <p className="label-text">
        {isNow ? 'Counts now' : 'Earlier, no longer counted'}, <time dateTime={ballot.at}>{formatDateTime(ballot.at)}</time>
      </p>
      <ul>
        {ballot.ratings.map(({ optionId, value }) => (
          <li key={optionId}>
            <strong className="tabular">{value}</strong> {titleOf(optionId)}
            {ballot.preferredOptionId === optionId && ' (preferred)'}
          </li>
        ))}
      </ul>
      {ballot.reason && <p className={styles.reason}>{ballot.reason}</p>}
    </>
  );
}
