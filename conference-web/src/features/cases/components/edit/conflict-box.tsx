import { Button } from '@radix-ui/themes';
import { SECTION_WORDS } from '@kerfside/calc/vocabulary/case.js';
import type { ContentSection } from '@kerfside/calc/vocabulary/case-content.js';
import type { CaseDraft, DraftState } from '../../draft/case-draft';
import { heldDifferences } from '../../draft/merge';
import styles from './edit-case.module.css';

interface ConflictBoxProps {
  section: ContentSection;
  state: DraftState;
  onSettle: CaseDraft['settleConflict'];
}

/** Mine beside theirs, field by field, until the writer chooses. */
export function ConflictBox({ section, state, onSettle }: ConflictBoxProps) {
  const fields = state.held[section];
  if (!fields) return null;
  const apart = heldDifferences(section, fields, state.content, state.base);
  const name = SECTION_WORDS[section];
  return (
    <div className={styles.conflict} role="group" aria-label={`${name}: changed in two places`}>
      <strong>Changed in two places</strong>
      <p>This was also changed elsewhere while you wrote here. Nothing is lost: yours is kept in this browser, theirs is saved and stays in the history.</p>
      <table>
        <thead>
          <tr>
            <th scope="col">Field</th>
            <th scope="col">Mine</th>
            <th scope="col">Theirs</th>
          </tr>
        </thead>
        <tbody>
          {apart.map(({ path, label, from, to }) => (
            <tr key={path}>
              <th scope="row">{label}</th>
              <td>{from ?? <em>nothing</em>}</td>
              <td>{to ?? <em>nothing</em>}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className={styles.choices}>
        <Button type="button" onClick={() => onSettle(section, 'mine')}>
          Keep mine
        </Button>
        <Button type="button" variant="soft" onClick={() => onSettle(section, 'theirs')}>
          Take theirs
        </Button>
      </div>
    </div>
  );
}
