import { createQueryClient } from '@/lib/query-client';
import { problem, sendJson, startApiServer } from '@/testing/api-server';

const remark = (id: string, isNew: boolean) => ({ id, isNew, deletedAt: null });
let server: Awaited<ReturnType<typeof startApiServer>>;
let answers: number[] = [];
let reading: typeof import('./reading');
let threads: typeof import('./api/list-threads');

beforeAll(async () => {
  server = await startApiServer((_request, response) => {
    const status = answers.shift() ?? 204;
    if (status === 204) response.writeHead(204).end();
    else sendJson(response, status, problem(status, 'unavailable', 'The database can not be reached just now.'));
  });
  reading = await import('./reading');
  threads = await import('./api/list-threads');
});
afterAll(() => server.close());
beforeEach(() => {
  answers = [];
  server.received.length = 0;
});

function caseWith(caseId: string, ...remarks: object[]) {
  const client = createQueryClient();
  client.setQueryData(threads.threadsQuery(caseId).queryKey, { items: [{ remarks }], unread: 0 } as never);
  return client;
}
const put = () => server.received.filter(({ method }) => method === 'PUT').map(({ path }) => path);
const until = async (isTrue: () => boolean) => {
  while (!isTrue()) await new Promise((resolve) => setTimeout(resolve, 2));
};

it('marks a case as read when the last of its new remarks was seen, not before', async () => {
  const client = caseWith('case-1', remark('a', true), remark('b', false), remark('c', true));
  reading.noteSeen(client, 'case-1', 'a');
  expect(put()).toEqual([]);
  reading.noteSeen(client, 'case-1', 'c');
  await until(() => put().length > 0);
  expect(put()).toEqual(['/api/cases/case-1/read']);
});

it('tries again at the next one that is seen, when marking failed', async () => {
  answers = [503];
  const client = caseWith('case-2', remark('a', true));
  reading.noteSeen(client, 'case-2', 'a');
  await until(() => put().length === 1);
  await until(() => {
    reading.noteSeen(client, 'case-2', 'a');
    return put().length > 1;
  });
  expect(put().at(-1)).toBe('/api/cases/case-2/read');
});
