import type { CaseContent } from '@kerfside/calc/vocabulary/case-content.js';
import type { UseQueryResult } from '@tanstack/react-query';
import { Loaded, TextSkeleton } from '@/components/page-states';
import type { Schemas } from '@/lib/api/types';
import { counted } from '@/lib/units';
import { IdentifierList } from '../identifier-list';
import { ReadinessList, readinessWords } from '../readiness-list';
import { goToPlace } from './go-to-place';
import styles from './edit-case.module.css';

interface ReadinessPanelProps {
  readiness: UseQueryResult<Schemas['ReadinessDto'], Error>;
  identifiers: UseQueryResult<Schemas['IdentifierFindingsDto'], Error>;
  content: CaseContent;
}

/** Beside the form: what is missing, and what looks like an identifier. Folded on narrow screens. */
export function ReadinessPanel({ readiness, identifiers, content }: ReadinessPanelProps) {
  const count = identifiers.data?.items.length ?? 0;
  return (
    <aside className={styles.readiness} aria-label="Readiness">
      <details open={matchMedia('(min-width: 1180px)').matches}>
        <summary>
          <h2>Readiness</h2>
          {readiness.data && <span>{readinessWords(readiness.data)}</span>}
          {count > 0 && <span>{counted(count, 'possible identifier')} in the text.</span>}
        </summary>
        <Loaded query={readiness} skeleton={<TextSkeleton lines={6} />} what="case">
          {(data) => <ReadinessList readiness={data} onGoTo={(section) => goToPlace(section)} />}
        </Loaded>
        <h2>Identifiers</h2>
        <Loaded query={identifiers} skeleton={<TextSkeleton lines={3} />} what="case">
          {({ items }) => <IdentifierList findings={items} content={content} onGoTo={({ section, path }) => goToPlace(section, path)} />}
        </Loaded>
      </details>
    </aside>
  );
}
