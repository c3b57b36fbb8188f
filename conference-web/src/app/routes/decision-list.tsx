import { useInfiniteQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { SelectField } from '@/components/field';
import { Page } from '@/components/page';
import { EmptyState, ErrorState, TableSkeleton } from '@/components/page-states';
import { ShowMore } from '@/components/show-more';
import { decisionListQuery } from '@/features/decisions/api/list-decisions';
import { DecisionTable } from '@/features/decisions/components/decision-table';
import { useMe } from '@/lib/auth/session';

export function Component() {
  const { memberships } = useMe();
  const [search, setSearch] = useSearchParams();
  const wanted = search.get('conference');
  const chosen = memberships.find(({ conferenceId }) => conferenceId === wanted) ?? memberships[0];
  return (
    <Page title="Decisions" heading="Decisions">
      {!chosen ? (
        <EmptyState title="You are not a member of a conference">Decisions are seen by the members of their conference only.</EmptyState>
      ) : (
        <>
          {memberships.length > 1 && (
            <div style={{ maxWidth: 340 }}>
              <SelectField
                label="Conference"
                words={Object.fromEntries(memberships.map(({ conferenceId, conferenceName }) => [conferenceId, conferenceName]))}
                value={chosen.conferenceId}
                onChange={(event) => setSearch({ conference: event.target.value }, { replace: true, flushSync: true })}
              />
            </div>
          )}
          <List conferenceId={chosen.conferenceId} />
        </>
      )}
    </Page>
  );
}

function List({ conferenceId }: { conferenceId: string }) {
  const query = useInfiniteQuery(decisionListQuery(conferenceId));
  if (!query.data) {
    if (query.error) return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
    return <TableSkeleton rows={6} columns={5} />;
  }
  const items = query.data.pages.flatMap((page) => page.items);
  if (items.length === 0)
    return <EmptyState title="No decisions yet">What the conference decides stands here once the chair has signed it at a meeting.</EmptyState>;
  return (
    <>
      <DecisionTable items={items} />
      <ShowMore query={query} />
    </>
  );
}
