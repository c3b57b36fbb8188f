import type { Round } from '../api/get-rounds';
import styles from './ratings.module.css';

/** What is rated: the option, and whether it is the presenter's own proposal. */
export function OptionHead({ option }: { option: Round['options'][number] }) {
  return (
    <div className={styles.optionHead}>
      <h3>
        {option.title}
        {option.isProposal && <span className={styles.proposal}>Presenter’s proposal</span>}
      </h3>
      {option.description && <p>{option.description}</p>}
    </div>
  );
}
