import { useInfiniteQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { SelectField } from '@/components/field';
import { Page } from '@/components/page';
import { EmptyState, ErrorState, TableSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import { ShowMore } from '@/components/show-more';
import { type MeetingListFilter, meetingListQuery } from '@/features/meetings/api/list-meetings';
import { ExtraMeeting } from '@/features/meetings/components/extra-meeting';
import { MeetingTable } from '@/features/meetings/components/meeting-table';
import { useMe } from '@/lib/auth/session';

export function Component() {
  const { memberships } = useMe();
  const [address, setAddress] = useSearchParams();
  const chosen = memberships.find(({ conferenceId }) => conferenceId === address.get('conference'))?.conferenceId;
  if (memberships.length === 0)
    return (
      <Page title="Meetings" heading="Meetings">
        <EmptyState title="You are not a member of a conference">Meetings are seen by the members of their conference only.</EmptyState>
      </Page>
    );
  return (
    <Page title="Meetings" heading="Meetings" actions={<ExtraMeeting />}>
      {memberships.length > 1 && (
        <div style={{ maxWidth: 280 }} role="search">
          <SelectField
            label="Conference"
            none="All of mine"
            words={Object.fromEntries(memberships.map(({ conferenceId, conferenceName }) => [conferenceId, conferenceName]))}
            value={chosen ?? ''}
            onChange={({ target }) => setAddress(target.value ? { conference: target.value } : {}, { replace: true, flushSync: true })}
          />
        </div>
      )}
      <Meetings title="Upcoming" when="upcoming" conferenceId={chosen} none="No meeting is planned. A conference’s slot is set under Conferences." />
      <Meetings title="Past" when="past" conferenceId={chosen} none="No meeting has been held yet." />
    </Page>
  );
}

function Meetings({ title, none, ...filter }: MeetingListFilter & { title: string; none: string }) {
  const query = useInfiniteQuery(meetingListQuery(filter));
  const rows = query.data?.pages.flatMap((page) => page.items);
  return (
    <Section title={title}>
      {!rows && (query.error ? <ErrorState error={query.error} onRetry={() => void query.refetch()} /> : <TableSkeleton rows={4} columns={5} />)}
      {rows?.length === 0 && <p className="label-text">{none}</p>}
      {rows && rows.length > 0 && (
        <>
          <MeetingTable caption={`${title} meetings`} rows={rows} />
          <ShowMore query={query} />
        </>
      )}
    </Section>
  );
}
