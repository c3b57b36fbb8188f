import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Confirm } from '@/components/confirm';
import { type Column, DataTable } from '@/components/data-table';
import { Loaded, TableSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { deviceWords } from '../device-words';
import { useEndOtherSessions, useEndSession } from '../api/end-sessions';
import { sessionsQuery } from '../api/list-sessions';

type SessionRow = Schemas['SessionDto'];

function EndSession({ session }: { session: SessionRow }) {
  const { mutateAsync } = useEndSession();
  if (session.isCurrent) return null;
  return (
    <Confirm
      title="End this session"
      confirmWord="End session"
      onConfirm={() => mutateAsync(session.id)}
      trigger={
        <Button variant="soft" size="2" data-list-item aria-label={`End session on ${deviceWords(session.device)}`}>
          End
        </Button>
      }
    >
      {deviceWords(session.device)} has to sign in again.
    </Confirm>
  );
}

const columns: Column<SessionRow>[] = [
  {
    key: 'device',
    head: 'Device',
    cell: ({ device, isCurrent }) => <span title={device}>{isCurrent ? <strong>{deviceWords(device)} (this one)</strong> : deviceWords(device)}</span>,
  },
  { key: 'address', head: 'Address', cell: ({ address }) => address },
  { key: 'since', head: 'Signed in', nowrap: true, cell: ({ createdAt }) => <time dateTime={createdAt}>{formatDateTime(createdAt)}</time> },
  { key: 'used', head: 'Last used', nowrap: true, cell: ({ lastUsedAt }) => <time dateTime={lastUsedAt}>{formatDateTime(lastUsedAt)}</time> },
  { key: 'end', head: 'End', fold: 'bare', align: 'right', cell: (session) => (session.isCurrent ? null : <EndSession session={session} />) },
];

/** Where the person is signed in, each to be ended. */
export function SessionTable() {
  const query = useQuery(sessionsQuery());
  const { mutateAsync } = useEndOtherSessions();
  const hasOthers = (query.data?.items.length ?? 0) > 1;
  const endOthers = (
    <Confirm
      title="End all other sessions"
      confirmWord="End sessions"
      onConfirm={() => mutateAsync()}
      trigger={<Button variant="soft">End all others</Button>}
    >
      Every other browser and device has to sign in again.
    </Confirm>
  );
  return (
    <Section title="Sessions" actions={hasOthers && endOthers}>
      <Loaded query={query} skeleton={<TableSkeleton rows={3} columns={4} />}>
        {({ items }) => <DataTable caption="Sessions" columns={columns} rows={items} rowKey={({ id }) => id} />}
      </Loaded>
    </Section>
  );
}
