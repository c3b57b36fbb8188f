import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { ApiProblem } from '@/lib/api/problem';
import { SessionContext } from '@/lib/auth/session';
import { SignInForm } from './sign-in-form';

function show(signIn: (email: string, password: string) => Promise<void>) {
  const rest = { takeToken: async () => {}, signOut: async () => {}, retry: () => {} };
  render(
    <SessionContext value={{ state: { status: 'signed-out' }, signIn, ...rest }}>
      <SignInForm />
    </SessionContext>,
  );
}

async function fillAndSend() {
  await userEvent.type(screen.getByLabelText('E-mail address'), ' chair@kerfside.example ');
  await userEvent.type(screen.getByLabelText('Password'), 'several words long');
  await userEvent.keyboard('{Enter}');
}

it('signs in with what was typed', async () => {
  const given: string[] = [];
  show(async (...both) => void given.push(...both));
  await fillAndSend();
  expect(given).toEqual(['chair@kerfside.example', 'several words long']);
});

it('says how long to wait after too many attempts, and keeps the address', async () => {
  const detail = 'There were too many attempts for this account. Try again in 14 minutes, or set a new password by e-mail.';
  show(async () => {
    throw new ApiProblem(429, 'too-many-attempts', 'Too many attempts', detail);
  });
  await fillAndSend();
  const alert = await screen.findByRole('alert');
  expect(alert).toHaveTextContent('Try again in 14 minutes');
  expect(alert).toHaveFocus();
  expect(screen.getByLabelText('E-mail address')).toHaveValue('chair@kerfside.example');
  expect(screen.getByLabelText('Password')).toHaveValue('');
});
