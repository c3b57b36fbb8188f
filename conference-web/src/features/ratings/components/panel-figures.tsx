import { RatingRule } from '@/components/rating-rule/rating-rule';
import type { Round } from '../api/get-rounds';
import { figuresOf, figureWords, verdictWords } from '../figures-words';
import { OptionHead } from './option-head';
import styles from './ratings.module.css';

/** The options as they were rated last, each with the figures of every round that may be seen. */
export function PanelFigures({ rounds, numbering }: { rounds: Round[]; numbering: Round }) {
  return (
    <ol className={styles.options}>
      {numbering.options.map((option) => {
        const seen = figuresOf(rounds, option.id);
        const mine = numbering.mine?.ratings.find(({ optionId }) => optionId === option.id)?.value ?? null;
        return (
          <li key={option.id}>
            <OptionHead option={option} />
            <RatingRule title={option.title} rounds={seen} mine={mine} />
            <FigureLines figures={seen} />
          </li>
        );
      })}
    </ol>
  );
}

/** The figures of an option, a line for each round. */
export function FigureLines({ figures }: { figures: ReturnType<typeof figuresOf> }) {
  return figures.map((round) => (
    <p key={round.number} className={styles.figures}>
      <strong>Round {round.number}:</strong> {verdictWords(round)}
      <span className="label-text tabular">
        {' '}
        ({figureWords(round)}
        {round.preferredBy > 0 && `, preferred by ${round.preferredBy}`})
      </span>
    </p>
  ));
}
