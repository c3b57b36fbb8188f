import type { CaseContent } from '@kerfside/calc/vocabulary/case-content.js';
import { NotKnown, Paragraphs } from './known';
import { SheetSection } from './sheet-row';
import styles from './sheet.module.css';

export function OptionsSection({ options }: Pick<CaseContent, 'options'>) {
  const all = options.options ?? [];
  return (
    <SheetSection section="options">
      {all.length === 0 && (
        <p>
          <NotKnown>No option has been written yet.</NotKnown>
        </p>
      )}
      <ol className={styles.options}>
        {all.map(({ id, title, description, isProposal }) => (
          <li key={id}>
            <strong>{title || <NotKnown>no title</NotKnown>}</strong>
            {isProposal && <span className={styles.proposal}>presenter’s proposal</span>}
            <Paragraphs text={description} />
          </li>
        ))}
      </ol>
    </SheetSection>
  );
}
