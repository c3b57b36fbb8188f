import type { CaseContent } from '@kerfside/calc/vocabulary/case-content.js';
import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState, useSyncExternalStore } from 'react';
import type { Schemas } from '@/lib/api/types';
import { useMe } from '@/lib/auth/session';
import { keys } from '@/lib/query-keys';
import { caseQuery } from '../api/get-case';
import { saveCase } from '../api/save-case';
import { CaseDraft, type ServerState } from './case-draft';
import { localCopies } from './local-copy';

/** The contract's types and the shared vocabulary name the same fields; only the enumerations are spelled otherwise. */
export const contentOf = (found: Pick<Schemas['CaseDto'], 'content'>): CaseContent => found.content as CaseContent;

const stateOf = (found: Schemas['CaseDto']): ServerState => ({ content: contentOf(found), version: found.version });

/** The draft of a case for as long as its page is open; `found` may change as others save. */
export function useCaseDraft(found: Schemas['CaseDto']) {
  const me = useMe();
  const client = useQueryClient();
  const [draft] = useState(
    () =>
      new CaseDraft(stateOf(found), {
        save: (baseVersion, changes) => saveCase(found.id, baseVersion, changes),
        fetchCurrent: async () => stateOf(await client.fetchQuery({ ...caseQuery(found.id), staleTime: 0 })),
        copies: localCopies(me.id, found.id),
        onSaved: () => {
          void client.invalidateQueries({ queryKey: keys.cases.readiness(found.id) });
          void client.invalidateQueries({ queryKey: keys.cases.identifiers(found.id) });
          void client.invalidateQueries({ queryKey: keys.cases.one(found.id), refetchType: 'none' });
        },
      }),
  );
  useEffect(() => draft.serverHas(stateOf(found)), [draft, found]);
  useSaveOnLeaving(draft);
  return { draft, state: useSyncExternalStore(draft.subscribe, draft.getState) };
}

/** Does not wait for the typing to rest when the page is put away, and tries again when the connection is back. */
function useSaveOnLeaving(draft: CaseDraft) {
  useEffect(() => {
    draft.setOpen(true);
    const save = () => void draft.saveNow();
    const saveWhenHidden = () => {
      if (document.visibilityState === 'hidden') save();
    };
    document.addEventListener('visibilitychange', saveWhenHidden);
    addEventListener('pagehide', save);
    addEventListener('online', save);
    return () => {
      document.removeEventListener('visibilitychange', saveWhenHidden);
      removeEventListener('pagehide', save);
      removeEventListener('online', save);
      draft.setOpen(false);
      save();
    };
  }, [draft]);
}
