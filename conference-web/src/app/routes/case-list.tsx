import { PlusIcon } from '@radix-ui/react-icons';
import { Button } from '@radix-ui/themes';
import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Page } from '@/components/page';
import { EmptyState, ErrorState, TableSkeleton } from '@/components/page-states';
import { ShowMore } from '@/components/show-more';
import { caseListQuery } from '@/features/cases/api/list-cases';
import { CaseFilters } from '@/features/cases/components/case-filters';
import { CaseTable } from '@/features/cases/components/case-table';
import { countFilters } from '@/features/cases/list-state';
import { useListState } from '@/features/cases/use-list-state';
import { useMe } from '@/lib/auth/session';

const NewCase = () => (
  <Button asChild>
    <Link to={paths.newCase}>
      <PlusIcon aria-hidden="true" />
      New case
    </Link>
  </Button>
);

export function Component() {
  const me = useMe();
  const mayPresent = me.memberships.some(({ role }) => role === 'surgeon');
  const { filter, change, sortBy, clear } = useListState();
  return (
    <Page title="Cases" heading="Cases" actions={mayPresent && <NewCase />}>
      {me.memberships.length === 0 ? (
        <EmptyState title="You are not a member of a conference">
          Cases are seen by the members of their conference only. An administrator adds members under Conferences.
        </EmptyState>
      ) : (
        <>
          <CaseFilters filter={filter} onChange={change} onSort={sortBy} />
          <List filter={filter} sortBy={sortBy} clear={clear} mayPresent={mayPresent} />
        </>
      )}
    </Page>
  );
}

type ListProps = Pick<ReturnType<typeof useListState>, 'filter' | 'sortBy' | 'clear'> & { mayPresent: boolean };

function List({ filter, sortBy, clear, mayPresent }: ListProps) {
  const query = useInfiniteQuery(caseListQuery(filter));
  if (!query.data) {
    if (query.error) return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
    return <TableSkeleton rows={10} columns={7} />;
  }
  const items = query.data.pages.flatMap((page) => page.items);
  if (items.length === 0) return <NothingFound isNarrowed={countFilters(filter) > 0 || Boolean(filter.query)} {...{ clear, mayPresent }} />;
  return (
    <div aria-busy={query.isPlaceholderData} style={query.isPlaceholderData ? { opacity: 0.6 } : undefined}>
      <CaseTable items={items} sorting={{ by: filter.sort ?? 'updated', order: filter.order ?? 'desc' }} onSort={sortBy} />
      <ShowMore query={query} />
    </div>
  );
}

function NothingFound({ isNarrowed, clear, mayPresent }: { isNarrowed: boolean; clear: () => void; mayPresent: boolean }) {
  if (isNarrowed)
    return (
      <EmptyState
        title="No case fits"
        action={
          <Button variant="soft" onClick={clear}>
            Show all cases
          </Button>
        }
      >
        The search or a filter leaves nothing over.
      </EmptyState>
    );
  return (
    <EmptyState title="No cases yet" action={mayPresent && <NewCase />}>
      Cases of your conferences stand here once their presenters have posted them and a second person has checked them for identifiers.
    </EmptyState>
  );
}
