import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { useAcceptInvitation } from '../api/accept-invitation';
import { NewPasswordField } from './new-password-field';

/** The name as it will stand beside all that the person writes, and a password. */
export function AcceptInvitationForm({ token, invitation }: { token: string; invitation: Schemas['InvitationDto'] }) {
  const [name, setName] = useState(invitation.name);
  const [password, setPassword] = useState('');
  const accept = useAcceptInvitation(token);
  const fields = fieldMessages(accept.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    accept.mutate({ name: name.trim(), password });
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={accept.error} shown={['name', 'password']} />
      <TextField label="E-mail address" type="email" autoComplete="username" value={invitation.email} readOnly />
      <TextField
        label="Your name"
        hint="As colleagues shall read it."
        error={fields['name']}
        autoComplete="name"
        maxLength={120}
        required
        value={name}
        onChange={(event) => setName(event.target.value)}
      />
      <NewPasswordField label="Password" value={password} onChange={setPassword} error={fields['password']} />
      <Button type="submit" size="3" loading={accept.isPending}>
        Accept and sign in
      </Button>
    </form>
  );
}
