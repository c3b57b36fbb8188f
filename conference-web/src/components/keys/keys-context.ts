import { createContext } from 'react';

export interface KeyBinding {
  /** As `KeyboardEvent.key` has it. */
  key: string;
  /** What it does, for the list of keys. */
  does: string;
  run: (event: KeyboardEvent) => void;
}

export interface KeysContextValue {
  bindings: KeyBinding[];
  add: (binding: KeyBinding) => () => void;
}

export const KeysContext = createContext<KeysContextValue | null>(null);

/** In a field the letters are text. */
export function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  return target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName);
}
