import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { useRequestPasswordReset } from '@/features/auth/api/request-password-reset';
import { Door } from '@/features/auth/components/door';
import { fieldMessages } from '@/lib/api/field-messages';

export function Component() {
  const [email, setEmail] = useState('');
  const request = useRequestPasswordReset();
  const submit = (event: FormEvent) => {
    event.preventDefault();
    request.mutate(email.trim());
  };
  return (
    <Door title="Set a new password" after={<Link to={paths.signIn()}>Back to signing in</Link>}>
      {request.isSuccess ? (
        <p role="status" style={{ lineHeight: 1.5 }}>
          If there is an account for <strong>{email.trim()}</strong>, a mail with a link is on its way. The link works once, and for a limited time.
          Look in the folder for unwanted mail too.
        </p>
      ) : (
        <form onSubmit={submit}>
          <FormProblem error={request.error} shown={['email']} />
          <TextField
            label="E-mail address"
            hint="A link to set a new password is sent to it."
            error={fieldMessages(request.error)['email']}
            type="email"
            autoComplete="username"
            required
            value={email}
            onChange={(event) => setEmail(event.target.value)}
          />
          <Button type="submit" size="3" loading={request.isPending}>
            Send link
          </Button>
        </form>
      )}
    </Door>
  );
}
