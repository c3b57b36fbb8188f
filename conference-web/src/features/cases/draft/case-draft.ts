import { changedSections } from '@kerfside/calc/cases/differences.js';
import { type CaseContent, CONTENT_SECTIONS, type ContentSection } from '@kerfside/calc/vocabulary/case-content.js';
import type { SavingState } from '@/components/save-state';
import { type ApiProblem, asProblem, type FieldError } from '@/lib/api/problem';
import type { LocalCopies } from './local-copy';
import { heldDifferences, type HeldFields, mergeContent, withFields } from './merge';

export interface ServerState {
  content: CaseContent;
  version: number;
}

export interface DraftPorts {
  save: (baseVersion: number, changes: Partial<CaseContent>) => Promise<{ version: number; savedAt: string }>;
  /** Asked when the server says that the case was changed meanwhile. */
  fetchCurrent: () => Promise<ServerState>;
  copies: LocalCopies;
  onSaved?: () => void;
  /** Milliseconds that the typing must rest before it is saved. */
  pause?: number;
  /** Milliseconds before the nth try again. */
  retryPause?: (attempt: number) => number;
}

export interface DraftState {
  /** What is on the screen. */
  content: CaseContent;
  /** What the server has. */
  base: CaseContent;
  version: number;
  saving: SavingState;
  /** The last failure, until a save goes through. */
  problem: ApiProblem | null;
  /** What the server refused, by path within the content: `patient.ageYears`. */
  refusals: FieldError[];
  held: HeldFields;
  /** Sections that others changed and that were taken over, since the page was opened. */
  takenOver: ContentSection[];
  /** When the text was written that a tab before this one had not saved. */
  restoredFrom: string | null;
}

const RETRY = (attempt: number) => Math.min(2000 * 2 ** attempt, 30_000);
const only = (content: CaseContent, sections: ContentSection[]): Partial<CaseContent> =>
  Object.fromEntries(sections.map((section) => [section, content[section]]));
const sectionOf = ({ field }: FieldError) => CONTENT_SECTIONS.find((section) => field === section || field.startsWith(`${section}.`));

/**
 * A case while it is written: what is on the screen, what the server has, and the saving of the difference. One
 * request is on its way at a time; what is not saved stands in the browser's store. Lives outside React, so that
 * leaving the page does not stop a save.
 */
export class CaseDraft {
  private state: DraftState;
  private readonly listeners = new Set<() => void>();
  private timer: ReturnType<typeof setTimeout> | undefined;
  private running: Promise<void> | null = null;
  private heard: ServerState | null = null;
  private attempt = 0;
  private isOpen = true;
  /** Sections as the server refused them: they are sent again when they have been changed. */
  private readonly refused = new Map<ContentSection, unknown>();

  constructor(
    server: ServerState,
    private readonly ports: DraftPorts,
  ) {
    this.state = {
      content: server.content,
      base: server.content,
      version: server.version,
      saving: { kind: 'unchanged' },
      problem: null,
      refusals: [],
      held: {},
      takenOver: [],
      restoredFrom: null,
    };
    for (const copy of ports.copies.read()) {
      const written = { ...server.content, ...copy.content };
      if (changedSections(server.content, written).length === 0) continue;
      // another tab's text on top of an earlier one's: what both wrote differently is held
      const merged = mergeContent({ ...server.content, ...copy.base }, written, this.state.content);
      this.set({ content: merged.content, held: { ...this.state.held, ...merged.held }, restoredFrom: copy.at });
    }
    if (this.isDirty()) this.schedule(0);
    else ports.copies.keep(null);
  }

  readonly getState = (): DraftState => this.state;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly change = <S extends ContentSection>(section: S, value: CaseContent[S]): void => {
    this.set({ content: { ...this.state.content, [section]: value } });
    this.keepCopy();
    this.schedule(this.ports.pause ?? 800);
  };

  /** Settles a section that two people changed. Theirs is on the server and stays in its history either way. */
  readonly settleConflict = (section: ContentSection, choice: 'mine' | 'theirs'): void => {
    const { [section]: fields = [], ...held } = this.state.held;
    const { content, base } = this.state;
    const settled = choice === 'theirs' ? withFields(section, content[section], base[section], fields) : content[section];
    this.set({ content: { ...content, [section]: settled }, held });
    this.keepCopy();
    this.schedule(0);
  };

  /** The server was heard to have this: brings it together with what is written here. */
  readonly serverHas = (server: ServerState): void => {
    // our own save may be what was heard of; its answer settles that
    if (this.running) this.heard = server;
    if (this.running || server.version <= this.state.version) return;
    this.absorb(server);
    if (this.toSave().length) this.schedule(0);
    else this.rest();
  };

  /** Saves what is written at once; false when something could not be saved. */
  readonly saveNow = async (): Promise<boolean> => {
    await this.running;
    // a second time where the first met an older version and brought both together
    for (let tries = 0; tries < 2 && this.toSave().length; tries += 1) await this.run();
    return !this.isDirty();
  };

  /** Once the page is left, what can't be saved waits in the browser's store and is not tried over and over. */
  readonly setOpen = (isOpen: boolean): void => {
    this.isOpen = isOpen;
  };

