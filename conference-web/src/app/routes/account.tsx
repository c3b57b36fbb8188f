import { DISCIPLINE_WORDS, ROLE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { Page } from '@/components/page';
import { Facts, Section } from '@/components/section';
import { ChangePasswordForm } from '@/features/auth/components/change-password-form';
import { SessionTable } from '@/features/auth/components/session-table';
import { useMe } from '@/lib/auth/session';

export function Component() {
  const me = useMe();
  const roles = me.memberships.map(({ conferenceId, conferenceName, role }) => (
    <div key={conferenceId}>
      {conferenceName}: {ROLE_WORDS[role].toLowerCase()}
    </div>
  ));
  return (
    <Page title="Account" heading="Account">
      <Section title="You">
        <Facts
          facts={[
            ['Name', me.name],
            ['E-mail address', me.email],
            ['Discipline', DISCIPLINE_WORDS[me.discipline]],
            ['Unit', me.unit],
            ['Conferences', roles.length > 0 ? roles : 'None'],
            ...(me.isAdministrator ? [['Installation', 'Administrator'] as [string, string]] : []),
          ]}
        />
        <p className="label-text">An administrator changes these.</p>
      </Section>
      <SessionTable />
      <Section title="Password">
        <ChangePasswordForm />
      </Section>
    </Page>
  );
}
