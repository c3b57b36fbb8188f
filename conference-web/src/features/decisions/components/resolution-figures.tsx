import { RatingRule } from '@/components/rating-rule/rating-rule';
import { figureWords, verdictWords } from '@/features/ratings/figures-words';
import type { Decision } from '../api/list-decisions-of-case';
import styles from './resolution.module.css';

/** The count: what the panel gave to each option in each round, the chosen option first. */
export function ResolutionFigures({ decision }: { decision: Decision }) {
  const { rounds, content } = decision;
  const options = new Map(rounds.flatMap(({ figures }) => figures.map(({ optionId, title }) => [optionId, title] as const)));
  const ids = [...options.keys()].sort((a, b) => Number(b === content.chosenOptionId) - Number(a === content.chosenOptionId));
  return (
    <section className={styles.part}>
      <h2>The count</h2>
      {ids.length === 0 && <p>No ratings were given.</p>}
      {ids.map((id) => {
        const seen = rounds.flatMap(({ number, figures }) => figures.filter(({ optionId }) => optionId === id).map((found) => ({ ...found, number })));
        return (
          <div key={id} className={styles.option}>
            <h3>
              {options.get(id)}
              {id === content.chosenOptionId && <span> (chosen)</span>}
            </h3>
            <RatingRule title={options.get(id)!} rounds={seen} />
            {seen.map((round) => (
              <p key={round.number} className={styles.small}>
                Round {round.number}: {verdictWords(round)} ({figureWords(round)}
                {round.preferredBy > 0 && `, preferred by ${round.preferredBy}`})
              </p>
            ))}
          </div>
        );
      })}
      {rounds.length > 1 && <p className={styles.small}>Dots in outline: round 1, before the discussion. Filled: round 2, after it. Tall tick: median; bar: range.</p>}
    </section>
  );
}
