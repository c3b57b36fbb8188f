import type { SavingState } from '@/components/save-state';
import { type ApiProblem, asProblem } from '@/lib/api/problem';
import type { DecisionContent } from './api/list-decisions-of-case';

export interface SavedDraft {
  revision: number;
  content: DecisionContent;
}

export interface DraftConflict {
  revision: number;
  theirs: DecisionContent;
}

export interface DraftView {
  content: DecisionContent;
  saving: SavingState;
  problem: ApiProblem | null;
  /** Somebody else saved meanwhile: theirs beside what is written here. */
  conflict: DraftConflict | null;
}

export interface DraftSaverOptions {
  save: (content: DecisionContent, baseRevision: number) => Promise<SavedDraft>;
  /** Told at every change, also with null when all is saved: keeps the text in the browser. */
  keep: (unsaved: SavedDraft | null) => void;
  pause?: number;
  retryPause?: (attempt: number) => number;
}

const RETRY = (attempt: number) => Math.min(2000 * 2 ** attempt, 30_000);
const same = (one: DecisionContent, other: DecisionContent) => JSON.stringify(one) === JSON.stringify(other);

/** Saves the chair's draft while it is typed: one request at a time, never over somebody else's text unseen. */
export class DraftSaver {
  private view: DraftView;
  private revision: number;
  private saved: DecisionContent;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private running: Promise<void> | null = null;
  private attempt = 0;
  private readonly listeners = new Set<() => void>();

  /** @param unsaved what an earlier page could not save, with the revision that it was written on */
  constructor(
    start: SavedDraft,
    private readonly options: DraftSaverOptions,
    unsaved: SavedDraft | null = null,
  ) {
    this.revision = unsaved?.revision ?? start.revision;
    this.saved = start.content;
    this.view = { content: unsaved?.content ?? start.content, saving: { kind: 'unchanged' }, problem: null, conflict: null };
    if (unsaved && !same(unsaved.content, start.content)) this.schedule(0);
    else this.revision = start.revision;
  }

  readonly getView = (): DraftView => this.view;

  /** The revision that holds what is on the screen, once all is saved. */
  readonly getRevision = (): number => this.revision;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly change = (changes: Partial<DecisionContent>): void => {
    this.set({ content: { ...this.view.content, ...changes } });
    this.options.keep({ revision: this.revision, content: this.view.content });
    this.schedule(this.options.pause ?? 800);
  };

  /** What the server is heard to have: taken over where nothing is being written here. */
  readonly serverHas = ({ revision, content }: SavedDraft): void => {
    if (revision <= this.revision || this.running || this.isDirty() || this.view.conflict) return;
    this.revision = revision;
    this.saved = content;
    this.set({ content });
  };

  /** True once everything on the screen is on the server. */
  readonly saveNow = async (): Promise<boolean> => {
    clearTimeout(this.timer);
    await this.running;
    if (this.isDirty() && !this.view.conflict) await this.run();
    return !this.isDirty() && !this.view.conflict;
  };

  readonly settle = (choice: 'mine' | 'theirs'): void => {
    const { conflict } = this.view;
    if (!conflict) return;
    this.revision = conflict.revision;
    this.saved = conflict.theirs;
    this.set({ conflict: null, problem: null, content: choice === 'mine' ? this.view.content : conflict.theirs });
    this.options.keep(this.isDirty() ? { revision: this.revision, content: this.view.content } : null);
    this.set({ saving: { kind: 'unchanged' } });
    this.schedule(0);
  };

  readonly stop = (): void => clearTimeout(this.timer);

  private isDirty(): boolean {
    return !same(this.saved, this.view.content);
  }

  private set(changes: Partial<DraftView>): void {
    this.view = { ...this.view, ...changes };
    this.listeners.forEach((listener) => listener());
  }

  private schedule(pause: number): void {
    clearTimeout(this.timer);
    if (this.running || this.view.conflict || !this.isDirty()) return;
    this.set({ saving: { kind: 'waiting' } });
    this.timer = setTimeout(() => void this.run(), pause);
  }

  private run(): Promise<void> {
    const sent = this.view.content;
    this.running ??= this.saveOnce().finally(() => {
      this.running = null;
      // typed or settled while the request was on its way; a failure that may pass has its own timer
      const { saving, content } = this.view;
      if (content !== sent || saving.kind === 'unchanged') this.schedule(saving.kind === 'failed' && saving.retrying ? RETRY(0) : (this.options.pause ?? 800));
    });
    return this.running;
  }

  private async saveOnce(): Promise<void> {
    const sent = this.view.content;
    this.set({ saving: { kind: 'saving' } });
    try {
      const { revision } = await this.options.save(sent, this.revision);
      this.attempt = 0;
      this.revision = revision;
      this.saved = sent;
      this.options.keep(this.isDirty() ? { revision, content: this.view.content } : null);
      this.set({ saving: { kind: 'saved', at: new Date() }, problem: null });
    } catch (error) {
      this.afterFailure(asProblem(error));
    }
  }

  private afterFailure(problem: ApiProblem): void {
    const { currentRevision, current } = problem.extensions as { currentRevision?: number; current?: DecisionContent };
    if (problem.code === 'stale-version' && currentRevision && current) {
      const conflict = { revision: currentRevision, theirs: current };
      // the same words from two windows are no conflict
      if (same(current, this.view.content)) {
        this.revision = currentRevision;
        this.saved = current;
        this.options.keep(null);
        return this.set({ saving: { kind: 'saved', at: new Date() }, problem: null });
      }
      return this.set({ conflict, saving: { kind: 'conflict' }, problem: null });
    }
    this.set({ problem, saving: { kind: 'failed', retrying: problem.isPassing } });
    if (problem.isPassing) this.timer = setTimeout(() => void this.run(), (this.options.retryPause ?? RETRY)(this.attempt++));
  }
}
