import type { ReactNode } from 'react';
import { Caution } from '@/components/caution';
import styles from './figure.module.css';

interface FigureFrameProps {
  name: string;
  children: ReactNode;
  /** Where the figure comes from. */
  definition?: string;
  missing?: string[];
  remarks?: string[];
  cautions?: string[];
}

/** A computed figure: the number, what it rests on, what is missing, and what it can not say. */
export function FigureFrame({ name, children, definition, missing = [], remarks = [], cautions = [] }: FigureFrameProps) {
  return (
    <div className={styles.figure} role="group" aria-label={name}>
      <div className={styles.name}>{name}</div>
      <div className={styles.value}>{children}</div>
      {remarks.map((remark) => (
        <p key={remark} className={styles.remark}>
          {remark}
        </p>
      ))}
      {missing.length > 0 && <p className={styles.remark}>Not known: {missing.join(', ')}.</p>}
      {definition && <p className={styles.definition}>{definition}.</p>}
      <Caution />
      {cautions.length > 0 && (
        <details className={styles.cautions}>
          <summary>Limits of this figure ({cautions.length})</summary>
          <ul>
            {cautions.map((caution) => (
              <li key={caution}>{caution}</li>
            ))}
          </ul>
        </details>
      )}
    </div>
  );
}
