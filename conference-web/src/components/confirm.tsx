import { AlertDialog, Button, Flex } from '@radix-ui/themes';
import { type FormEvent, type ReactNode, useState } from 'react';
import { TextAreaField } from './field';
import { FormProblem } from './form-problem';

interface ConfirmProps {
  /** The button that opens it. */
  trigger: ReactNode;
  title: string;
  children?: ReactNode;
  /** Says what happens: 'Withdraw case'. */
  confirmWord: string;
  tone?: 'plain' | 'grave';
  /** Asks for a reason, which must not be empty. */
  reason?: { label: string; hint?: string; maxLength?: number };
  onConfirm: (reason: string) => Promise<unknown>;
}

/** Asks before something that is hard to take back. Stays open with what was typed when it fails. */
export function Confirm({ trigger, title, children, confirmWord, tone = 'plain', reason, onConfirm }: ConfirmProps) {
  const [isOpen, setOpen] = useState(false);
  const [text, setText] = useState('');
  const [error, setError] = useState<unknown>(null);
  const [isBusy, setBusy] = useState(false);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    // React passes it on to a form around the trigger, which is another form
    event.stopPropagation();
    setBusy(true);
    setError(null);
    try {
      await onConfirm(text.trim());
      setOpen(false);
      setText('');
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  return (
    <AlertDialog.Root open={isOpen} onOpenChange={setOpen}>
      <AlertDialog.Trigger>{trigger}</AlertDialog.Trigger>
      <AlertDialog.Content maxWidth="460px">
        <AlertDialog.Title size="4">{title}</AlertDialog.Title>
        <form onSubmit={submit}>
          <AlertDialog.Description size="3" mb="4">
            {children}
          </AlertDialog.Description>
          <FormProblem error={error} />
          {reason && (
            <TextAreaField
              label={reason.label}
              hint={reason.hint}
              maxLength={reason.maxLength}
              required
              value={text}
              onChange={(event) => setText(event.target.value)}
            />
          )}
          <Flex gap="3" justify="end" wrap="wrap">
            <AlertDialog.Cancel>
              <Button type="button" variant="soft" color="gray">
                Cancel
              </Button>
            </AlertDialog.Cancel>
            <Button type="submit" color={tone === 'grave' ? 'red' : undefined} loading={isBusy} disabled={isBusy || (reason && !text.trim())}>
              {confirmWord}
            </Button>
          </Flex>
        </form>
      </AlertDialog.Content>
    </AlertDialog.Root>
  );
}
