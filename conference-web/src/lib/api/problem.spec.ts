import { readProblem } from './problem';

// The shape of the document: RFC 9457, section 3.
const document = {
  type: 'urn:kerfside:problem:invalid',
  title: 'Some fields need mending',
  status: 422,
  detail: 'name is required.',
  errors: [
    { field: 'name', code: 'required', message: 'A person needs a name.' },
    { field: 'name', code: 'length', message: 'Too long.' },
    { field: 'unitId', code: 'unknown', message: 'There is no such unit.' },
  ],
  part: 'database',
};

const answer = (status: number, body: string, headers: Record<string, string> = {}) => new Response(body, { status, headers });

it('reads code, fields and extensions of a problem document', async () => {
  const problem = await readProblem(answer(422, JSON.stringify(document)));
  expect(problem).toMatchObject({ status: 422, code: 'invalid', title: document.title, detail: document.detail, retryAfter: null });
  expect(problem.byField).toEqual({ name: 'A person needs a name.', unitId: 'There is no such unit.' });
  expect(problem.extensions).toMatchObject({ part: 'database' });
});

it('reads after how many seconds to try again', async () => {
  const problem = await readProblem(answer(503, JSON.stringify({ ...document, status: 503 }), { 'retry-after': '5' }));
  expect(problem.retryAfter).toBe(5);
  expect(problem.isPassing).toBe(true);
});

it('makes a problem of a page that a proxy put in between', async () => {
  const problem = await readProblem(answer(502, '<html>Bad gateway</html>'));
  expect(problem).toMatchObject({ status: 502, code: 'unknown', errors: [] });
  expect(problem.detail).toContain('502');
});
