import { act, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createQueryClient } from '@/lib/query-client';
import { type Answer, problem, sendJson, startApiServer } from '@/testing/api-server';
import { SignedIn, SURGEON } from '@/testing/signed-in';

const CASE = '22222222-2222-4222-8222-222222222222';
const { conferenceId } = SURGEON.memberships[0]!;
const person = (id: string, name: string) => ({ id, name, discipline: 'infection-microbiology', unit: 'Invented Hospital' });
const PRESENTER = person('p1', 'Pia Presenter');
const CASE_DTO = {
  id: CASE,
  conferenceId,
  presenter: PRESENTER,
  images: [],
  content: { plan: { steps: [] } },
  actions: { comment: true },
};
const remark = (id: string, text: string, more: object = {}) => ({
  id,
  threadId: 't1',
  author: person('m1', 'Mia Microbe'),
  replyToId: null,
  content: { type: 'doc', content: [{ type: 'paragraph', content: [{ type: 'text', text }] }] },
  version: 1,
  createdAt: '2026-12-01T10:00:00.000Z',
  editedAt: null,
  deletedAt: null,
  isMine: false,
  isNew: false,
  ...more,
});
const thread = (anchorKind: string, anchorRef: string, remarks: object[], more: object = {}) => ({
  id: 't1',
  anchorKind,
  anchorRef,
  kind: 'remark',
  answeredAt: null,
  createdAt: '2026-12-01T10:00:00.000Z',
  remarks,
  ...more,
});

let threads: object[] = [];
let posting: Answer;
let server: Awaited<ReturnType<typeof startApiServer>>;
let Margin: typeof import('./margin').Margin;

const answer: Answer = (request, response) => {
  if (request.method === 'POST') return posting(request, response);
  if (request.path.endsWith('/threads')) return sendJson(response, 200, { items: threads, unread: 0 });
  if (request.path.endsWith('/members')) return sendJson(response, 200, { items: [{ person: PRESENTER, role: 'surgeon' }] });
  return sendJson(response, 200, CASE_DTO);
};

beforeAll(async () => {
  server = await startApiServer((request, response) => answer(request, response));
  // the API client takes the page's origin when it is loaded
  ({ Margin } = await import('./margin'));
  // ProseMirror asks where things are; jsdom lays nothing out
  Range.prototype.getClientRects ??= () => [] as unknown as DOMRectList;
  Range.prototype.getBoundingClientRect ??= () => new DOMRect();
});
afterAll(() => server.close());
beforeEach(() => {
  localStorage.clear();
  threads = [];
  server.received.length = 0;
});

const open = () => {
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { retry: false } });
  return render(
    <SignedIn client={client}>
      <Margin caseId={CASE} anchorKind="section" anchorRef="patient" />
    </SignedIn>,
  );
};

const typeInEditor = async (text: string) => {
  const area = await screen.findByRole('textbox', { name: 'Remark on Patient' }, { timeout: 15_000 });
  // as the browser gives a pasted text to the editor; jsdom can not type into one
  const clipboardData = { getData: (type: string) => (type === 'text/plain' ? text : ''), types: ['text/plain'], items: [], files: [] };
  act(() => {
    fireEvent.paste(area, { clipboardData });
  });
  await waitFor(() => expect(area).toHaveTextContent(text));
  return area;
};

