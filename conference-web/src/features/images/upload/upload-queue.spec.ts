import { ApiProblem, offline } from '@/lib/api/problem';
import type { Schemas } from '@/lib/api/types';
import { AT_ONCE, type ImageFields, type SendImage, UploadQueue } from './upload-queue';

interface Sent {
  name: string;
  fields: ImageFields;
  signal: AbortSignal;
  progress: (sent: number, total: number) => void;
  answer: (image: Schemas['ImageDto']) => void;
  refuse: (error: unknown) => void;
}

const image = (id: string): Schemas['ImageDto'] => ({
  id,
  projection: 'ap',
  interval: '',
  caption: '',
  position: 0,
  width: 10,
  height: 10,
  pixelSpacingMm: null,
  uploadedAt: '2026-12-01T00:00:00.000Z',
  addresses: { thumb: '', view: '', full: '' },
});

/** A server whose answers the test gives, one by one. */
function setUp() {
  const sent: Sent[] = [];
  const send: SendImage = (file, fields, { signal, onProgress }) =>
    new Promise((answer, refuse) => {
      signal.addEventListener('abort', () => refuse(new DOMException('cancelled', 'AbortError')));
      sent.push({ name: file.name, fields, signal, progress: onProgress, answer, refuse });
    });
  const done: string[] = [];
  const queue = new UploadQueue(send, ({ id }) => done.push(id));
  const states = () => queue.getSnapshot().map(({ state }) => state.kind);
  const add = (...names: string[]) => queue.add(names.map((name) => new File(['0123456789'], name)));
  return { queue, sent, done, states, add };
}

// a timer comes after every promise that is settled by now
const settled = () => new Promise<void>((resolve) => setTimeout(resolve));

test('nothing is sent before it is started', () => {
  const { queue, sent, states, add } = setUp();
  add('a.png', 'b.png');
  expect(states()).toEqual(['chosen', 'chosen']);
  expect(sent).toHaveLength(0);
  queue.start();
  expect(sent.map(({ name }) => name)).toEqual(['a.png', 'b.png']);
});

test('three at once at most, the next when one is through', async () => {
  const { queue, sent, states, add } = setUp();
  add('a', 'b', 'c', 'd', 'e');
  queue.start();
  expect(sent).toHaveLength(3);
  expect(AT_ONCE).toBe(3);
  expect(states()).toEqual(['sending', 'sending', 'sending', 'waiting', 'waiting']);
  sent[1]!.answer(image('i-b'));
  await settled();
  expect(states()).toEqual(['sending', 'done', 'sending', 'sending', 'waiting']);
  sent[0]!.refuse(offline());
  await settled();
  expect(states()).toEqual(['refused', 'done', 'sending', 'sending', 'sending']);
  expect(sent).toHaveLength(5);
});

test('progress is told, and the server’s reading after it', () => {
  const { queue, sent, states, add } = setUp();
  add('a');
  queue.start();
  sent[0]!.progress(40, 100);
  expect(queue.getSnapshot()[0]!.state).toEqual({ kind: 'sending', sent: 40, total: 100 });
  sent[0]!.progress(100, 100);
  expect(states()).toEqual(['reading']);
});

test('a cancelled one is broken off and lets the next go', async () => {
  const { queue, sent, states, add } = setUp();
  add('a', 'b', 'c', 'd');
  queue.start();
  queue.cancel('upload-2');
  expect(sent[1]!.signal.aborted).toBe(true);
  expect(states()).toEqual(['sending', 'cancelled', 'sending', 'sending']);
  await settled();
  expect(states()).toEqual(['sending', 'cancelled', 'sending', 'sending']);
});

test('a waiting one that is cancelled is never sent', async () => {
  const { queue, sent, add } = setUp();
  add('a', 'b', 'c', 'd');
  queue.start();
  queue.cancel('upload-4');
  sent[0]!.answer(image('i-a'));
  await settled();
  expect(sent.map(({ name }) => name)).toEqual(['a', 'b', 'c']);
});

test('a refused one keeps its reason, and is sent again with what was typed meanwhile', async () => {
  const { queue, sent, states, done, add } = setUp();
  add('scan.txt');
  queue.start();
  const problem = new ApiProblem(415, 'unsupported-type', 'This kind of file is not read', 'The file is of no kind known here.');
  sent[0]!.refuse(problem);
  await settled();
  expect(queue.getSnapshot()[0]!.state).toEqual({ kind: 'refused', problem });
  queue.describe('upload-1', { projection: 'lateral', interval: '9 years after' });
  queue.retry('upload-1');
  expect(sent).toHaveLength(2);
  expect(sent[1]!.fields).toEqual({ projection: 'lateral', interval: '9 years after', caption: '' });
  sent[1]!.answer(image('i-1'));
  await settled();
  expect(states()).toEqual(['done']);
  expect(done).toEqual(['i-1']);
});

test('a late answer to a cancelled try does not touch the new one', async () => {
  const { queue, sent, states, add } = setUp();
  add('a');
  queue.start();
  queue.cancel('upload-1');
  queue.retry('upload-1');
  sent[0]!.progress(10, 10);
  await settled();
  expect(states()).toEqual(['sending']);
  sent[1]!.answer(image('i-a'));
  await settled();
  expect(states()).toEqual(['done']);
});

test('one that is through can not be cancelled or sent twice', async () => {
  const { queue, sent, states, add } = setUp();
  add('a');
  queue.start();
  sent[0]!.answer(image('i-a'));
  await settled();
  queue.cancel('upload-1');
  queue.retry('upload-1');
  queue.start();
  expect(states()).toEqual(['done']);
  expect(sent).toHaveLength(1);
});

test('listeners hear of every change until they leave', () => {
  const { queue, add } = setUp();
  let heard = 0;
  const leave = queue.subscribe(() => heard++);
  add('a');
  expect(heard).toBe(1);
  leave();
  add('b');
  expect(heard).toBe(1);
});
