import { useInfiniteQuery } from '@tanstack/react-query';
import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';
import { Page } from '@/components/page';
import { EmptyState, ErrorState, TableSkeleton } from '@/components/page-states';
import { SearchBox } from '@/components/search-box';
import { Section } from '@/components/section';
import { ShowMore } from '@/components/show-more';
import { peopleQuery } from '@/features/people/api/list-people';
import { InvitePerson } from '@/features/people/components/invite-person';
import { PeopleTable } from '@/features/people/components/people-table';
import { UnitTable } from '@/features/people/components/unit-table';
import styles from '@/features/people/components/people.module.css';

export function Component() {
  const [address, setAddress] = useSearchParams();
  const text = address.get('query') ?? '';
  const search = useCallback((query: string) => setAddress(query ? { query } : {}, { replace: true }), [setAddress]);
  return (
    <Page title="People" heading="People and units" actions={<InvitePerson />}>
      <Section title="People">
        <div role="search" className={styles.toolbar}>
          <SearchBox label="Name or e-mail address" value={text} onSearch={search} />
        </div>
        <List text={text} />
      </Section>
      <UnitTable />
    </Page>
  );
}

function List({ text }: { text: string }) {
  const query = useInfiniteQuery(peopleQuery(text ? { query: text } : {}));
  if (!query.data) {
    if (query.error) return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
    return <TableSkeleton rows={8} columns={5} />;
  }
  const people = query.data.pages.flatMap((page) => page.items);
  if (people.length === 0) return <EmptyState title="Nobody fits">No name or e-mail address has “{text}” in it.</EmptyState>;
  return (
    <>
      <PeopleTable people={people} />
      <ShowMore query={query} />
    </>
  );
}
