import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import { useMe } from '@/lib/auth/session';
import { useChangePassword } from '../api/change-password';
import { NewPasswordField } from './new-password-field';

export function ChangePasswordForm() {
  const me = useMe();
  const [current, setCurrent] = useState('');
  const [next, setNext] = useState('');
  const change = useChangePassword();
  const fields = fieldMessages(change.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    change.mutate(
      { current, next },
      {
        onSuccess: () => {
          setCurrent('');
          setNext('');
        },
      },
    );
  };
  return (
    <form onSubmit={submit} style={{ maxWidth: 420 }}>
      <FormProblem error={change.error} shown={['current', 'next']} />
      {change.isSuccess && <p role="status">Your password is changed. Other sessions have been ended.</p>}
      {/* password managers need the name beside the password */}
      <input type="hidden" name="username" autoComplete="username" value={me.email} />
      <TextField
        label="Present password"
        error={fields['current']}
        type="password"
        autoComplete="current-password"
        required
        value={current}
        onChange={(event) => setCurrent(event.target.value)}
      />
      <NewPasswordField label="New password" value={next} onChange={setNext} error={fields['next']} />
      <Button type="submit" loading={change.isPending}>
        Change password
      </Button>
    </form>
  );
}
