import { countThreads, threadsAt } from './anchors';
import type { Remark, Thread } from './api/list-threads';

const remark = (more: Partial<Remark> = {}) => ({ id: 'r', deletedAt: null, isNew: false, ...more }) as Remark;
const thread = (id: string, anchorKind: Thread['anchorKind'], anchorRef: string, more: Partial<Thread> = {}): Thread => ({
  id,
  anchorKind,
  anchorRef,
  kind: 'remark',
  answeredAt: null,
  createdAt: `2026-12-0${id}T10:00:00.000Z`,
  remarks: [remark()],
  ...more,
});
const found = { images: [{ id: 'i1' }], content: { plan: { steps: [{ id: 's1', kind: 'liner', method: '' }] } } } as unknown as Parameters<typeof threadsAt>[2];
const ids = (threads: Thread[]) => threads.map(({ id }) => id);

const ALL = [thread('4', 'image', 'gone'), thread('3', 'step', 's1'), thread('2', 'step', 'gone'), thread('1', 'case', ''), thread('5', 'image', 'i1'), thread('6', 'section', 'patient')];

it('puts each thread at its anchor', () => {
  expect(ids(threadsAt(ALL, { anchorKind: 'step', anchorRef: 's1' }, found))).toEqual(['3']);
  expect(ids(threadsAt(ALL, { anchorKind: 'image', anchorRef: 'i1' }, found))).toEqual(['5']);
  expect(ids(threadsAt(ALL, { anchorKind: 'section', anchorRef: 'patient' }, found))).toEqual(['6']);
});

it('shows what was said of a step or image that is gone with the whole case, oldest first', () => {
  expect(ids(threadsAt(ALL, { anchorKind: 'case' }, found))).toEqual(['1', '2', '4']);
});

it('loses no thread and shows none twice', () => {
  const anchors = [{ anchorKind: 'case' as const }, { anchorKind: 'step' as const, anchorRef: 's1' }, { anchorKind: 'image' as const, anchorRef: 'i1' }, { anchorKind: 'section' as const, anchorRef: 'patient' }];
  const shown = anchors.flatMap((anchor) => ids(threadsAt(ALL, anchor, found)));
  expect([...shown].sort()).toEqual([...ids(ALL)].sort());
});

it('counts no deleted remark, and questions only while they are open', () => {
  const counts = countThreads([
    thread('1', 'case', '', { kind: 'question', remarks: [remark({ isNew: true }), remark({ deletedAt: '2026-12-01' })] }),
    thread('2', 'case', '', { kind: 'question', answeredAt: '2026-12-01' }),
  ]);
  expect(counts).toEqual({ remarks: 2, fresh: 1, openQuestions: 1 });
});
