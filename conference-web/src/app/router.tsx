import { createBrowserRouter, Navigate } from 'react-router-dom';
import { RouteError } from '@/components/route-error';
import { RequireAdministrator } from '@/lib/auth/require-administrator';
import { RequireSession } from '@/lib/auth/require-session';
import { PageSkeleton } from '@/components/page-states';
import { AppShell } from './app-shell';
import { paths } from './paths';

/** Each page is a file of routes/ that exports `Component`, fetched when it is first opened. */
export const createRouter = () =>
  createBrowserRouter([
    {
      ErrorBoundary: RouteError,
      HydrateFallback: PageSkeleton,
      children: [
        { path: '/sign-in', lazy: () => import('./routes/sign-in') },
        { path: '/forgot-password', lazy: () => import('./routes/forgot-password') },
        { path: '/reset-password/:token', lazy: () => import('./routes/reset-password') },
        { path: '/invitation/:token', lazy: () => import('./routes/invitation') },
        {
          Component: RequireSession,
          children: [
            // always dark and full size, so outside the shell
            { path: '/cases/:id/images/:imageId', lazy: () => import('./routes/image-room') },
            {
              Component: AppShell,
              children: [
                {
                  ErrorBoundary: RouteError,
                  children: [
                    { path: '/', element: <Navigate to={paths.cases} replace /> },
                    { path: '/cases', lazy: () => import('./routes/case-list') },
                    { path: '/cases/new', lazy: () => import('./routes/new-case') },
                    { path: '/cases/:id', lazy: () => import('./routes/case') },
                    { path: '/cases/:id/edit', lazy: () => import('./routes/edit-case') },
                    { path: '/cases/:id/history', lazy: () => import('./routes/case-history') },
                    { path: '/cases/:id/outcome', lazy: () => import('./routes/case-outcome') },
                    { path: '/meetings', lazy: () => import('./routes/meeting-list') },
                    { path: '/meetings/:id', lazy: () => import('./routes/meeting') },
                    { path: '/meetings/:id/run', lazy: () => import('./routes/run-meeting') },
                    { path: '/decisions', lazy: () => import('./routes/decision-list') },
                    { path: '/decisions/:id', lazy: () => import('./routes/decision') },
                    { path: '/account', lazy: () => import('./routes/account') },
                    // a chair sets up the own conference
                    { path: '/admin/conferences', lazy: () => import('./routes/admin-conferences') },
                    {
                      path: '/admin',
                      Component: RequireAdministrator,
                      children: [
                        { path: 'people', lazy: () => import('./routes/admin-people') },
                        { path: 'mail', lazy: () => import('./routes/admin-mail') },
                        { path: 'audit', lazy: () => import('./routes/admin-audit') },
                      ],
                    },
                    { path: '*', lazy: () => import('./routes/not-found') },
                  ],
                },
              ],
            },
          ],
        },
      ],
    },
  ]);
