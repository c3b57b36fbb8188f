import type { RichText as RichTextContent } from '@kerfside/calc/vocabulary/discussions.js';
import { Button, Flex } from '@radix-ui/themes';
import { type FormEvent, type ReactNode, useRef, useState } from 'react';
import { Confirm } from '@/components/confirm';
import { Editor } from '@/components/editor/editor';
import type { Mentionable } from '@/components/editor/editor-props';
import { FormProblem } from '@/components/form-problem';
import { useKept } from '@/lib/use-kept';
import styles from './margin.module.css';

interface ComposerProps {
  /** Under this name the unsent text is kept in the browser. */
  name: string;
  label: string;
  sendWord: string;
  people: Mentionable[];
  placeholder?: string;
  /** The text to begin with, where nothing is kept. */
  initial?: RichTextContent | null;
  /** More of the form, between text and buttons. */
  children?: ReactNode;
  onSend: (content: RichTextContent) => Promise<unknown>;
  /** After sending, and when the person closes it; `false`: the text is kept. */
  onClose: (wasSent: boolean) => void;
}

interface Draft {
  content: RichTextContent | null;
  isEmpty: boolean;
}

/** The editor with its buttons. What is typed is kept at every key, and stays when sending fails. */
export function Composer({ name, label, sendWord, people, placeholder, initial = null, children, onSend, onClose }: ComposerProps) {
  const { value: draft, wasKept, set, forget } = useKept<Draft>(`remark:${name}`, { content: initial, isEmpty: initial === null });
  const [error, setError] = useState<unknown>(null);
  const [isBusy, setBusy] = useState(false);
  const isSending = useRef(false);

  const send = async () => {
    if (isSending.current || draft.isEmpty || !draft.content) return;
    isSending.current = true;
    setBusy(true);
    setError(null);
    try {
      await onSend(draft.content);
      forget({ content: null, isEmpty: true });
      onClose(true);
    } catch (problem) {
      setError(problem);
    } finally {
      isSending.current = false;
      setBusy(false);
    }
  };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    // a dialog's form stands elsewhere on the page, but its events pass through here
    if (event.target === event.currentTarget) void send();
  };
  const discard = () => {
    forget({ content: null, isEmpty: true });
    onClose(false);
  };
  return (
    <form className={styles.composer} onSubmit={submit}>
      <Editor
        label={label}
        content={draft.content}
        people={people}
        placeholder={placeholder}
        autoFocus={!wasKept}
        onChange={(content, isEmpty) => set({ content, isEmpty })}
        onSend={() => void send()}
      />
      {wasKept && <p className="label-text">Kept from before: not sent yet.</p>}
      {children}
      {error !== null && (
        <>
          <FormProblem error={error} />
          <p className="label-text">Your text is kept here. Send it again when you are ready.</p>
        </>
      )}
      <Flex gap="2" wrap="wrap" justify="end" mt="2">
        {draft.isEmpty ? (
          <Button type="button" variant="ghost" color="gray" className={styles.quiet} onClick={discard}>
            Close
          </Button>
        ) : (
          <Confirm
            title="Discard what you wrote"
            confirmWord="Discard text"
            tone="grave"
            onConfirm={async () => discard()}
            trigger={
              <Button type="button" variant="ghost" color="gray" className={styles.quiet}>
                Discard
              </Button>
            }
          >
            It has not been sent, and will be gone. To go on later, just leave the page: it is kept in this browser.
          </Confirm>
        )}
        <Button type="submit" loading={isBusy} disabled={isBusy || draft.isEmpty}>
          {error === null ? sendWord : 'Try again'}
        </Button>
      </Flex>
    </form>
  );
}
