import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Door } from '@/features/auth/components/door';
import { SignInForm } from '@/features/auth/components/sign-in-form';
import { useSession } from '@/lib/auth/session';

/** Only an address of this application: `//elsewhere` would leave it. */
const safeNext = (next: string | null) => (next && /^\/(?![/\\])/.test(next) ? next : paths.cases);

export function Component() {
  const { state } = useSession();
  const [search] = useSearchParams();
  if (state.status === 'signed-in') return <Navigate to={safeNext(search.get('next'))} replace />;
  return (
    <Door title="Sign in" after={<Link to={paths.forgotPassword}>Forgotten your password?</Link>}>
      <SignInForm />
    </Door>
  );
}
