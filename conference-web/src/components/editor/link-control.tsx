import { Link2Icon } from '@radix-ui/react-icons';
import { Button, Flex, IconButton, Popover } from '@radix-ui/themes';
import { type Editor, useEditorState } from '@tiptap/react';
import { type KeyboardEvent, useState } from 'react';
import { TextField } from '@/components/field';
import { completeHref } from './safe-link';
import styles from './editor.module.css';

/** Sets, changes or removes the link at the cursor. */
export function LinkControl({ editor }: { editor: Editor }) {
  const [isOpen, setOpen] = useState(false);
  const [address, setAddress] = useState('');
  const [error, setError] = useState('');
  const isOn = useEditorState({ editor, selector: (state) => state.editor.isActive('link') });

  const open = (next: boolean) => {
    if (next) setAddress(String(editor.getAttributes('link')['href'] ?? ''));
    setError('');
    setOpen(next);
  };
  const set = () => {
    const href = completeHref(address);
    if (!href) return setError('Give a whole address that begins with http://, https:// or mailto:.');
    const chain = editor.chain().focus().extendMarkRange('link');
    if (editor.state.selection.empty && !isOn) chain.insertContent({ type: 'text', text: address.trim(), marks: [{ type: 'link', attrs: { href } }] }).run();
    else chain.setLink({ href }).run();
    setOpen(false);
  };
  const remove = () => {
    editor.chain().focus().extendMarkRange('link').unsetLink().run();
    setOpen(false);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Enter') return;
    // the remark's own form must not be sent by it
    event.preventDefault();
    set();
  };
  return (
    <Popover.Root open={isOpen} onOpenChange={open}>
      <Popover.Trigger>
        <IconButton
          type="button"
          size="2"
          variant={isOn ? 'soft' : 'ghost'}
          color="gray"
          highContrast
          className={styles.tool}
          aria-label="Link"
          aria-pressed={isOn}
          title="Link"
        >
          <Link2Icon />
        </IconButton>
      </Popover.Trigger>
      <Popover.Content maxWidth="320px" aria-label="Link" onCloseAutoFocus={(event) => event.preventDefault()}>
        <TextField
          label="Address"
          inputMode="url"
          value={address}
          error={error}
          onKeyDown={onKeyDown}
          onChange={(event) => setAddress(event.target.value)}
        />
        <Flex gap="2" justify="end">
          {isOn && (
            <Button type="button" variant="soft" color="gray" onClick={remove}>
              Remove link
            </Button>
          )}
          <Button type="button" onClick={set}>
            Set link
          </Button>
        </Flex>
      </Popover.Content>
    </Popover.Root>
  );
}
