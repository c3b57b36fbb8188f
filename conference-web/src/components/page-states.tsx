import { Button } from '@radix-ui/themes';
import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { asProblem } from '@/lib/api/problem';
import styles from './page-states.module.css';

const Loading = ({ children }: { children: ReactNode }) => (
  <div role="status" aria-live="polite">
    <span className="visually-hidden">Loading</span>
    <div aria-hidden="true">{children}</div>
  </div>
);

const Bar = ({ width }: { width?: string }) => <div className={styles.bar} style={width ? { width } : undefined} />;

/** Lines of text that are on their way. */
export function TextSkeleton({ lines = 6 }: { lines?: number }) {
  return (
    <Loading>
      {Array.from({ length: lines }, (_, index) => (
        <Bar key={index} width={['92%', '100%', '87%', '95%', '60%'][index % 5]} />
      ))}
    </Loading>
  );
}

/** Rows of a table that are on their way. */
export function TableSkeleton({ rows = 8, columns = 5 }: { rows?: number; columns?: number }) {
  return (
    <Loading>
      <div className={styles.table}>
        {Array.from({ length: rows }, (_, row) => (
          <div key={row} className={styles.line}>
            {Array.from({ length: columns }, (_, column) => (
              <Bar key={column} />
            ))}
          </div>
        ))}
      </div>
    </Loading>
  );
}

/** A page whose shape is not known yet. */
export function PageSkeleton() {
  return (
    <div className={styles.state} style={{ maxWidth: '72rem' }}>
      <TextSkeleton lines={8} />
    </div>
  );
}

interface StateProps {
  title: string;
  /** Stands for the whole page, so its title is the page's h1. */
  isPage?: boolean;
  children?: ReactNode;
  action?: ReactNode;
}

/** Nothing here: what this is, and the one next thing to do. */
export function EmptyState({ title, isPage, children, action }: StateProps) {
  const Title = isPage ? 'h1' : 'h2';
  return (
    <div className={styles.state}>
      <Title>{title}</Title>
      {children && <p>{children}</p>}
      {action && <div className={styles.row}>{action}</div>}
    </div>
  );
}

export function NoPermission({ isPage, children, action }: Omit<StateProps, 'title'>) {
  return (
    <EmptyState title="You may not see this" isPage={isPage} action={action}>
      {children ?? 'Your role in this conference does not include it. The chair or the coordinator can tell you who may.'}
    </EmptyState>
  );
}

interface ErrorStateProps {
  error: unknown;
  onRetry?: () => void;
  /** 'case', 'meeting': for the words of a 404. */
  what?: string;
  isPage?: boolean;
}

/** What happened, what is safe, what to do. Refusals of access read as such. */
export function ErrorState({ error, onRetry, what, isPage }: ErrorStateProps) {
  const Title = isPage ? 'h1' : 'h2';
  const problem = asProblem(error);
  if (problem.status === 403) return <NoPermission isPage={isPage}>{problem.detail}</NoPermission>;
  if (problem.status === 404)
    return (
      <EmptyState title={what ? `There is no such ${what}` : 'Not found'} isPage={isPage}>
        {problem.detail}
      </EmptyState>
    );
  return (
    <div className={styles.state} role="alert">
      <Title>{problem.title}</Title>
      <p>{problem.detail}</p>
      {onRetry && (
        <Button variant="soft" onClick={onRetry}>
          Try again
        </Button>
      )}
    </div>
  );
}

interface LoadedProps<T> {
  query: UseQueryResult<T, Error>;
  skeleton: ReactNode;
  /** 'case', 'meeting': for the words of a 404. */
  what?: string;
  /** The data is the page: its error is the page's h1. */
  isPage?: boolean;
  children: (data: T) => ReactNode;
}

/** The skeleton, the error, or the page. What is already there stays in view while it is asked for again. */
export function Loaded<T>({ query, skeleton, what, isPage, children }: LoadedProps<T>) {
  if (query.data !== undefined && asStatus(query.error) !== 404 && asStatus(query.error) !== 403) return children(query.data);
  if (query.error) return <ErrorState error={query.error} what={what} isPage={isPage} onRetry={() => void query.refetch()} />;
  return skeleton;
}

const asStatus = (error: unknown) => (error ? asProblem(error).status : null);
