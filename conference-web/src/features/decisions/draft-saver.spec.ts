import { ApiProblem, offline } from '@/lib/api/problem';
import type { DecisionContent } from './api/list-decisions-of-case';
import { DraftSaver, type SavedDraft } from './draft-saver';

const content = (text: string): DecisionContent => ({ chosenOptionId: 'a', text, conditions: '', timing: '', dissent: [] });
const stale = (revision: number, text: string) =>
  new ApiProblem(409, 'stale-version', 'Changed meanwhile', 'The draft was changed meanwhile.', [], { currentRevision: revision, current: content(text) });

/** A server that holds one draft and refuses what was not written on its newest revision. */
function draftServer(start: SavedDraft) {
  let held = start;
  let failures: Error[] = [];
  const calls: { text: string; base: number }[] = [];
  let inFlight = 0;
  let mostInFlight = 0;
  return {
    calls,
    held: () => held,
    mostInFlight: () => mostInFlight,
    failNext: (...errors: Error[]) => (failures = errors),
    writeElsewhere: (text: string) => (held = { revision: held.revision + 1, content: content(text) }),
    save: async (sent: DecisionContent, base: number): Promise<SavedDraft> => {
      calls.push({ text: sent.text, base });
      mostInFlight = Math.max(mostInFlight, ++inFlight);
      await new Promise((resolve) => setTimeout(resolve, 5));
      inFlight -= 1;
      const failure = failures.shift();
      if (failure) throw failure;
      if (base !== held.revision) throw stale(held.revision, held.content.text);
      held = { revision: base + 1, content: sent };
      return held;
    },
  };
}

function begin(start: SavedDraft = { revision: 1, content: content('') }, unsaved: SavedDraft | null = null) {
  const server = draftServer(start);
  const kept: (SavedDraft | null)[] = [];
  const saver = new DraftSaver(start, { save: server.save, keep: (text) => kept.push(text), pause: 1, retryPause: () => 1 }, unsaved);
  const until = (isTrue: () => boolean) =>
    new Promise<void>((resolve) => {
      const look = () => isTrue() && (stop(), resolve());
      const stop = saver.subscribe(look);
      look();
    });
  return { server, saver, kept, until, kind: () => saver.getView().saving.kind };
}

it('saves the last of what was typed, one request at a time', async () => {
  const { server, saver, kept, until, kind } = begin();
  for (const text of ['T', 'Tw', 'Two']) saver.change({ text });
  await until(() => kind() === 'saving');
  saver.change({ text: 'Two stages' });
  await until(() => kind() === 'saved' && server.held().content.text === 'Two stages');
  expect(server.calls.map(({ text }) => text)).toEqual(['Two', 'Two stages']);
  expect(server.mostInFlight()).toBe(1);
  expect(saver.getRevision()).toBe(3);
  expect(kept.at(-1)).toBeNull();
});

it('keeps the text while it is not saved, and tries again by itself', async () => {
  const { server, saver, kept, until, kind } = begin();
  server.failNext(offline(), offline());
  saver.change({ text: 'Two stages' });
  expect(kept.at(-1)?.content.text).toBe('Two stages');
  await until(() => kind() === 'failed');
  expect(kept.at(-1)?.content.text).toBe('Two stages');
  await until(() => kind() === 'saved');
  expect(server.held().content.text).toBe('Two stages');
});

it('does not try again what is refused for its content', async () => {
  const { server, saver, until, kind } = begin();
  server.failNext(new ApiProblem(422, 'invalid', 'Some fields need mending', 'A dissent is of somebody who was at the meeting.'));
  saver.change({ text: 'Two stages' });
  await until(() => kind() === 'failed');
  expect(saver.getView().saving).toEqual({ kind: 'failed', retrying: false });
  expect(await saver.saveNow()).toBe(true);
  expect(server.calls).toHaveLength(2);
});

describe('when somebody else saved meanwhile', () => {
  it('overwrites nothing: shows theirs beside mine', async () => {
    const { server, saver, until, kind } = begin();
    server.writeElsewhere('One stage');
    saver.change({ text: 'Two stages' });
    await until(() => kind() === 'conflict');
    expect(server.held().content.text).toBe('One stage');
    expect(saver.getView().conflict?.theirs.text).toBe('One stage');
    expect(saver.getView().content.text).toBe('Two stages');
    expect(await saver.saveNow()).toBe(false);
  });

  it('goes on with mine on top of theirs, or with theirs', async () => {
    const mine = begin();
    mine.server.writeElsewhere('One stage');
    mine.saver.change({ text: 'Two stages' });
    await mine.until(() => mine.kind() === 'conflict');
    mine.saver.settle('mine');
    await mine.until(() => mine.kind() === 'saved');
    expect(mine.server.held()).toMatchObject({ revision: 3, content: { text: 'Two stages' } });

    const theirs = begin();
    theirs.server.writeElsewhere('One stage');
    theirs.saver.change({ text: 'Two stages' });
    await theirs.until(() => theirs.kind() === 'conflict');
    theirs.saver.settle('theirs');
    expect(theirs.saver.getView().content.text).toBe('One stage');
    expect(theirs.kept.at(-1)).toBeNull();
    expect(theirs.saver.getRevision()).toBe(2);
  });

  it('takes theirs over at once where nothing was being written here', () => {
    const { saver } = begin();
    saver.serverHas({ revision: 4, content: content('One stage') });
    expect(saver.getView().content.text).toBe('One stage');
    expect(saver.getRevision()).toBe(4);
  });
});

it('saves what an earlier page could not', async () => {
  const { server, until, kind } = begin({ revision: 2, content: content('Two') }, { revision: 2, content: content('Two stages') });
  await until(() => kind() === 'saved');
  expect(server.held().content.text).toBe('Two stages');
});
