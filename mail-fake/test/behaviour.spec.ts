import { Bench, swaks, until } from './support.js';

// Reply codes: RFC 5321 4.2.3 and 3.1; 4xx may be tried again, 5xx may not (4.2.1).
const MAIL = { to: 'ada@clinic.example', subject: 'x', text: 'x' };
let bench: Bench;

beforeEach(async () => {
  bench = await Bench.start();
});

afterEach(() => bench.stop());

describe('set to refuse', () => {
  it.each([
    [{ mode: 'refuse' }, 451],
    [{ mode: 'refuse', code: 550 }, 550],
    [{ mode: 'refuse', code: 451, at: 'data' }, 451],
    [{ mode: 'refuse', code: 550, at: 'data' }, 550],
    [{ mode: 'refuse', code: 451, at: 'connect' }, 421],
    [{ mode: 'refuse', code: 550, at: 'connect' }, 554],
  ])('%j answers %i and keeps nothing', async (settings, responseCode) => {
    await bench.behave(settings);
    await expect(bench.send(MAIL)).rejects.toMatchObject({ responseCode });
    expect(await bench.list()).toEqual([]);
  });

  it('is told to swaks as well', async () => {
    await bench.behave({ mode: 'refuse', code: 550 });
    const { code, output } = await swaks('--server', `127.0.0.1:${bench.smtpPort}`, '--to', 'ada@clinic.example');
    expect(output).toMatch(/<\*\* +550 /);
    expect(code).not.toBe(0);
  });

  it('takes mail again once it is set back', async () => {
    await bench.behave({ mode: 'refuse' });
    await expect(bench.send(MAIL)).rejects.toMatchObject({ responseCode: 451 });
    await bench.behave({ mode: 'accept' });
    await bench.send(MAIL);
    expect(await bench.list()).toHaveLength(1);
  });
});

describe('set to delay', () => {
  it.each(['connect', 'rcpt', 'data'])('answers late at %s and keeps the message', async (at) => {
    await bench.behave({ mode: 'delay', delayMs: 400, at });
    const start = performance.now();
    await bench.send(MAIL);
    // Timers may fire a millisecond early.
    expect(performance.now() - start).toBeGreaterThanOrEqual(398);
    expect(await bench.list()).toHaveLength(1);
  });

  it('keeps the message of a sender who did not wait for the last answer', async () => {
    await bench.behave({ mode: 'delay', delayMs: 60_000, at: 'data' });
    await expect(bench.send(MAIL, { socketTimeout: 300 })).rejects.toMatchObject({ code: 'ETIMEDOUT' });
    expect(await bench.list()).toHaveLength(1);
  });

  it('does not hold up stopping', async () => {
    await bench.behave({ mode: 'delay', delayMs: 600_000, at: 'data' });
    const sending = expect(bench.send(MAIL)).rejects.toMatchObject({ responseCode: 421 });
    await until('the message is kept and its answer held back', async () => (await bench.list()).length === 1);
    const start = performance.now();
    await bench.restart();
    await sending;
    expect(performance.now() - start).toBeLessThan(5000);
  });
});

describe('the switch', () => {
  it('shows what it is set to, and accepts at the start', async () => {
    const read = async () => (await bench.http.get('/api/behaviour').expect(200)).body;
    expect(await read()).toEqual({ mode: 'accept', delayMs: 0, code: 451, at: 'rcpt' });
    await bench.behave({ mode: 'delay', delayMs: 250, at: 'data' });
    expect(await read()).toEqual({ mode: 'delay', delayMs: 250, code: 451, at: 'data' });
  });

  it.each([
    [{}, 'mode'],
    [{ mode: 'explode' }, 'mode'],
    [{ mode: 'refuse', code: 200 }, 'code'],
    [{ mode: 'refuse', at: 'quit' }, 'at'],
    [{ mode: 'delay' }, 'delayMs'],
    [{ mode: 'delay', delayMs: -1 }, 'delayMs'],
    [{ mode: 'delay', delayMs: '100' }, 'delayMs'],
    [{ mode: 'delay', delayMs: 600_001 }, 'delayMs'],
    [{ mode: 'accept', speed: 1 }, 'speed'],
  ])('refuses %j and stays as it was', async (body, field) => {
    await bench.behave({ mode: 'refuse', code: 550 });
    const response = await bench.http.put('/api/behaviour').send(body).expect(422);
    expect(response.headers['content-type']).toMatch(/^application\/problem\+json/);
    expect(response.body.errors.map((error: { field: string }) => error.field)).toEqual([field]);
    expect((await bench.http.get('/api/behaviour')).body).toMatchObject({ mode: 'refuse', code: 550 });
  });
});
