import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { paths } from '@/app/paths';
import { ErrorState, PageSkeleton } from '@/components/page-states';
import { SignInAgain } from '@/features/auth/components/sign-in-again';
import { useSession } from './session';

/** Lets only signed-in people through, and brings them back to where they wanted to go. */
export function RequireSession() {
  const { state, retry } = useSession();
  const location = useLocation();
  switch (state.status) {
    case 'loading':
      return <PageSkeleton />;
    case 'unreachable':
      return <ErrorState isPage error={state.error} onRetry={retry} />;
    case 'signed-out':
      return <Navigate to={paths.signIn(location.pathname + location.search)} replace />;
    case 'ended':
      return (
        <>
          <Outlet />
          <SignInAgain me={state.me} />
        </>
      );
    case 'signed-in':
      return <Outlet />;
  }
}
