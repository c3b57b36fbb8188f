import { Dialog } from '@radix-ui/themes';
import type { Me } from '@/lib/auth/session';
import { SignInForm } from './sign-in-form';

/** Over the page, which keeps what was typed in it, when the session has ended. */
export function SignInAgain({ me }: { me: Me }) {
  return (
    <Dialog.Root open>
      <Dialog.Content maxWidth="400px" onEscapeKeyDown={(event) => event.preventDefault()} onInteractOutside={(event) => event.preventDefault()}>
        <Dialog.Title size="4">Sign in again</Dialog.Title>
        <Dialog.Description size="2" mb="4">
          Your session has ended. What you have typed on this page is still there.
        </Dialog.Description>
        <SignInForm email={me.email} />
      </Dialog.Content>
    </Dialog.Root>
  );
}
