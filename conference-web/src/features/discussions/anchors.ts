import { SECTION_WORDS, type Section } from '@kerfside/calc/vocabulary/case.js';
import type { AnchorKind } from '@kerfside/calc/vocabulary/discussions.js';
import type { Schemas } from '@/lib/api/types';
import type { Thread } from './api/list-threads';

/** The thing that a remark is about. */
export interface Anchor {
  anchorKind: AnchorKind;
  /** Section name, plan step id or image id; empty for the whole case. */
  anchorRef?: string;
}

type CaseParts = Pick<Schemas['CaseDto'], 'images'> & { content: Pick<Schemas['CaseDto']['content'], 'plan'> };

/** Whether the step or image that a thread is about is still in the case. */
function isStillThere({ anchorKind, anchorRef }: Thread, found: CaseParts): boolean {
  switch (anchorKind) {
    case 'case':
      return true;
    case 'section':
      return Object.hasOwn(SECTION_WORDS, anchorRef);
    case 'step':
      return (found.content.plan.steps ?? []).some(({ id }) => id === anchorRef);
    case 'image':
      return found.images.some(({ id }) => id === anchorRef);
  }
}

/**
 * The threads that stand at an anchor, oldest first. What was said of a step or an image that is gone stands with the
 * remarks on the whole case, so that nothing said is out of sight.
 */
export function threadsAt(threads: Thread[], { anchorKind, anchorRef = '' }: Anchor, found: CaseParts | undefined): Thread[] {
  return threads
    .filter((thread) => {
      if (thread.anchorKind === anchorKind && thread.anchorRef === anchorRef) return true;
      return anchorKind === 'case' && found !== undefined && !isStillThere(thread, found);
    })
    .sort((a, b) => a.createdAt.localeCompare(b.createdAt));
}

/** What a remark here is about, in words. */
export function anchorWords({ anchorKind, anchorRef = '' }: Anchor): string {
  switch (anchorKind) {
    case 'case':
      return 'the whole case';
    case 'section':
      return SECTION_WORDS[anchorRef as Section] ?? 'this section';
    case 'step':
      return 'this step';
    case 'image':
      return 'this image';
  }
}

export interface ThreadCounts {
  remarks: number;
  fresh: number;
  openQuestions: number;
}

/** Deleted remarks leave a mark but are not counted. */
export function countThreads(threads: Thread[]): ThreadCounts {
  const remarks = threads.flatMap((thread) => thread.remarks).filter(({ deletedAt }) => deletedAt === null);
  return {
    remarks: remarks.length,
    fresh: remarks.filter(({ isNew }) => isNew).length,
    openQuestions: threads.filter(({ kind, answeredAt }) => kind === 'question' && answeredAt === null).length,
  };
}
