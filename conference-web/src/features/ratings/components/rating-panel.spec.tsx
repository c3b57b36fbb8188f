import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { type Answer, problem, sendJson, startApiServer } from '@/testing/api-server';
import { SignedIn } from '@/testing/signed-in';

const OPTIONS = [
  { id: 'a', title: 'One stage', description: '', isProposal: true },
  { id: 'b', title: 'Two stages', description: '', isProposal: false },
];
const ROUND = {
  id: 'round-1',
  number: 1,
  state: 'open',
  openedAt: '2026-12-01T10:00:00.000Z',
  closedAt: null,
  caseVersion: 3,
  options: OPTIONS,
  given: 4,
  eligible: 11,
  mine: null,
  earlier: [],
  figures: null,
  reasons: null,
};
const ballot = (revision: number, a: number, b: number) => ({
  revision,
  at: `2026-12-0${revision}T10:00:00.000Z`,
  ratings: [
    { optionId: 'a', value: a },
    { optionId: 'b', value: b },
  ],
  preferredOptionId: 'b',
  reason: `Reason ${revision}`,
});
const figures = (optionId: string, title: string, values: number[], median: number) => ({
  optionId,
  title,
  n: values.length,
  median,
  low: values[0],
  high: values.at(-1),
  values,
  preferredBy: 1,
});
const RATED = {
  ...ROUND,
  given: 5,
  mine: ballot(2, 3, 8),
  earlier: [ballot(1, 5, 5)],
  figures: [figures('a', 'One stage', [2, 3, 3, 5, 7], 3), figures('b', 'Two stages', [7, 7, 8, 8, 9], 8)],
  reasons: [{ text: 'The bug is sensitive', person: null }],
};

let rounds: object[] = [];
let mayRate = true;
let putting: Answer;
let server: Awaited<ReturnType<typeof startApiServer>>;
let RatingPanel: typeof import('./rating-panel').RatingPanel;

beforeAll(async () => {
  server = await startApiServer((request, response) =>
    request.method === 'PUT' ? putting(request, response) : sendJson(response, 200, { rounds, mayRate }),
  );
  ({ RatingPanel } = await import('./rating-panel'));
});
afterAll(() => server.close());
beforeEach(() => {
  localStorage.clear();
  server.received.length = 0;
  rounds = [ROUND];
  mayRate = true;
});

const open = () =>
  render(
    <SignedIn>
      <RatingPanel caseId="22222222-2222-4222-8222-222222222222" />
    </SignedIn>,
  );
const scale = (title: string) => screen.findByRole('radiogroup', { name: `How appropriate is: ${title}` });
const sent = () => server.received.filter(({ method }) => method === 'PUT').map(({ body }) => JSON.parse(body) as Record<string, unknown>);