describe('the margin', () => {
  it('shows the threads of its own anchor only', async () => {
    threads = [thread('section', 'patient', [remark('r1', 'About the patient')]), thread('section', 'plan', [remark('r2', 'About the plan')], { id: 't2' })];
    open();
    expect(await screen.findByText('About the patient')).toBeInTheDocument();
    expect(screen.queryByText('About the plan')).toBeNull();
  });

  it('counts what is new and what is still asked', async () => {
    threads = [thread('section', 'patient', [remark('r1', 'Why this?', { isNew: true }), remark('r2', 'And this')], { kind: 'question' })];
    open();
    expect(await screen.findByRole('button', { name: '2\u00a0remarks, 1 new, 1\u00a0open question' })).toHaveAttribute('aria-expanded', 'false');
    expect(screen.getByText('Question to the presenter: open')).toBeInTheDocument();
  });

  it('leaves a mark where a remark was deleted', async () => {
    threads = [thread('section', 'patient', [remark('r1', 'x', { content: null, deletedAt: '2026-12-02T10:00:00.000Z' })])];
    open();
    expect(await screen.findByText(/A remark by Mia Microbe was deleted/)).toBeInTheDocument();
  });

  it('keeps a text that was begun when the page is left, until it is sent', async () => {
    const first = open();
    await userEvent.click(await screen.findByRole('button', { name: 'Write a remark on Patient' }));
    await typeInEditor('Metal allergy was never tested');
    first.unmount();

    const second = open();
    const area = await screen.findByRole('textbox', { name: 'Remark on Patient' });
    expect(area).toHaveTextContent('Metal allergy was never tested');
    expect(screen.getByText('Kept from before: not sent yet.')).toBeInTheDocument();

    posting = (request, response) => {
      const { content } = JSON.parse(request.body) as { content: object };
      threads = [thread('section', 'patient', [remark('r9', '', { content, isMine: true })])];
      sendJson(response, 201, threads[0]);
    };
    await userEvent.click(screen.getByRole('button', { name: 'Post remark' }));
    await waitFor(() => expect(screen.queryByRole('textbox')).toBeNull());
    expect(await screen.findByText('Metal allergy was never tested')).toBeInTheDocument();
    second.unmount();

    open();
    await screen.findByText('Metal allergy was never tested');
    expect(screen.queryByRole('textbox')).toBeNull();
  });

  it('keeps the text when sending fails, and sends the same again', async () => {
    open();
    await userEvent.click(await screen.findByRole('button', { name: 'Write a remark on Patient' }));
    await userEvent.click(await screen.findByRole('radio', { name: 'Question to the presenter' }));
    const area = await typeInEditor('Which stem is it?');
    posting = (_request, response) => sendJson(response, 503, problem(503, 'unavailable', 'The database can not be reached just now.'));
    await userEvent.click(screen.getByRole('button', { name: 'Ask presenter' }));
    expect(await screen.findByText('The database can not be reached just now.')).toBeInTheDocument();
    expect(area).toHaveTextContent('Which stem is it?');

    posting = (_request, response) => sendJson(response, 201, thread('section', 'patient', [remark('r9', 'Which stem is it?')]));
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    await waitFor(() => expect(screen.queryByRole('textbox')).toBeNull());
    const sent = server.received.filter(({ method }) => method === 'POST').map(({ body }) => JSON.parse(body) as object);
    expect(sent).toHaveLength(2);
    expect(sent[1]).toEqual(sent[0]);
    expect(sent[0]).toMatchObject({ anchorKind: 'section', anchorRef: 'patient', kind: 'question' });
  });

  it('shows the same person’s texts to nobody else', async () => {
    const first = open();
    await userEvent.click(await screen.findByRole('button', { name: 'Write a remark on Patient' }));
    await typeInEditor('Not for others');
    first.unmount();
    render(
      <SignedIn me={{ ...SURGEON, id: '33333333-3333-4333-8333-333333333333' }}>
        <Margin caseId={CASE} anchorKind="section" anchorRef="patient" />
      </SignedIn>,
    );
    expect(within(await screen.findByRole('group', { name: 'Remarks on Patient' })).queryByRole('textbox')).toBeNull();
  });
});

it('goes to the next new remark without pressing anything but the fold', async () => {
  threads = [thread('case', '', [remark('r1', 'First', { isNew: true, isMine: false }), remark('r2', 'Second', { isNew: true, isMine: true })])];
  render(
    <SignedIn>
      <Margin caseId={CASE} anchorKind="case" />
    </SignedIn>,
  );
  Element.prototype.scrollIntoView ??= () => {};
  const next = await screen.findByRole('button', { name: 'Go to the next' });
  await userEvent.click(next);
  expect(screen.getByRole('button', { name: /2.remarks, 2 new/ })).toHaveAttribute('aria-expanded', 'true');
  await userEvent.click(next);
  await waitFor(() => expect(screen.getByText('Second').closest('li')).toHaveFocus());
  expect(screen.queryByRole('alertdialog')).toBeNull();
});
