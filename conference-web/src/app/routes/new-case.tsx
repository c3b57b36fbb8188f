import { Page } from '@/components/page';
import { NoPermission } from '@/components/page-states';
import { NewCaseForm } from '@/features/cases/components/new-case-form';
import { useMe } from '@/lib/auth/session';

export function Component() {
  const conferences = useMe().memberships.filter(({ role }) => role === 'surgeon');
  return (
    <Page title="New case" heading="Begin a case" width="narrow">
      {conferences.length > 0 ? (
        <NewCaseForm conferences={conferences} />
      ) : (
        <NoPermission>Cases are presented by surgeons of a conference. The administrator can give you that role.</NoPermission>
      )}
    </Page>
  );
}
