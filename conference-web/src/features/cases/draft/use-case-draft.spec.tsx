import { type CaseContent, emptyContent } from '@kerfside/calc/vocabulary/case-content.js';
import { act, renderHook } from '@testing-library/react';
import { useSyncExternalStore } from 'react';
import { ApiProblem, offline } from '@/lib/api/problem';
import { CaseDraft, type DraftPorts, type ServerState } from './case-draft';
import { localCopies } from './local-copy';

/** Keeps versions as the API does: an older base is refused, each save gives a new one. */
class Server {
  now: ServerState = { content: emptyContent(), version: 1 };
  requests: { baseVersion: number; changes: Partial<CaseContent> }[] = [];
  underWay = 0;
  mostUnderWay = 0;
  answerAfter = 50;
  /** Thrown instead of an answer, one for each request. */
  faults: Error[] = [];

  save: DraftPorts['save'] = async (baseVersion, changes) => {
    this.requests.push({ baseVersion, changes });
    this.mostUnderWay = Math.max(this.mostUnderWay, ++this.underWay);
    await new Promise((resolve) => setTimeout(resolve, this.answerAfter));
    this.underWay -= 1;
    const fault = this.faults.shift();
    if (fault) throw fault;
    if (baseVersion !== this.now.version) throw new ApiProblem(409, 'stale-version', 'Changed meanwhile', 'An older version.');
    this.elsewhere(changes);
    return { version: this.now.version, savedAt: '2026-12-07T10:00:00.000Z' };
  };

  elsewhere(changes: Partial<CaseContent>) {
    this.now = { content: { ...this.now.content, ...changes }, version: this.now.version + 1 };
  }
}

const PAUSE = 800;
let server: Server;
let copies: ReturnType<typeof localCopies>;

function open(tab = 'tab-1') {
  copies = localCopies('person', 'case', localStorage, tab);
  const draft = new CaseDraft(structuredClone(server.now), {
    save: server.save,
    fetchCurrent: async () => structuredClone(server.now),
    copies,
    pause: PAUSE,
    retryPause: () => 2000,
  });
  const { result } = renderHook(() => useSyncExternalStore(draft.subscribe, draft.getState));
  const type = (text: string) => act(() => draft.change('patient', { ...draft.getState().content.patient, function: text }));
  return { draft, result, type };
}

const pass = (milliseconds: number) => act(() => jest.advanceTimersByTimeAsync(milliseconds));
const kept = () => Object.values(localStorage).join();

beforeEach(() => {
  jest.useFakeTimers();
  localStorage.clear();
  server = new Server();
});
afterEach(() => jest.useRealTimers());

describe('saving as one types', () => {
  it('waits for the typing to rest, sends the changed sections only, and leaves no copy behind', async () => {
    const { result, type } = open();
    type('W');
    await pass(500);
    type('Walks');
    await pass(500);
    expect(server.requests).toHaveLength(0);
    expect(result.current.saving.kind).toBe('waiting');
    expect(kept()).toContain('Walks');
    await pass(400);
    expect(server.requests).toEqual([{ baseVersion: 1, changes: { patient: { function: 'Walks' } } }]);
    expect(result.current.saving).toEqual({ kind: 'saved', at: '2026-12-07T10:00:00.000Z' });
    expect(kept()).toBe('');
  });

  it('has one request on its way at a time, and sends what was typed meanwhile after it', async () => {
    server.answerAfter = 3000;
    const { result, type, draft } = open();
    type('one');
    await pass(PAUSE);
    type('one two');
    await pass(PAUSE);
    void draft.saveNow();
    await pass(PAUSE);
    expect(server.requests).toHaveLength(1);
    await pass(10_000);
    expect(server.requests.map(({ baseVersion, changes }) => [baseVersion, changes.patient?.function])).toEqual([
      [1, 'one'],
      [2, 'one two'],
    ]);
    expect(server.mostUnderWay).toBe(1);
    expect(result.current.version).toBe(3);
  });

  it('sends nothing where a change was taken back', async () => {
    const { result, type } = open();
    type('x');
    type('');
    await pass(5000);
    expect(server.requests).toHaveLength(0);
    expect(result.current.saving.kind).toBe('unchanged');
  });
});

