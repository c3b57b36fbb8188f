import { useQuery } from '@tanstack/react-query';
import { Loaded, TextSkeleton } from '@/components/page-states';
import type { Schemas } from '@/lib/api/types';
import { counted } from '@/lib/units';
import { identifiersQuery } from '../../api/get-identifiers';
import { contentOf } from '../../draft/use-case-draft';
import { goToPlace } from '../edit/go-to-place';
import { IdentifierList } from '../identifier-list';
import { CheckActions } from './sheet-actions';
import styles from './sheet.module.css';

/** For the second person: what the screening found, and what only eyes can find. */
export function CheckView({ found }: { found: Schemas['CaseDto'] }) {
  const query = useQuery(identifiersQuery(found.id));
  return (
    <section className={styles.check} aria-labelledby="check-title">
      <h2 id="check-title">Check for identifiers</h2>
      <p>
        Read the whole sheet below and look at {counted(found.images.length, 'image')} at full width: names, dates and numbers can be burned into the
        picture, and the screening reads text only.
      </p>
      <Loaded query={query} skeleton={<TextSkeleton lines={4} />} what="case">
        {({ items }) => <IdentifierList findings={items} content={contentOf(found)} onGoTo={({ section }) => goToPlace(section)} />}
      </Loaded>
      <div className={styles['check-actions']}>
        <CheckActions found={found} />
      </div>
    </section>
  );
}

/** Where whoever has read to the end decides. */
export const CheckEnd = ({ found }: { found: Schemas['CaseDto'] }) => (
  <div className={styles.check}>
    <strong>End of the sheet</strong>
    <div className={styles['check-actions']}>
      <CheckActions found={found} />
    </div>
  </div>
);
