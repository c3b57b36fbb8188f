import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { EmptyState } from '@/components/page-states';
import { useTitle } from '@/lib/use-title';

export function Component() {
  useTitle('Not found');
  return (
    <EmptyState isPage title="There is no page at this address" action={<Link to={paths.cases}>Go to the cases</Link>}>
      The address may be mistyped, or the page may have been moved.
    </EmptyState>
  );
}
