import { Button, Flex } from '@radix-ui/themes';
import { useInfiniteQuery } from '@tanstack/react-query';
import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';
import { SelectField } from '@/components/field';
import { Page } from '@/components/page';
import { EmptyState, ErrorState, TableSkeleton } from '@/components/page-states';
import { SearchBox } from '@/components/search-box';
import { ShowMore } from '@/components/show-more';
import { type AuditFilter, auditQuery } from '@/features/audit/api/list-audit';
import { AuditTable } from '@/features/audit/components/audit-table';
import { peopleQuery } from '@/features/people/api/list-people';

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

function readFilter(address: URLSearchParams): AuditFilter {
  const id = (name: string) => (UUID.test(address.get(name) ?? '') ? { [name]: address.get(name)! } : {});
  const action = address.get('action')?.trim();
  return { ...id('personId'), ...id('caseId'), ...(action ? { action } : {}) };
}

export function Component() {
  const [address, setAddress] = useSearchParams();
  const filter = readFilter(address);
  const people = useInfiniteQuery(peopleQuery({}));
  const words = Object.fromEntries(people.data?.pages.flatMap((page) => page.items.map(({ id, name }) => [id, name])) ?? []);
  const change = useCallback(
    (name: keyof AuditFilter, value: string) =>
      setAddress(
        (now) => {
          const next = new URLSearchParams(now);
          if (value) next.set(name, value);
          else next.delete(name);
          return next;
        },
        { replace: true, flushSync: true },
      ),
    [setAddress],
  );
  const showCase = useCallback((caseId: string) => change('caseId', caseId), [change]);
  const searchAction = useCallback((text: string) => change('action', text), [change]);
  return (
    <Page title="Audit" heading="Audit trail">
      <Flex gap="3" wrap="wrap" align="start">
        <div role="search">
          <SearchBox label="Action, such as case.post" value={filter.action ?? ''} onSearch={searchAction} />
        </div>
        <div style={{ minWidth: 200, maxWidth: '100%' }}>
          <SelectField label="Person" none="All" words={words} value={filter.personId ?? ''} onChange={({ target }) => change('personId', target.value)} />
        </div>
        {filter.caseId && (
          <Button variant="soft" mt="5" onClick={() => change('caseId', '')}>
            Show all cases, not one
          </Button>
        )}
      </Flex>
      <Entries filter={filter} onCase={filter.caseId ? undefined : showCase} />
    </Page>
  );
}

function Entries({ filter, onCase }: { filter: AuditFilter; onCase?: (caseId: string) => void }) {
  const query = useInfiniteQuery(auditQuery(filter));
  if (!query.data) {
    if (query.error) return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
    return <TableSkeleton rows={10} columns={6} />;
  }
  const entries = query.data.pages.flatMap((page) => page.items);
  if (entries.length === 0) return <EmptyState title="No entries">Nothing that fits has been done yet.</EmptyState>;
  return (
    <>
      <AuditTable entries={entries} onCase={onCase} />
      <ShowMore query={query} />
    </>
  );
}
