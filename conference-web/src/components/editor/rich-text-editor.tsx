import type { RichText } from '@kerfside/calc/vocabulary/discussions.js';
import { EditorContent, useEditor } from '@tiptap/react';
import { useEffect, useId, useRef, useState } from 'react';
import type { EditorProps } from './editor-props';
import { editorExtensions } from './extensions';
import { MentionList, optionId } from './mention-list';
import { type MentionPopup, mentionSuggestion } from './mention-popup';
import { Toolbar } from './toolbar';
import styles from './editor.module.css';
import textStyles from './rich-text.module.css';

/** The newest of something, for callbacks that the editor keeps from its beginning. */
function useLatest<T>(value: T) {
  const latest = useRef(value);
  useEffect(() => {
    latest.current = value;
  });
  return latest;
}

/** The editor itself. Only through `Editor`, which fetches it when somebody writes. */
export default function RichTextEditor(props: EditorProps) {
  const { label, content, placeholder = '', autoFocus, describedBy } = props;
  const listId = useId();
  const latest = useLatest(props);
  const [frame, setFrame] = useState<HTMLDivElement | null>(null);
  const [popup, setPopup] = useState<MentionPopup | null>(null);
  const [extensions] = useState(() => editorExtensions(mentionSuggestion(() => latest.current.people, setPopup), placeholder));
  const attributes: Record<string, string> = {
    class: `${textStyles['text'] ?? ''} ${styles['area'] ?? ''}`,
    role: 'textbox',
    'aria-multiline': 'true',
    'aria-label': label,
    'aria-autocomplete': 'list',
    ...(describedBy ? { 'aria-describedby': describedBy } : {}),
    ...(popup ? { 'aria-controls': listId, 'aria-activedescendant': optionId(listId, popup.active) } : {}),
  };
  const editor = useEditor({
    extensions,
    content,
    autofocus: autoFocus ? 'end' : false,
    editorProps: {
      attributes,
      handleKeyDown: (_view, event) => {
        if (event.key !== 'Enter' || !(event.ctrlKey || event.metaKey)) return false;
        latest.current.onSend?.();
        return true;
      },
    },
    onUpdate: ({ editor: changed }) => latest.current.onChange(changed.getJSON() as RichText, isBlank(changed.getJSON() as RichText)),
  });
  return (
    <div ref={setFrame} className={styles.frame}>
      <Toolbar editor={editor} label={label} />
      <EditorContent editor={editor} />
      {popup && <MentionList id={listId} popup={popup} frame={frame} />}
    </div>
  );
}

/** Nothing but spaces and empty lines. */
const isBlank = (node: RichText): boolean => node.type !== 'mention' && !(node.text ?? '').trim() && (node.content ?? []).every(isBlank);