describe('when a save fails', () => {
  it('keeps the text, says so, and tries again until it goes through', async () => {
    server.faults = [offline(), new ApiProblem(503, 'unavailable', 'Down', 'Down.')];
    const { result, type } = open();
    type('Not to be lost');
    await pass(PAUSE + 50);
    expect(result.current.saving).toEqual({ kind: 'failed', retrying: true });
    expect(result.current.content.patient.function).toBe('Not to be lost');
    expect(kept()).toContain('Not to be lost');
    await pass(2 * 2050);
    expect(server.now.content.patient.function).toBe('Not to be lost');
    expect(result.current.saving.kind).toBe('saved');
    expect(result.current.problem).toBeNull();
  });

  it('does not try a refused section again until it is changed, and saves the others meanwhile', async () => {
    server.faults = [new ApiProblem(422, 'invalid', 'Mend', 'Mend.', [{ field: 'changes.patient.function', code: 'length', message: 'Too long.' }])];
    const { result, type, draft } = open();
    act(() => draft.change('heading', { title: 'Loose cup' }));
    type('far too long');
    await pass(10_000);
    expect(result.current.refusals).toEqual([{ field: 'patient.function', code: 'length', message: 'Too long.' }]);
    expect(server.now.content.heading.title).toBe('Loose cup');
    expect(server.requests).toHaveLength(2);
    expect(result.current.saving).toEqual({ kind: 'failed', retrying: false });
    type('short');
    await pass(2000);
    expect(server.now.content.patient.function).toBe('short');
    expect(result.current.refusals).toEqual([]);
  });

  it('stops trying once the page is left, and the next page finds the text', async () => {
    server.faults = [offline(), offline()];
    const { draft, type } = open('tab-1');
    type('Written on a train');
    draft.setOpen(false);
    await pass(60_000);
    expect(server.requests).toHaveLength(1);
    server.faults = [];
    const next = open('tab-2');
    expect(next.result.current.content.patient.function).toBe('Written on a train');
    expect(next.result.current.restoredFrom).not.toBeNull();
    await pass(PAUSE);
    expect(server.now.content.patient.function).toBe('Written on a train');
    expect(kept()).toBe('');
  });
});

describe('when the case was changed elsewhere', () => {
  it('brings changes of different fields together and saves mine on top', async () => {
    const { result, type } = open();
    server.elsewhere({ patient: { asa: 'III' } });
    type('Mine');
    await pass(5000);
    expect(server.now.content.patient).toEqual({ asa: 'III', function: 'Mine' });
    expect(result.current.takenOver).toEqual(['patient']);
    expect(result.current.saving.kind).toBe('saved');
  });

  it('holds a section that both changed until a person settles it; mine', async () => {
    const { result, type, draft } = open();
    server.elsewhere({ patient: { function: 'Theirs' } });
    type('Mine');
    await pass(5000);
    expect(result.current.saving.kind).toBe('conflict');
    expect(result.current.held).toEqual({ patient: ['function'] });
    expect(result.current.content.patient.function).toBe('Mine');
    expect(server.now.content.patient.function).toBe('Theirs');
    expect(kept()).toContain('Mine');
    act(() => draft.settleConflict('patient', 'mine'));
    await pass(5000);
    expect(server.now.content.patient.function).toBe('Mine');
    expect(result.current.saving.kind).toBe('saved');
  });

  it('or theirs, with the rest of mine still saved', async () => {
    const { result, type, draft } = open();
    server.elsewhere({ patient: { function: 'Theirs' } });
    type('Mine');
    act(() => draft.change('patient', { ...draft.getState().content.patient, ageYears: 66 }));
    await pass(5000);
    act(() => draft.settleConflict('patient', 'theirs'));
    await pass(5000);
    expect(result.current.content.patient).toEqual({ function: 'Theirs', ageYears: 66 });
    expect(server.now.content.patient).toEqual({ function: 'Theirs', ageYears: 66 });
  });

  it('saves other sections while one is held', async () => {
    const { type, draft } = open();
    server.elsewhere({ patient: { function: 'Theirs' } });
    type('Mine');
    await pass(5000);
    act(() => draft.change('heading', { title: 'Loose cup' }));
    await pass(5000);
    expect(server.now.content.heading.title).toBe('Loose cup');
    expect(server.now.content.patient.function).toBe('Theirs');
  });

  it('shows at once what it hears of, and takes its own save for no conflict', async () => {
    const { result, type, draft } = open();
    server.elsewhere({ heading: { title: 'Heard' } });
    act(() => draft.serverHas(structuredClone(server.now)));
    expect(result.current.content.heading.title).toBe('Heard');
    type('Mine');
    await pass(PAUSE + 20);
    // the event of our own save comes before its answer
    const own = { content: { ...server.now.content, patient: { function: 'Mine' } }, version: server.now.version + 1 };
    act(() => draft.serverHas(own));
    await pass(5000);
    expect(result.current.held).toEqual({});
    expect(result.current.saving.kind).toBe('saved');
  });

  it('brings a text from an earlier tab together with what was saved since', async () => {
    server.faults = [offline()];
    const first = open('tab-1');
    first.type('From before');
    first.draft.setOpen(false);
    await pass(5000);
    server.elsewhere({ patient: { function: 'Saved since' } });
    const next = open('tab-2');
    expect(next.result.current.held).toEqual({ patient: ['function'] });
    expect(next.result.current.content.patient.function).toBe('From before');
    await pass(5000);
    expect(server.now.content.patient.function).toBe('Saved since');
  });
});
