import { useRouteError } from 'react-router-dom';
import { asProblem } from '@/lib/api/problem';
import { ErrorState } from './page-states';

/** A page that failed while it was drawn or fetched. A new version may have replaced its file: loading again helps. */
export function RouteError() {
  return <ErrorState isPage error={asProblem(useRouteError())} onRetry={() => location.reload()} />;
}
