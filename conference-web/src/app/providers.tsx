import { Theme } from '@radix-ui/themes';
import { type QueryClient, QueryClientProvider } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { KeysProvider } from '@/components/keys/keys-provider';
import { SessionProvider } from '@/lib/auth/session-provider';
import { useAppearance } from '@/lib/use-appearance';

/** All that every page stands on. */
export function Providers({ client, children }: { client: QueryClient; children: ReactNode }) {
  return (
    <Theme accentColor="bronze" grayColor="sand" radius="small" panelBackground="solid" appearance={useAppearance()}>
      <QueryClientProvider client={client}>
        <SessionProvider>
          <KeysProvider>{children}</KeysProvider>
        </SessionProvider>
      </QueryClientProvider>
    </Theme>
  );
}
