import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { useSession } from '@/lib/auth/session';

/** E-mail and password. A refusal keeps the address and clears nothing but the password. */
export function SignInForm({ email: knownEmail = '', onDone }: { email?: string; onDone?: () => void }) {
  const { signIn } = useSession();
  const [email, setEmail] = useState(knownEmail);
  const [password, setPassword] = useState('');
  const [error, setError] = useState<unknown>(null);
  const [isBusy, setBusy] = useState(false);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setBusy(true);
    setError(null);
    try {
      await signIn(email.trim(), password);
      onDone?.();
    } catch (problem) {
      setError(problem);
      setPassword('');
    } finally {
      setBusy(false);
    }
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={error} />
      <TextField label="E-mail address" type="email" autoComplete="username" required value={email} onChange={(event) => setEmail(event.target.value)} />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        required
        value={password}
        onChange={(event) => setPassword(event.target.value)}
      />
      <Button type="submit" size="3" loading={isBusy}>
        Sign in
      </Button>
    </form>
  );
}
