import { Bench } from './support.js';

let bench: Bench;

beforeAll(async () => {
  bench = await Bench.start();
  for (const [to, subject] of [
    ['ada@clinic.example', 'one'],
    ['Bo@Clinic.example', 'two'],
    ['ada@clinic.example, bo@clinic.example', 'three'],
    ['ada@clinic.example', 'four'],
  ]) {
    await bench.send({ to, subject, text: 'x' });
  }
});

afterAll(() => bench.stop());

const subjects = (messages: { subject: string }[]) => messages.map(({ subject }) => subject);

describe('GET /api/messages', () => {
  it('lists newest first with the fields that are promised', async () => {
    const messages = await bench.list();
    expect(subjects(messages)).toEqual(['four', 'three', 'two', 'one']);
    expect(Object.keys(messages[0] ?? {}).sort()).toEqual(['date', 'from', 'id', 'subject', 'to']);
  });

  it('filters by a recipient, whatever the case of its letters', async () => {
    expect(subjects(await bench.list({ to: 'BO@clinic.EXAMPLE' }))).toEqual(['three', 'two']);
    expect(await bench.list({ to: 'bo@clinic' })).toEqual([]);
  });

  it('pages with a limit and a link to what follows', async () => {
    const first = await bench.http.get('/api/messages').query({ to: 'ada@clinic.example', limit: 2 }).expect(200);
    expect(subjects(first.body)).toEqual(['four', 'three']);
    expect(first.headers['x-total-count']).toBe('3');
    const [, next] = /^<(.+)>; rel="next"$/.exec(first.headers.link ?? '') ?? [];
    const second = await bench.http.get(next ?? '').expect(200);
    expect(subjects(second.body)).toEqual(['one']);
    expect(second.headers.link).toBeUndefined();
  });
});

describe('bad requests', () => {
  it.each([
    ['/api/messages?limit=0', 422],
    ['/api/messages?limit=501', 422],
    ['/api/messages?limit=ten', 422],
    ['/api/messages?before=nobody', 422],
    ['/api/messages?to=a@b.example&to=c@d.example', 422],
    ['/api/messages/nobody', 404],
    ['/api/messages/..%2f..%2fetc%2fpasswd/raw', 404],
    ['/api/messages/%ff', 400],
    ['/api/nothing', 404],
  ])('GET %s answers %i with a problem document', async (path, status) => {
    expectProblem(await bench.http.get(path), status);
  });

  it.each(['9', '-1', '1e0', 'x'])('has no attachment %s', async (index) => {
    const [message] = await bench.list();
    expectProblem(await bench.http.get(`/api/messages/${message?.id}/attachments/${index}`), 404);
  });

  it.each([
    ['{"mode":', 'application/json', 400],
    ['[]', 'application/json', 400],
    ['mode=refuse', 'application/x-www-form-urlencoded', 415],
    [JSON.stringify({ mode: 'x'.repeat(20_000) }), 'application/json', 413],
  ])('refuses a behaviour of %.20s as %s with %i', async (body, type, status) => {
    expectProblem(await bench.http.put('/api/behaviour').set('Content-Type', type).send(body), status);
  });

  it('refuses a name that only points at this machine', async () => {
    expectProblem(await bench.http.get('/api/messages').set('Host', 'elsewhere.example'), 403);
  });
});

describe('GET /api/health', () => {
  it('answers with the number of messages', async () => {
    const { body } = await bench.http.get('/api/health').expect(200);
    expect(body).toMatchObject({ status: 'ok', messages: 4 });
  });
});

describe('POST /api/deliver', () => {
  it('plays a message to a server on loopback', async () => {
    const target = await Bench.start();
    try {
      const { body } = await bench.http
        .post('/api/deliver')
        .send({
          smtpUrl: `smtp://127.0.0.1:${target.smtpPort}`,
          from: '',
          to: ['reply@clinic.example'],
          raw: 'From: away@clinic.example\nSubject: Abwesend – zurück am 7.\n\n.dot\nGrüße\n',
        })
        .expect(200);
      expect(body.reply).toMatch(/^250 /);
      const message = await target.readNewest();
      expect(message).toMatchObject({ to: ['reply@clinic.example'], subject: 'Abwesend – zurück am 7.' });
      expect(await target.readRaw(message.id)).toContain('\r\n.dot\r\n');
    } finally {
      await target.stop();
    }
  });

  it('tells what the other server answered when it refuses', async () => {
    const target = await Bench.start();
    try {
      await target.behave({ mode: 'refuse', code: 550 });
      const response = await bench.http.post('/api/deliver').send({
        smtpUrl: `smtp://localhost:${target.smtpPort}`,
        from: 'a@b.example',
        to: 'c@d.example',
        raw: 'Subject: x\n\nx',
      });
      expectProblem(response, 502);
      expect(response.body.detail).toContain('550');
    } finally {
      await target.stop();
    }
  });

  it.each([
    [{ smtpUrl: 'smtp://192.0.2.1:25' }, 'smtpUrl'],
    [{ smtpUrl: 'smtp://127.0.0.1.clinic.example:25' }, 'smtpUrl'],
    [{ smtpUrl: 'http://127.0.0.1:25' }, 'smtpUrl'],
    [{ to: 'a@b.example>\r\nRCPT TO:<c@d.example' }, 'to'],
    [{ from: 'not an address' }, 'from'],
    [{ raw: 7 }, 'raw'],
  ])('refuses %j', async (change, field) => {
    const good = { smtpUrl: 'smtp://127.0.0.1:9', from: 'a@b.example', to: 'c@d.example', raw: 'Subject: x\n\nx' };
    const response = await bench.http.post('/api/deliver').send({ ...good, ...change });
    expectProblem(response, 422);
    expect(response.body.errors.map((error: { field: string }) => error.field)).toEqual([field]);
  });
});

function expectProblem(response: { status: number; headers: Record<string, string>; body: object }, status: number) {
  expect(response.headers['content-type']).toMatch(/^application\/problem\+json/);
  expect(response.status).toBe(status);
  expect(response.body).toMatchObject({
    type: expect.stringMatching(/./),
    title: expect.stringMatching(/./),
    status,
    detail: expect.stringMatching(/./),
  });
}
