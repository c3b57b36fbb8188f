import { SECTION_WORDS } from '@kerfside/calc/vocabulary/case.js';
import type { ContentSection } from '@kerfside/calc/vocabulary/case-content.js';
import type { ReactNode } from 'react';
import { formatDateTime } from '@/lib/dates';
import type { DraftState } from '../../draft/case-draft';
import { goToPlace } from './go-to-place';
import styles from './edit-case.module.css';

const Notice = ({ children, isGrave = false }: { children: ReactNode; isGrave?: boolean }) => (
  <div className={styles.notice} role={isGrave ? 'alert' : 'status'} data-grave={isGrave || undefined}>
    {children}
  </div>
);

const names = (sections: ContentSection[]) => sections.map((section) => SECTION_WORDS[section]).join(', ');

/** What the writer has to know of the saving, above the form. */
export function DraftNotices({ state, returnRemark }: { state: DraftState; returnRemark: string | null }) {
  const held = Object.keys(state.held) as ContentSection[];
  const { problem, refusals } = state;
  return (
    <>
      {returnRemark && (
        <Notice>
          <strong>Returned by the coordinator</strong>
          <p className={styles.remark}>{returnRemark}</p>
        </Notice>
      )}
      {state.restoredFrom && <Notice>Text from {formatDateTime(state.restoredFrom)} that had not been saved was put back.</Notice>}
      {state.takenOver.length > 0 && <Notice>Changed elsewhere while this page was open, and taken over here: {names(state.takenOver)}.</Notice>}
      {held.length > 0 && (
        <Notice isGrave>
          <strong>Changed in two places: {names(held)}</strong>{' '}
          <button type="button" className={styles.go} onClick={() => goToPlace(held[0]!)}>
            Choose there
          </button>
        </Notice>
      )}
      {problem && (
        <Notice isGrave>
          <strong>Not saved: {problem.title}</strong>
          <p>
            {refusals.length > 0 ? 'The fields are marked. All else is saved.' : problem.detail} What you wrote stays here and in this browser.
          </p>
          {refusals.length > 0 && (
            <ul>
              {refusals.map(({ field, message }) => (
                <li key={`${field} ${message}`}>{message}</li>
              ))}
            </ul>
          )}
        </Notice>
      )}
    </>
  );
}
