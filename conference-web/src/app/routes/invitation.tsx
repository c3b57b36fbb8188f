import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { FormProblem } from '@/components/form-problem';
import { invitationQuery } from '@/features/auth/api/get-invitation';
import { AcceptInvitationForm } from '@/features/auth/components/accept-invitation-form';
import { Door } from '@/features/auth/components/door';
import { asProblem } from '@/lib/api/problem';
import { useSession } from '@/lib/auth/session';

export function Component() {
  const { token = '' } = useParams();
  const { state } = useSession();
  const query = useQuery(invitationQuery(token));
  // accepting signs in; somebody already signed in has no use for the form
  if (state.status === 'signed-in') return <Navigate to={paths.cases} replace />;
  const isOver = query.error && [404, 410].includes(asProblem(query.error).status);
  return (
    <Door title="Invitation" after={<Link to={paths.signIn()}>I have an account: sign in</Link>}>
      {isOver ? (
        <FormProblem error={query.error} />
      ) : (
        <Loaded query={query} what="invitation" skeleton={<TextSkeleton lines={5} />}>
          {(invitation) => (
            <>
              <p style={{ lineHeight: 1.5 }}>
                {invitation.unit}
                {invitation.conferences.length > 0 && `; conferences: ${invitation.conferences.join(', ')}`}
              </p>
              <AcceptInvitationForm token={token} invitation={invitation} />
            </>
          )}
        </Loaded>
      )}
    </Door>
  );
}
