import type { ThreadKind } from '@kerfside/calc/vocabulary/discussions.js';
import { Pencil1Icon } from '@radix-ui/react-icons';
import { Button } from '@radix-ui/themes';
import { useState } from 'react';
import type { Mentionable } from '@/components/editor/editor-props';
import { useHasKept, useKept } from '@/lib/use-kept';
import type { Anchor } from '../anchors';
import { useCreateThread } from '../api/create-thread';
import { Composer } from './composer';
import styles from './margin.module.css';

interface NewThreadProps {
  caseId: string;
  anchor: Anchor;
  about: string;
  people: Mentionable[];
  /** The presenter does not ask the presenter. */
  mayAsk: boolean;
}

const KIND_WORDS: Record<ThreadKind, string> = { remark: 'Remark', question: 'Question to the presenter' };

/** Begins a thread at an anchor: closed as a button, open as the editor. Opens by itself where a text was kept. */
export function NewThread({ caseId, anchor, about, people, mayAsk }: NewThreadProps) {
  const name = `new:${caseId}:${anchor.anchorKind}:${anchor.anchorRef ?? ''}`;
  const [isOpen, setOpen] = useState(useHasKept(`remark:${name}`));
  const [wasOpened, setWasOpened] = useState(false);
  const kind = useKept<ThreadKind>(`kind:${name}`, 'remark');
  const create = useCreateThread(caseId);
  if (!isOpen)
    return (
      <Button type="button" variant="ghost" color="gray" className={styles.quiet} onClick={() => setOpen(true)} autoFocus={wasOpened} aria-label={`Write a remark on ${about}`}>
        <Pencil1Icon aria-hidden="true" />
        Write a remark
      </Button>
    );
  const close = () => {
    kind.forget('remark');
    setWasOpened(true);
    setOpen(false);
  };
  return (
    <Composer
      name={name}
      label={`Remark on ${about}`}
      placeholder="What do you see, know or doubt here? @ names a colleague."
      sendWord={kind.value === 'question' ? 'Ask presenter' : 'Post remark'}
      people={people}
      onSend={(content) =>
        create.mutateAsync({ anchorKind: anchor.anchorKind, anchorRef: anchor.anchorRef ?? '', kind: kind.value, content: { ...content } })
      }
      onClose={close}
    >
      {mayAsk && (
        <div role="radiogroup" aria-label="What it is" className={styles.kinds}>
          {(['remark', 'question'] as const).map((value) => (
            <label key={value}>
              <input type="radio" name={name} value={value} checked={kind.value === value} onChange={() => kind.set(value)} />
              {KIND_WORDS[value]}
            </label>
          ))}
        </div>
      )}
    </Composer>
  );
}
