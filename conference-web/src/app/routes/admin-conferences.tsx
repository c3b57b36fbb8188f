import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { Page } from '@/components/page';
import { EmptyState, Loaded, NoPermission, TableSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import { conferencesQuery } from '@/features/conferences/api/list-conferences';
import { ConferenceSettingsForm } from '@/features/conferences/components/conference-settings-form';
import { CreateConference } from '@/features/conferences/components/create-conference';
import { MemberTable } from '@/features/conferences/components/member-table';
import styles from '@/features/conferences/components/conferences.module.css';
import type { Schemas } from '@/lib/api/types';
import { useMe } from '@/lib/auth/session';

export function Component() {
  const { isAdministrator } = useMe();
  const query = useQuery(conferencesQuery());
  return (
    <Page title="Conferences" heading="Conferences" actions={isAdministrator && <CreateConference />}>
      <Loaded query={query} skeleton={<TableSkeleton rows={4} columns={3} />}>
        {({ items }) => <Conferences conferences={items.filter(({ maySetUp }) => maySetUp)} />}
      </Loaded>
    </Page>
  );
}

function Conferences({ conferences }: { conferences: Schemas['ConferenceDto'][] }) {
  const { isAdministrator } = useMe();
  const [address, setAddress] = useSearchParams();
  const open = address.get('open') ?? (conferences.length === 1 ? conferences[0]?.id : null);
  if (conferences.length === 0 && !isAdministrator) return <NoPermission>Conferences are set up by their chair and by administrators.</NoPermission>;
  if (conferences.length === 0)
    return (
      <EmptyState title="No conferences yet" action={<CreateConference />}>
        A conference has members, a slot, a quorum and a consensus rule. Cases are posted to it.
      </EmptyState>
    );
  return conferences.map((conference) => (
    <details
      key={conference.id}
      className={styles.conference}
      open={open === conference.id}
      onToggle={({ currentTarget }) => {
        if (currentTarget.open && open !== conference.id) setAddress({ open: conference.id }, { replace: true });
      }}
    >
      <summary>
        {conference.name}
        <span>{conference.code}</span>
      </summary>
      {open === conference.id && (
        <>
          <MemberTable conferenceId={conference.id} />
          <Section title="Slot and rules">
            <ConferenceSettingsForm conference={conference} />
          </Section>
        </>
      )}
    </details>
  ));
}