  readonly isDirty = (): boolean => changedSections(this.state.base, this.state.content).length > 0;

  private set(changes: Partial<DraftState>): void {
    this.state = { ...this.state, ...changes };
    this.listeners.forEach((listener) => listener());
  }

  private keepCopy(): void {
    const { base, content, version } = this.state;
    const sections = changedSections(base, content);
    const copy = { at: new Date().toISOString(), version, base: only(base, sections), content: only(content, sections) };
    this.ports.copies.keep(sections.length ? copy : null);
  }

  private toSave(): ContentSection[] {
    const { base, content, held } = this.state;
    return changedSections(base, content).filter((section) => !held[section] && this.refused.get(section) !== content[section]);
  }

  private schedule(pause: number): void {
    clearTimeout(this.timer);
    if (this.running) return;
    if (!this.toSave().length) return this.rest();
    if (this.state.saving.kind !== 'failed') this.set({ saving: { kind: 'waiting' } });
    this.timer = setTimeout(() => void this.run(), pause);
  }

  /** Nothing can be saved now: says how it stands. */
  private rest(savedAt?: string): void {
    const { held, saving } = this.state;
    if (Object.keys(held).length) return this.set({ saving: { kind: 'conflict' } });
    if (this.isDirty()) return this.set({ saving: { kind: 'failed', retrying: false } });
    if (savedAt) return this.set({ saving: { kind: 'saved', at: savedAt } });
    if (saving.kind !== 'saved') this.set({ saving: { kind: 'unchanged' } });
  }

  private run(): Promise<void> {
    clearTimeout(this.timer);
    this.running ??= this.saveOnce().then((next) => this.afterRun(next));
    return this.running;
  }

  private afterRun(next: number | null): void {
    this.running = null;
    const { heard } = this;
    this.heard = null;
    if (heard) this.serverHas(heard);
    if (next !== null && (this.isOpen || this.state.saving.kind !== 'failed')) this.schedule(next);
  }

  /** Sends once. Answers after how many milliseconds to go on, or null where only a change helps. */
  private async saveOnce(): Promise<number | null> {
    const sections = this.toSave();
    if (!sections.length) return null;
    const sent = only(this.state.content, sections);
    this.set({ saving: { kind: 'saving' } });
    try {
      const { version, savedAt } = await this.ports.save(this.state.version, sent);
      this.attempt = 0;
      const refusals = this.state.refusals.filter((refusal) => !sections.includes(sectionOf(refusal)!));
      sections.forEach((section) => this.refused.delete(section));
      this.set({ base: { ...this.state.base, ...sent }, version, problem: null, refusals });
      this.keepCopy();
      this.rest(savedAt);
      this.ports.onSaved?.();
      return this.toSave().length ? (this.ports.pause ?? 800) : null;
    } catch (error) {
      return this.afterFailure(asProblem(error), sent);
    }
  }

  private async afterFailure(problem: ApiProblem, sent: Partial<CaseContent>): Promise<number | null> {
    if (problem.code === 'stale-version') {
      try {
        this.absorb(await this.ports.fetchCurrent());
        this.rest();
        return this.toSave().length ? 0 : null;
      } catch (error) {
        return this.tryLater(asProblem(error));
      }
    }
    if (problem.status === 422) return this.refuse(problem, sent);
    const willPass = problem.isPassing || problem.status === 401 || problem.status === 429 || problem.status >= 500;
    if (willPass) return this.tryLater(problem);
    this.set({ problem, saving: { kind: 'failed', retrying: false } });
    return null;
  }

  private tryLater(problem: ApiProblem): number {
    this.set({ problem, saving: { kind: 'failed', retrying: true } });
    return Math.max((problem.retryAfter ?? 0) * 1000, (this.ports.retryPause ?? RETRY)(this.attempt++));
  }

  /** Holds back the sections that were refused, and lets the others go on. */
  private refuse(problem: ApiProblem, sent: Partial<CaseContent>): number | null {
    const sections = Object.keys(sent) as ContentSection[];
    const errors = problem.errors.map((error) => ({ ...error, field: error.field.replace(/^changes\./, '') }));
    const bad = sections.filter((section) => errors.some((error) => sectionOf(error) === section));
    for (const section of bad.length ? bad : sections) this.refused.set(section, sent[section]);
    const others = this.state.refusals.filter((refusal) => !bad.includes(sectionOf(refusal)!));
    this.set({ problem, refusals: [...others, ...errors], saving: { kind: 'failed', retrying: false } });
    return this.toSave().length ? 0 : null;
  }

  private absorb(server: ServerState): void {
    const merged = mergeContent(this.state.base, this.state.content, server.content);
    const held = { ...this.state.held };
    for (const section of CONTENT_SECTIONS) {
      const fields = [...new Set([...(held[section] ?? []), ...(merged.held[section] ?? [])])];
      delete held[section];
      if (heldDifferences(section, fields, merged.content, server.content).length) held[section] = fields;
    }
    const takenOver = [...new Set([...this.state.takenOver, ...merged.takenOver])];
    this.set({ base: server.content, content: merged.content, version: server.version, held, takenOver, problem: null });
    this.keepCopy();
  }
}
