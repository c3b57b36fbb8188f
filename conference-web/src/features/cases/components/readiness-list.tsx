import { READINESS_WEIGHTS, type ReadinessWeight } from '@kerfside/calc/cases/readiness.js';
import { SECTION_WORDS, type Section } from '@kerfside/calc/vocabulary/case.js';
import type { Schemas } from '@/lib/api/types';
import styles from './lists.module.css';

const WEIGHT_WORDS: Record<ReadinessWeight, string> = {
  'blocks-posting': 'Needed to post',
  'blocks-listing': 'Needed for an agenda',
  advice: 'Better with it',
};

interface ReadinessListProps {
  readiness: Schemas['ReadinessDto'];
  /** Leads to the section; without it the section is only named. */
  onGoTo?: (section: Section) => void;
}

/** What blocks, what is missing, and what is there. */
export function ReadinessList({ readiness, onGoTo }: ReadinessListProps) {
  const done = readiness.items.filter((item) => item.done);
  return (
    <div className={styles.list}>
      {READINESS_WEIGHTS.map((weight) => {
        const missing = readiness.items.filter((item) => !item.done && item.weight === weight);
        if (missing.length === 0) return null;
        return (
          <div key={weight}>
            <p className={styles.weight}>
              {WEIGHT_WORDS[weight]} ({missing.length})
            </p>
            <ul>
              {missing.map((item) => (
                <li key={item.id} data-blocks={weight === 'blocks-posting' || undefined}>
                  {onGoTo ? (
                    <button type="button" className={styles.link} onClick={() => onGoTo(item.section)}>
                      {item.label}
                    </button>
                  ) : (
                    <strong>{item.label}</strong>
                  )}
                  <span className={styles.remedy}>
                    {SECTION_WORDS[item.section]}: {item.remedy}
                  </span>
                </li>
              ))}
            </ul>
          </div>
        );
      })}
      <details>
        <summary>
          There ({done.length} of {readiness.items.length})
        </summary>
        <ul>
          {done.map((item) => (
            <li key={item.id} data-done>
              {item.label}
            </li>
          ))}
        </ul>
      </details>
    </div>
  );
}

/** Where the case stands, in a line. */
export function readinessWords({ items, canBePosted, canBeListed }: Schemas['ReadinessDto']): string {
  const blocks = items.filter((item) => !item.done && item.weight === 'blocks-posting').length;
  if (!canBePosted) return `${blocks} ${blocks === 1 ? 'thing is' : 'things are'} needed before it can be posted.`;
  return canBeListed ? 'Nothing blocks.' : 'It can be posted. More is needed before it comes on an agenda.';
}
