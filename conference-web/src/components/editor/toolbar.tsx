import { FontBoldIcon, FontItalicIcon, ListBulletIcon, QuoteIcon } from '@radix-ui/react-icons';
import { IconButton } from '@radix-ui/themes';
import { type Editor, useEditorState } from '@tiptap/react';
import type { KeyboardEvent, ReactNode } from 'react';
import { LinkControl } from './link-control';
import styles from './editor.module.css';

const NumberedListIcon = () => (
  <svg width="15" height="15" viewBox="0 0 15 15" aria-hidden="true" fill="currentColor">
    <path d="M6 3h8v1H6zM6 7h8v1H6zM6 11h8v1H6z" />
    <path d="M2.2 1.6h1v3.6h-1V2.8l-.7.3v-.9zM1.4 6.6c.3-.4.7-.6 1.2-.6.8 0 1.3.4 1.3 1 0 .5-.3.9-1.1 1.6h1.2v.8H1.3v-.7c1.2-1 1.6-1.4 1.6-1.7 0-.2-.2-.3-.4-.3s-.4.1-.6.4zM1.4 10.4h2.4v.7l-.8.7c.6.1.9.4.9.9 0 .7-.6 1.1-1.4 1.1-.5 0-.9-.1-1.2-.4l.4-.7c.2.2.5.3.8.3s.5-.1.5-.4c0-.2-.2-.3-.6-.3h-.4v-.6l.7-.6h-1.3z" />
  </svg>
);

interface ToggleProps {
  word: string;
  isOn: boolean;
  onToggle: () => void;
  children: ReactNode;
}

const Toggle = ({ word, isOn, onToggle, children }: ToggleProps) => (
  <IconButton
    type="button"
    size="2"
    variant={isOn ? 'soft' : 'ghost'}
    color="gray"
    highContrast
    className={styles.tool}
    aria-label={word}
    aria-pressed={isOn}
    title={word}
    onMouseDown={(event) => event.preventDefault()}
    onClick={onToggle}
  >
    {children}
  </IconButton>
);

/** Left and right go through the buttons, as in every toolbar. */
function moveFocus(event: KeyboardEvent<HTMLDivElement>) {
  const by = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
  if (!by) return;
  const buttons = [...event.currentTarget.querySelectorAll('button')];
  const next = buttons[(buttons.indexOf(document.activeElement as HTMLButtonElement) + by + buttons.length) % buttons.length];
  event.preventDefault();
  next?.focus();
}

/** Bold, italic, lists, quote and link: what a remark needs, no more. */
export function Toolbar({ editor, label }: { editor: Editor; label: string }) {
  const on = useEditorState({
    editor,
    selector: ({ editor: now }) => ({
      bold: now.isActive('bold'),
      italic: now.isActive('italic'),
      bulletList: now.isActive('bulletList'),
      orderedList: now.isActive('orderedList'),
      blockquote: now.isActive('blockquote'),
    }),
  });
  const run = () => editor.chain().focus();
  return (
    <div role="toolbar" aria-label={`Formatting of ${label.toLowerCase()}`} className={styles.toolbar} onKeyDown={moveFocus}>
      <Toggle word="Bold" isOn={on.bold} onToggle={() => run().toggleBold().run()}>
        <FontBoldIcon />
      </Toggle>
      <Toggle word="Italic" isOn={on.italic} onToggle={() => run().toggleItalic().run()}>
        <FontItalicIcon />
      </Toggle>
      <Toggle word="List" isOn={on.bulletList} onToggle={() => run().toggleBulletList().run()}>
        <ListBulletIcon />
      </Toggle>
      <Toggle word="Numbered list" isOn={on.orderedList} onToggle={() => run().toggleOrderedList().run()}>
        <NumberedListIcon />
      </Toggle>
      <Toggle word="Quote" isOn={on.blockquote} onToggle={() => run().toggleBlockquote().run()}>
        <QuoteIcon />
      </Toggle>
      <LinkControl editor={editor} />
    </div>
  );
}
