import type { ReactNode } from 'react';
import { useTitle } from '@/lib/use-title';
import styles from './page.module.css';

interface PageProps {
  /** In the browser's tab: nothing clinical. */
  title: string;
  heading?: ReactNode;
  actions?: ReactNode;
  width?: 'narrow' | 'normal' | 'wide';
  children?: ReactNode;
}

/** A page's frame: its title, its one h1 with the actions beside it, and its measure. */
export function Page({ title, heading, actions, width = 'normal', children }: PageProps) {
  useTitle(title);
  const measure = width === 'narrow' ? styles.narrow : width === 'wide' ? styles.wide : '';
  return (
    <div className={`${styles.page} ${measure}`}>
      {heading !== undefined && (
        <div className={styles.head}>
          <h1>{heading}</h1>
          {actions && <div className={`${styles.actions} print-hidden`}>{actions}</div>}
        </div>
      )}
      {children}
    </div>
  );
}
