import type { ReactNode } from 'react';
import { Mark } from '@/components/mark';
import { useTitle } from '@/lib/use-title';
import styles from './door.module.css';

/** The frame of the pages that need no session. */
export function Door({ title, children, after }: { title: string; children: ReactNode; after?: ReactNode }) {
  useTitle(title);
  return (
    <main className={styles.door}>
      <div className={styles.box}>
        <div className={styles.name}>
          <Mark size={34} />
          Kerfside
        </div>
        <p className={styles.about}>Revision cases, discussed and decided by the conference.</p>
        <h1>{title}</h1>
        {children}
        {after && <div className={styles.after}>{after}</div>}
      </div>
    </main>
  );
}
