import { Theme } from '@radix-ui/themes';
import { type QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { type Me, SessionContext } from '@/lib/auth/session';
import { createQueryClient } from '@/lib/query-client';

export const SURGEON: Me = {
  id: '11111111-1111-4111-8111-111111111111',
  name: 'Ada Example',
  email: 'surgeon@kerfside.example',
  discipline: 'revision-surgery',
  unit: 'Invented Hospital',
  isAdministrator: false,
  memberships: [{ conferenceId: 'c0000000-0000-4000-8000-000000000000', conferenceName: 'Hip revision', role: 'surgeon' }],
} as Me;

/** What a page stands on while somebody is signed in. */
export function SignedIn({ children, me = SURGEON, client = createQueryClient() }: { children: ReactNode; me?: Me; client?: QueryClient }) {
  const rest = { signIn: async () => {}, takeToken: async () => {}, signOut: async () => {}, retry: () => {} };
  return (
    <Theme>
      <QueryClientProvider client={client}>
        <SessionContext value={{ state: { status: 'signed-in', me }, ...rest }}>
          <MemoryRouter>{children}</MemoryRouter>
        </SessionContext>
      </QueryClientProvider>
    </Theme>
  );
}
