import type { CaseContent } from '@kerfside/calc/vocabulary/case-content.js';

/** The sections that are not saved yet, with what they were written on. */
export interface LocalCopy {
  at: string;
  version: number;
  base: Partial<CaseContent>;
  content: Partial<CaseContent>;
}

export interface LocalCopies {
  /** All copies of this person and case, also those of tabs that ended without saving. */
  read(): LocalCopy[];
  /** Keeps this tab's copy; null when all is saved, which clears what `read` found too. */
  keep(copy: LocalCopy | null): void;
}

const isCopy = (value: unknown): value is LocalCopy => {
  const copy = value as LocalCopy | null;
  return typeof copy === 'object' && copy !== null && typeof copy.version === 'number' && typeof copy.base === 'object' && typeof copy.content === 'object';
};

const parse = (text: string | null): unknown => {
  try {
    return JSON.parse(text ?? 'null');
  } catch {
    return null;
  }
};

/**
 * Copies in the browser's own store, one key for each tab, so that two tabs never overwrite each other's. They hold
 * what is not saved yet and nothing else: after a save nothing of the case stays in the browser.
 */
export function localCopies(personId: string, caseId: string, store: Storage = localStorage, tab: string = crypto.randomUUID()): LocalCopies {
  const prefix = `kerfside:case-draft:${personId}:${caseId}:`;
  const own = prefix + tab;
  let found: string[] = [];
  const remove = (keys: string[]) => keys.forEach((key) => store.removeItem(key));
  return {
    read() {
      try {
        found = Object.keys(store).filter((key) => key.startsWith(prefix));
        return found.map((key) => parse(store.getItem(key))).filter(isCopy);
      } catch {
        return [];
      }
    },
    keep(copy) {
      try {
        if (copy) store.setItem(own, JSON.stringify(copy));
        else remove([own, ...found]);
      } catch {
        // a full or forbidden store: the server's copy is then the only one
      }
      if (!copy) found = [];
    },
  };
}
