import { Button, Dialog, Flex } from '@radix-ui/themes';
import { type FormEvent, useRef, useState } from 'react';
import { TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import { useMe } from '@/lib/auth/session';
import type { Decision } from '../api/list-decisions-of-case';
import { useSignDecision } from '../api/sign-decision';
import type { DraftSaver } from '../draft-saver';
import styles from './decisions.module.css';

interface SignDecisionProps {
  draft: Decision;
  saver: DraftSaver;
  /** What is still to be done first. */
  lacks: string[];
}

/** Opens only when everything typed is saved, so that what is signed is what was read. */
export function SignDecision({ draft, saver, lacks }: SignDecisionProps) {
  const [isOpen, setOpen] = useState(false);
  const [isSaving, setSaving] = useState(false);
  const open = async () => {
    setSaving(true);
    const isSaved = await saver.saveNow();
    setSaving(false);
    setOpen(isSaved);
  };
  return (
    <>
      {lacks.length > 0 && (
        <div className={styles.lacks}>
          <p>Before it can be signed:</p>
          <ul>
            {lacks.map((lack) => (
              <li key={lack}>{lack}</li>
            ))}
          </ul>
        </div>
      )}
      <Button type="button" size="3" loading={isSaving} disabled={isSaving || lacks.length > 0} onClick={() => void open()}>
        Sign {draft.kind === 'advice' ? 'advice' : 'decision'}
      </Button>
      <Dialog.Root open={isOpen} onOpenChange={setOpen}>
        <Dialog.Content maxWidth="480px" onInteractOutside={(event) => event.preventDefault()}>
          <Dialog.Title size="4">Sign this {draft.kind}</Dialog.Title>
          <Dialog.Description size="3" mb="3">
            Signing gives it the next number of {draft.conferenceName} and fixes the text, the panel’s figures, who was present and the dissent under one
            fingerprint. Nobody can change it afterwards; an amendment is a new version that says why. All members are told by e-mail.
          </Dialog.Description>
          {draft.kind === 'advice' && <p className={styles.advice}>The quorum is not met, so it will be an advice.</p>}
          <SignForm draft={draft} saver={saver} onClose={() => setOpen(false)} />
        </Dialog.Content>
      </Dialog.Root>
    </>
  );
}

function SignForm({ draft, saver, onClose }: { draft: Decision; saver: DraftSaver; onClose: () => void }) {
  const me = useMe();
  const [password, setPassword] = useState('');
  const sign = useSignDecision(draft.caseId);
  // a second press must not send a second signature while the first is on its way
  const isSending = useRef(false);
  const field = useRef<HTMLInputElement>(null);
  const wrong = fieldMessages(sign.error)['password'];
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    event.stopPropagation();
    if (isSending.current) return;
    isSending.current = true;
    try {
      await sign.mutateAsync({ baseRevision: saver.getRevision(), password });
      onClose();
    } catch {
      // said in the form
      setPassword('');
      field.current?.focus();
    } finally {
      isSending.current = false;
    }
  };
  return (
    <form onSubmit={(event) => void submit(event)}>
      {!wrong && <FormProblem error={sign.error} />}
      <input type="hidden" name="username" autoComplete="username" value={me.email} />
      <TextField
        label={`Password of ${me.name}`}
        type="password"
        autoComplete="current-password"
        required
        error={wrong}
        ref={field}
        value={password}
        onChange={(event) => setPassword(event.target.value)}
      />
      <Flex gap="3" justify="end" wrap="wrap">
        <Button type="button" variant="soft" color="gray" onClick={onClose}>
          Cancel
        </Button>
        <Button type="submit" loading={sign.isPending} disabled={sign.isPending || !password}>
          Sign {draft.kind === 'advice' ? 'advice' : 'decision'}
        </Button>
      </Flex>
    </form>
  );
}
