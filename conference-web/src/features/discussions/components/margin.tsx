import { useQuery } from '@tanstack/react-query';
import { useId, useRef, useState } from 'react';
import { TextSkeleton } from '@/components/page-states';
import { caseQuery } from '@/features/cases/api/get-case';
import { membersQuery } from '@/features/conferences/api/list-members';
import { asProblem } from '@/lib/api/problem';
import { roleIn, useMe } from '@/lib/auth/session';
import { counted } from '@/lib/units';
import { type Anchor, anchorWords, countThreads, type ThreadCounts, threadsAt } from '../anchors';
import { type Thread, threadsQuery } from '../api/list-threads';
import { NewThread } from './new-thread';
import { ThreadView } from './thread';
import styles from './margin.module.css';

export interface MarginProps extends Anchor {
  caseId: string;
  /** What it is about, in words, where the anchor alone does not say: 'step 3, liner out'. */
  about?: string;
}

/**
 * What colleagues say about one thing, beside it. All margins of a page share one query. On a narrow screen it folds
 * to a count that opens in place.
 */
export function Margin({ caseId, anchorKind, anchorRef, about }: MarginProps) {
  const anchor = { anchorKind, anchorRef };
  const words = about ?? anchorWords(anchor);
  const query = useQuery(threadsQuery(caseId));
  const { data: found } = useQuery(caseQuery(caseId));
  const [isOpen, setOpen] = useState(false);
  const bodyId = useId();
  const mayWrite = found?.actions.comment ?? false;
  if (!query.data) return <Unread error={query.error} isTop={anchorKind === 'case'} onRetry={() => void query.refetch()} />;
  const threads = threadsAt(query.data.items, anchor, found);
  if (threads.length === 0 && !mayWrite) return null;
  const counts = countThreads(threads);
  return (
    <div className={styles.margin} role="group" aria-label={`Remarks on ${words}`} data-filled={threads.length > 0 || undefined} data-margin>
      {anchorKind === 'case' && <FreshNote threads={query.data.items} />}
      <button type="button" className={styles.fold} data-fold aria-expanded={isOpen} aria-controls={bodyId} onClick={() => setOpen(!isOpen)}>
        {foldWords(counts, mayWrite)}
      </button>
      <div id={bodyId} className={styles.body} data-open={isOpen || undefined}>
        <Threads {...{ caseId, threads, anchor, words, mayWrite }} />
      </div>
    </div>
  );
}

/** Until the threads are here: one place says so, the other margins stay empty. */
function Unread({ error, isTop, onRetry }: { error: Error | null; isTop: boolean; onRetry: () => void }) {
  if (!isTop) return null;
  if (!error) return <TextSkeleton lines={3} />;
  return (
    <div className={styles.margin} role="alert">
      <p className="label-text">The remarks could not be fetched. {asProblem(error).detail}</p>
      <button type="button" className={styles.word} onClick={onRetry}>
        Try again
      </button>
    </div>
  );
}

function foldWords({ remarks, fresh, openQuestions }: ThreadCounts, mayWrite: boolean): string {
  if (remarks === 0) return mayWrite ? 'No remarks yet: write one' : 'No remarks';
  const words = [counted(remarks, 'remark')];
  if (fresh) words.push(`${fresh} new`);
  if (openQuestions) words.push(counted(openQuestions, 'open question'));
  return words.join(', ');
}

interface ThreadsProps {
  caseId: string;
  threads: Thread[];
  anchor: Anchor;
  words: string;
  mayWrite: boolean;
}

function Threads({ caseId, threads, anchor, words, mayWrite }: ThreadsProps) {
  const me = useMe();
  const { data: found } = useQuery(caseQuery(caseId));
  const { data: members } = useQuery({ ...membersQuery(found?.conferenceId ?? ''), enabled: mayWrite && found !== undefined });
  const people = members?.items.map(({ person }) => person).filter(({ id }) => id !== me.id) ?? [];
  const role = found ? roleIn(me, found.conferenceId) : null;
  const mayTidy = role === 'chair' || role === 'coordinator';
  const isPresenter = found?.presenter.id === me.id;
  return (
    <>
      {threads.map((thread) => (
        <ThreadView
          key={thread.id}
          lostAnchor={thread.anchorKind === anchor.anchorKind ? null : LOST[thread.anchorKind] ?? null}
          {...{ caseId, thread, people, mayWrite, mayTidy, isPresenter }}
        />
      ))}
      {mayWrite && <NewThread {...{ caseId, anchor, people }} about={words} mayAsk={!isPresenter} />}
    </>
  );
}

const LOST: Partial<Record<Thread['anchorKind'], string>> = {
  step: 'On a step that is no longer in the plan:',
  image: 'On an image that is no longer in the case:',
};

/** How many are new in the whole case, and the way to the next one. */
function FreshNote({ threads }: { threads: Thread[] }) {
  const { fresh } = countThreads(threads);
  const last = useRef<Element | null>(null);
  const goToNext = () => {
    const all = [...document.querySelectorAll<HTMLElement>('[data-margin] [data-new]')];
    const next = all[(all.indexOf(last.current as HTMLElement) + 1) % all.length];
    if (!next) return;
    last.current = next;
    next.closest('[data-margin]')?.querySelector<HTMLButtonElement>('[data-fold][aria-expanded="false"]')?.click();
    next.tabIndex = -1;
    requestAnimationFrame(() => {
      next.scrollIntoView({ block: 'center' });
      next.focus({ preventScroll: true });
    });
  };
  return (
    <p className={styles.count} role="status">
      {fresh > 0 && (
        <>
          {counted(fresh, 'new remark')} in this case.{' '}
          <button type="button" className={styles.word} onClick={goToNext}>
            Go to the next
          </button>
        </>
      )}
    </p>
  );
}
