import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { FormProblem } from '@/components/form-problem';
import { useConfirmPasswordReset } from '@/features/auth/api/confirm-password-reset';
import { Door } from '@/features/auth/components/door';
import { NewPasswordField } from '@/features/auth/components/new-password-field';
import { fieldMessages } from '@/lib/api/field-messages';

export function Component() {
  const { token = '' } = useParams();
  const [password, setPassword] = useState('');
  const confirm = useConfirmPasswordReset(token);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    confirm.mutate(password);
  };
  if (confirm.isSuccess)
    return (
      <Door title="Your new password is set" after={<Link to={paths.signIn()}>Sign in</Link>}>
        <p role="status" style={{ lineHeight: 1.5 }}>
          All sessions that were open have been ended. Sign in with the new password.
        </p>
      </Door>
    );
  return (
    <Door title="Set a new password" after={<Link to={paths.forgotPassword}>Ask for another link</Link>}>
      <form onSubmit={submit}>
        <FormProblem error={confirm.error} shown={['password']} />
        <NewPasswordField label="New password" value={password} onChange={setPassword} error={fieldMessages(confirm.error)['password']} />
        <Button type="submit" size="3" loading={confirm.isPending}>
          Set password
        </Button>
      </form>
    </Door>
  );
}
