import type { MentionOptions } from '@tiptap/extension-mention';
import type { Mentionable } from './editor-props';

type Suggestion = MentionOptions<Mentionable>['suggestion'];
type Props = Parameters<NonNullable<ReturnType<NonNullable<Suggestion['render']>>['onStart']>>[0];

/** The list that opens after an `@`: what it holds, where it stands, and what choosing does. */
export interface MentionPopup {
  people: Mentionable[];
  active: number;
  /** Of the `@` on the screen. */
  at: DOMRect | null;
  choose: (person: Mentionable) => void;
}

const MOST = 6;

const folded = (text: string) => text.normalize('NFD').replace(/\p{Diacritic}/gu, '').toLowerCase();

/** Those whose name, or a part of it, begins with what was typed. */
export function matchPeople(people: Mentionable[], query: string): Mentionable[] {
  const wanted = folded(query);
  return people.filter(({ name }) => [name, ...name.split(/[\s-]+/)].some((part) => folded(part).startsWith(wanted))).slice(0, MOST);
}

/**
 * Joins the editor's suggestion to React: `show` gets the popup's state, or null when it closes. Arrow keys move,
 * Enter or Tab choose, Escape closes; the focus stays in the text.
 */
export function mentionSuggestion(people: () => Mentionable[], show: (popup: MentionPopup | null) => void): Partial<Suggestion> {
  let popup: MentionPopup | null = null;
  const set = (next: MentionPopup | null) => {
    popup = next;
    show(next);
  };
  const read = ({ items, clientRect, command }: Props, active: number) =>
    set(
      items.length === 0
        ? null
        : {
            people: items,
            active: Math.min(active, items.length - 1),
            at: clientRect?.() ?? null,
            choose: ({ id, name }) => command({ id, label: name }),
          },
    );
  const step = (by: number) => {
    if (popup) set({ ...popup, active: (popup.active + by + popup.people.length) % popup.people.length });
  };
  return {
    allowedPrefixes: [' ', '(', ',', '/'],
    items: ({ query }) => matchPeople(people(), query),
    render: () => ({
      onStart: (props) => read(props, 0),
      onUpdate: (props) => read(props, popup?.active ?? 0),
      onExit: () => set(null),
      onKeyDown: ({ event }) => {
        if (!popup) return false;
        if (event.key === 'ArrowDown') step(1);
        else if (event.key === 'ArrowUp') step(-1);
        else if (event.key === 'Enter' || event.key === 'Tab') popup.choose(popup.people[popup.active]!);
        else return false;
        return true;
      },
    }),
  };
}
