import { Fragment, type ReactNode, useId } from 'react';
import styles from './section.module.css';

/** A part of a page under its own h2. */
export function Section({ title, actions, children }: { title: ReactNode; actions?: ReactNode; children: ReactNode }) {
  const id = useId();
  return (
    <section className={styles.section} aria-labelledby={id}>
      <div className={styles.head}>
        <h2 id={id}>{title}</h2>
        {actions && <div className="print-hidden">{actions}</div>}
      </div>
      {children}
    </section>
  );
}

/** Names and what stands beside them. */
export function Facts({ facts }: { facts: [name: string, value: ReactNode][] }) {
  return (
    <dl className={styles.facts}>
      {facts.map(([name, value]) => (
        <Fragment key={name}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </Fragment>
      ))}
    </dl>
  );
}
