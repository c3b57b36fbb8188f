import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { type Answer, problem, sendJson, startApiServer } from '@/testing/api-server';
import { SignedIn, SURGEON } from '@/testing/signed-in';
import type { Decision } from '../api/list-decisions-of-case';
import { DraftSaver } from '../draft-saver';

const content = { chosenOptionId: 'a', text: 'Two stages', conditions: '', timing: '', dissent: [] };
const DRAFT = { id: 'd1', caseId: 'case-1', conferenceName: 'Hip revision', kind: 'decision', revision: 4, content } as unknown as Decision;

let signing: Answer;
let server: Awaited<ReturnType<typeof startApiServer>>;
let SignDecision: typeof import('./sign-decision').SignDecision;

beforeAll(async () => {
  server = await startApiServer((request, response) => signing(request, response));
  ({ SignDecision } = await import('./sign-decision'));
});
afterAll(() => server.close());
beforeEach(() => {
  server.received.length = 0;
});

const saverThat = (save: DraftSaver['saveNow'], revision = 4) => {
  const saver = new DraftSaver({ revision, content }, { save: async () => ({ revision, content }), keep: () => {} });
  return Object.assign(saver, { saveNow: save });
};
const open = (saver: DraftSaver, lacks: string[] = []) =>
  render(
    <SignedIn>
      <SignDecision draft={DRAFT} saver={saver} lacks={lacks} />
    </SignedIn>,
  );
const sent = () => server.received.filter(({ path }) => path.endsWith('/sign')).map(({ body }) => JSON.parse(body) as object);

it('signs once, however often the button is pressed', async () => {
  let finish = () => {};
  signing = (_request, response) => void (finish = () => sendJson(response, 200, { ...DRAFT, state: 'signed' }));
  open(saverThat(async () => true));
  await userEvent.click(screen.getByRole('button', { name: 'Sign decision' }));
  await userEvent.type(await screen.findByLabelText(`Password of ${SURGEON.name}`), 'several words');
  const form = screen.getByRole('dialog').querySelector('form')!;
  fireEvent.submit(form);
  fireEvent.submit(form);
  await waitFor(() => expect(sent()).toHaveLength(1));
  fireEvent.submit(form);
  finish();
  await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  expect(sent()).toEqual([{ baseRevision: 4, password: 'several words' }]);
});

it('says what signing means, and clears a wrong password', async () => {
  signing = (_request, response) =>
    sendJson(response, 422, problem(422, 'invalid', 'Wrong', { errors: [{ field: 'password', code: 'wrong-password', message: 'This is not your password.' }] }));
  open(saverThat(async () => true));
  await userEvent.click(screen.getByRole('button', { name: 'Sign decision' }));
  expect(await screen.findByText(/Nobody can change it afterwards/)).toBeInTheDocument();
  const password = screen.getByLabelText(`Password of ${SURGEON.name}`);
  await userEvent.type(password, 'wrong words{Enter}');
  expect(await screen.findByText('This is not your password.')).toBeInTheDocument();
  expect(password).toHaveValue('');
});

it('opens only when what is on the screen is saved', async () => {
  open(saverThat(async () => false));
  await userEvent.click(screen.getByRole('button', { name: 'Sign decision' }));
  expect(screen.queryByRole('dialog')).toBeNull();
});

it('is held back while something lacks, and says what', () => {
  open(saverThat(async () => true), ['Close the second round.']);
  expect(screen.getByRole('button', { name: 'Sign decision' })).toBeDisabled();
  expect(screen.getByText('Close the second round.')).toBeInTheDocument();
});
