import { useState } from 'react';
import { moved } from '@/components/running-order/running-order-scale';
import type { Meeting } from './api/get-meeting';
import { useSetAgenda } from './api/set-agenda';
import { type AgendaEntry, entriesOf, mergeAgendas, sameAgenda } from './agenda-draft';

interface Draft {
  /** What the edit began from. */
  base: AgendaEntry[];
  baseVersion: number;
  entries: AgendaEntry[];
}

const storageKey = (meetingId: string) => `kerfside:agenda:${meetingId}`;

function readDraft(meetingId: string): Draft | null {
  try {
    return JSON.parse(localStorage.getItem(storageKey(meetingId)) ?? 'null') as Draft | null;
  } catch {
    return null;
  }
}

function keepDraft(meetingId: string, draft: Draft | null): void {
  try {
    if (draft) localStorage.setItem(storageKey(meetingId), JSON.stringify(draft));
    else localStorage.removeItem(storageKey(meetingId));
  } catch {
    // a full or forbidden store only costs the copy that outlives this page
  }
}

/** The agenda as it is being edited: kept in this browser until it is saved, and never overwritten by another's. */
export function useAgendaDraft(meeting: Meeting) {
  const save = useSetAgenda(meeting.id);
  const [draft, setDraft] = useState(() => readDraft(meeting.id));
  const saved = entriesOf(meeting.items);
  const entries = draft?.entries ?? saved;
  const isDirty = draft !== null && !sameAgenda(draft.entries, saved);
  const isStale = isDirty && !sameAgenda(draft.base, saved);

  const put = (next: Draft | null) => {
    setDraft(next);
    keepDraft(meeting.id, next);
  };
  const change = (next: (entries: AgendaEntry[]) => AgendaEntry[]) => {
    save.reset();
    const from = isDirty ? draft : { base: saved, baseVersion: meeting.version };
    put({ base: from.base, baseVersion: from.baseVersion, entries: next(entries) });
  };
  return {
    entries,
    isDirty,
    isStale,
    saved,
    base: draft?.base ?? saved,
    isSaving: save.isPending,
    error: save.error,
    add: (caseId: string, minutes: number) => change((all) => [...all, { caseId, minutes }]),
    remove: (caseId: string) => change((all) => all.filter((entry) => entry.caseId !== caseId)),
    setMinutes: (caseId: string, minutes: number) => change((all) => all.map((entry) => (entry.caseId === caseId ? { caseId, minutes } : entry))),
    move: (from: number, to: number) => change((all) => moved(all, from, to)),
    discard: () => {
      save.reset();
      put(null);
    },
    /** Mine, on top of the agenda as it is now. */
    keepMine: () => {
      save.reset();
      put({ base: saved, baseVersion: meeting.version, entries });
    },
    putTogether: () => {
      save.reset();
      if (draft) put({ base: saved, baseVersion: meeting.version, entries: mergeAgendas(draft.base, draft.entries, saved) });
    },
    save: async () => {
      // where only something else of the meeting changed, its new version is the one to build on
      const baseVersion = isStale && draft ? draft.baseVersion : meeting.version;
      try {
        await save.mutateAsync({ baseVersion, items: entries });
        put(null);
      } catch {
        // shown by `error`; the draft stays
      }
    },
  };
}

export type AgendaDraft = ReturnType<typeof useAgendaDraft>;
