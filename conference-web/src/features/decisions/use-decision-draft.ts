import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState, useSyncExternalStore } from 'react';
import { useKept } from '@/lib/use-kept';
import type { Decision } from './api/list-decisions-of-case';
import { keepDecision, writeDecision } from './api/write-decision';
import { DraftSaver, type DraftSaverOptions, type SavedDraft } from './draft-saver';

/** The chair's draft while it is written. One for each draft: give the component its id as `key`. */
export function useDecisionDraft(draft: Decision) {
  const client = useQueryClient();
  const { value: unsaved, set, forget } = useKept<SavedDraft | null>(`decision:${draft.id}`, null);
  const [saver] = useState(() => {
    const save: DraftSaverOptions['save'] = async (content, baseRevision) => {
      // a dissent whose words are not written yet would be refused; it stays on the page
      const dissent = content.dissent.filter(({ words }) => words.trim());
      const saved = await writeDecision(draft.caseId, { ...content, dissent, baseRevision });
      keepDecision(client, saved);
      return saved;
    };
    return new DraftSaver(draft, { save, keep: (text) => (text ? set(text) : forget(null)) }, unsaved);
  });
  useEffect(() => saver.serverHas(draft), [saver, draft]);
  // what is typed in the last moment before the page is left is still sent
  useEffect(() => () => void saver.saveNow(), [saver]);
  const view = useSyncExternalStore(saver.subscribe, saver.getView);
  return { ...view, saver };
}
