import { DISCIPLINE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { useLayoutEffect, useRef, useState } from 'react';
import type { MentionPopup } from './mention-popup';
import styles from './editor.module.css';

export const optionId = (list: string, index: number) => `${list}-${index}`;

/** The members to choose from, below the `@`. The focus stays in the text, which names the active one. */
export function MentionList({ id, popup, frame }: { id: string; popup: MentionPopup; frame: HTMLElement | null }) {
  const list = useRef<HTMLUListElement>(null);
  const [place, setPlace] = useState({ left: 0, top: 0 });
  const { at, people, active } = popup;
  useLayoutEffect(() => {
    if (!frame || !at || !list.current) return;
    const around = frame.getBoundingClientRect();
    const room = Math.max(0, around.width - list.current.offsetWidth);
    setPlace({ left: Math.min(Math.max(0, at.left - around.left), room), top: at.bottom - around.top + 4 });
  }, [at, frame, people]);
  return (
    <ul ref={list} id={id} role="listbox" aria-label="Members to mention" className={styles.mentions} style={place}>
      {people.map((person, index) => (
        <li
          key={person.id}
          id={optionId(id, index)}
          role="option"
          aria-selected={index === active}
          // a press must not take the focus out of the text
          onMouseDown={(event) => {
            event.preventDefault();
            popup.choose(person);
          }}
        >
          {person.name}
          <span>{DISCIPLINE_WORDS[person.discipline]}</span>
        </li>
      ))}
    </ul>
  );
}
