import { type RefObject, useContext, useEffect, useRef } from 'react';
import { KeysContext } from './keys-context';

/** Binds a key while the component is on the page, and puts it in the list behind `?`. Not while somebody types. */
export function useKey(key: string, does: string, run: (event: KeyboardEvent) => void): void {
  const add = useContext(KeysContext)?.add;
  const latest = useRef(run);
  useEffect(() => {
    latest.current = run;
  });
  useEffect(() => add?.({ key, does, run: (event) => latest.current(event) }), [add, key, does]);
}

/** `/` goes to the page's search field. */
export function useSearchKey(field: RefObject<HTMLInputElement | null>): void {
  useKey('/', 'Search', () => {
    field.current?.focus();
    field.current?.select();
  });
}

/** j and k go through the elements marked `data-list-item` (links or buttons) of a list. */
export function useListKeys(list: RefObject<HTMLElement | null>): void {
  const move = (by: number) => {
    const items = [...(list.current?.querySelectorAll<HTMLElement>('[data-list-item]') ?? [])];
    const here = items.indexOf(document.activeElement as HTMLElement);
    const next = here < 0 ? (by > 0 ? 0 : items.length - 1) : Math.min(Math.max(here + by, 0), items.length - 1);
    items[next]?.focus();
  };
  useKey('j', 'Next in the list', () => move(1));
  useKey('k', 'Previous in the list', () => move(-1));
}