describe('giving a rating', () => {
  it('is blind and says so, with the count of those who have rated', async () => {
    const { container } = open();
    expect(await screen.findByText('Round 1 is open. 4 of 11 have rated.')).toBeInTheDocument();
    expect(screen.getByText(/shown when your own rating is in/)).toBeInTheDocument();
    expect(container.querySelectorAll('circle')).toHaveLength(0);
  });

  it('takes every option by keyboard, the preferred one and the reason', async () => {
    putting = (_request, response) => sendJson(response, 200, { rounds: [RATED], mayRate: true });
    open();
    within(await scale('One stage')).getByRole('radio', { name: '1, inappropriate' }).focus();
    await userEvent.keyboard('3');
    within(await scale('Two stages')).getByRole('radio', { name: '1, inappropriate' }).focus();
    await userEvent.keyboard('7{ArrowRight}');
    await userEvent.selectOptions(screen.getByRole('combobox', { name: /Preferred option/ }), 'Two stages');
    await userEvent.type(screen.getByRole('textbox', { name: /Why/ }), 'Sensitive organism');
    await userEvent.click(screen.getByRole('button', { name: 'Give rating' }));
    expect(await screen.findByText('The bug is sensitive')).toBeInTheDocument();
    expect(sent()).toEqual([
      {
        ratings: [
          { optionId: 'a', value: 3 },
          { optionId: 'b', value: 8 },
        ],
        preferredOptionId: 'b',
        reason: 'Sensitive organism',
      },
    ]);
  });

  it('sends nothing while an option has no rating, and goes to it', async () => {
    open();
    await userEvent.click(within(await scale('One stage')).getByRole('radio', { name: '6, uncertain' }));
    await userEvent.click(screen.getByRole('button', { name: 'Give rating' }));
    const second = await scale('Two stages');
    expect(within(second).getByText('Rate this option from 1 to 9.')).toBeInTheDocument();
    expect(second).toContainElement(document.activeElement as HTMLElement);
    expect(sent()).toEqual([]);
  });

  it('keeps what was given when it is refused, and when the page is left', async () => {
    putting = (_request, response) => sendJson(response, 409, problem(409, 'wrong-stage', 'This round is closed; the rating was not taken.'));
    const first = open();
    await userEvent.click(within(await scale('One stage')).getByRole('radio', { name: '6, uncertain' }));
    await userEvent.click(within(await scale('Two stages')).getByRole('radio', { name: '9, appropriate' }));
    await userEvent.click(screen.getByRole('button', { name: 'Give rating' }));
    expect(await screen.findByText('This round is closed; the rating was not taken.')).toBeInTheDocument();
    first.unmount();
    open();
    expect(within(await scale('Two stages')).getByRole('radio', { name: '9, appropriate' })).toBeChecked();
  });
});

describe('what the panel gave', () => {
  it('is shown after the own rating: dots, counts without a verdict for a small panel, reasons', async () => {
    rounds = [RATED];
    const { container } = open();
    expect(await screen.findByText(/3 inappropriate, 1 uncertain, 1 appropriate/)).toBeInTheDocument();
    expect(container.querySelectorAll('circle')).toHaveLength(10);
    expect(screen.getByText(/given as counts, without a verdict/)).toBeInTheDocument();
    expect(screen.queryByText(/^Appropriate/)).toBeNull();
  });

  it('has a verdict from eight ratings on', async () => {
    rounds = [{ ...RATED, figures: [figures('a', 'One stage', [1, 2, 2, 3, 3, 4, 5, 9], 3), figures('b', 'Two stages', [7, 7, 7, 8, 8, 8, 9, 9], 8)] }];
    open();
    expect(await screen.findByText(/Appropriate: 0 inappropriate, 0 uncertain, 8 appropriate/)).toBeInTheDocument();
  });

  it('keeps earlier ratings in sight when one is changed', async () => {
    rounds = [RATED];
    putting = (_request, response) => sendJson(response, 200, { rounds: [{ ...RATED, mine: ballot(3, 3, 9), earlier: [ballot(1, 5, 5), ballot(2, 3, 8)] }], mayRate: true });
    open();
    await userEvent.click(await screen.findByRole('button', { name: 'Change my rating' }));
    expect(within(await scale('Two stages')).getByRole('radio', { name: '8, appropriate' })).toBeChecked();
    await userEvent.click(within(await scale('Two stages')).getByRole('radio', { name: '9, appropriate' }));
    await userEvent.click(screen.getByRole('button', { name: 'Change my rating' }));
    await waitFor(() => expect(screen.getByText('My ratings in round 1: changed 2 times')).toBeInTheDocument());
    expect(screen.getByText('Reason 1')).toBeInTheDocument();
    expect(screen.getAllByText(/Earlier, no longer counted/)).toHaveLength(2);
  });

  it('offers no rating to who may not rate', async () => {
    mayRate = false;
    open();
    expect(await screen.findByText(/shown when this round is closed/)).toBeInTheDocument();
    expect(screen.queryByRole('radiogroup')).toBeNull();
    expect(screen.getByText('One stage: a rule from 1 to 9, no ratings shown.')).toBeInTheDocument();
  });
});
