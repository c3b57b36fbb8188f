import { startApiServer } from '@/testing/api-server';
import { followEvents } from './event-stream';

const head = { 'content-type': 'text/event-stream', 'cache-control': 'no-store' };

let server: Awaited<ReturnType<typeof startApiServer>>;

afterEach(() => server.close());

/** Follows until `enough` messages have come. */
async function follow(origin: string, enough: number, renew = async () => {}) {
  const data: string[] = [];
  const stop = new AbortController();
  await followEvents(
    {
      url: `${origin}/api/events`,
      token: async () => 'token',
      renew,
      pause: () => 5,
      onMessage: (message) => {
        data.push(message.data);
        if (data.length >= enough) stop.abort();
      },
    },
    stop.signal,
  );
  return data;
}

it('goes on after the last event it had when the connection is lost', async () => {
  let connection = 0;
  server = await startApiServer((_, response) => {
    connection += 1;
    response.writeHead(200, head);
    if (connection === 1) response.end('id: 7\ndata: one\n\nid: 8\ndata: two\n\n');
    else response.write('id: 9\ndata: three\n\n');
  });
  expect(await follow(server.origin, 3)).toEqual(['one', 'two', 'three']);
  expect(server.received.map(({ lastEventId }) => lastEventId)).toEqual([null, '8']);
  expect(server.received[0]?.authorization).toBe('Bearer token');
});

// An event may be cut anywhere between two packets: WHATWG HTML, 9.2.6, parses the stream, not its pieces.
it('puts together an event that arrives in pieces', async () => {
  server = await startApiServer((_, response) => {
    response.writeHead(200, head);
    response.write('id: 1\nda');
    setTimeout(() => response.write('ta: whole\n', () => response.write('\n')));
  });
  expect(await follow(server.origin, 1)).toEqual(['whole']);
});

it('renews the token when it is refused, and tries on through failures', async () => {
  const answers = [401, 503, 200];
  let renewed = 0;
  server = await startApiServer((_, response) => {
    const status = answers.shift() ?? 200;
    response.writeHead(status, head);
    if (status === 200) response.write('data: here\n\n');
    else response.end();
  });
  expect(await follow(server.origin, 1, async () => void (renewed += 1))).toEqual(['here']);
  expect(renewed).toBe(1);
  expect(server.received).toHaveLength(3);
});
