import { useEffect, useRef } from 'react';
import { asProblem } from '@/lib/api/problem';
import styles from './field.module.css';

interface FormProblemProps {
  error: unknown;
  /** Fields that show their own message; the others' are listed here. */
  shown?: string[];
}

/** What was refused, above the form; takes the focus so that nobody has to look for it. */
export function FormProblem({ error, shown = [] }: FormProblemProps) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (error) box.current?.focus();
  }, [error]);
  if (!error) return null;
  const problem = asProblem(error);
  const others = problem.errors.filter(({ field }) => !shown.includes(field));
  const detail = problem.errors.length > 0 ? null : problem.detail;
  return (
    <div ref={box} className={styles.problem} role="alert" tabIndex={-1}>
      <strong>{problem.title}</strong>
      {detail}
      {others.length > 0 && (
        <ul>
          {others.map(({ field, message }) => (
            <li key={`${field} ${message}`}>{message}</li>
          ))}
        </ul>
      )}
    </div>
  );
}
