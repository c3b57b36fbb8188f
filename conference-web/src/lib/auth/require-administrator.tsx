import { Outlet } from 'react-router-dom';
import { NoPermission } from '@/components/page-states';
import { useMe } from './session';

export function RequireAdministrator() {
  if (!useMe().isAdministrator) return <NoPermission isPage>This page is for the administrators of this installation.</NoPermission>;
  return <Outlet />;
}
