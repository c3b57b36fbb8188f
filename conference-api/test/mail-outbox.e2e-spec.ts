import { createServer, type Server, type Socket } from 'node:net';
import type { AddressInfo } from 'node:net';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { OutboxMail } from '../src/mail/entities/outbox-mail.entity.js';
import { OutboxSender } from '../src/mail/outbox-sender.service.js';
import { makeDatabase, startTestApp, type TestApp } from './support/test-app.js';
import { type MailServer, startMailServer } from './support/mail-server.js';

let lastNumber = 0;
/** An address that no other test uses. */
const someone = () => `member${++lastNumber}.${process.pid}@kerfside.example`;

const HOUR = 3_600_000;
const later = (milliseconds: number) => new Date(Date.now() + milliseconds);

describe('the outbox', () => {
  let mail: MailServer;
  let test: TestApp;
  let other: TestApp;
  let database: Awaited<ReturnType<typeof makeDatabase>>;
  let sender: OutboxSender;

  const put = (recipient: string, purpose = `rating-due:${recipient}`, app = test, template = 'rating-due') =>
    app.app.get(UnitOfWork).run(null, (tx) =>
      tx.mail([{ purpose, personId: null, recipient, template, data: { name: 'Ada Fell', code: 'HIP-0042', url: 'http://kerfside.test/cases/1', expires: '2026-12-14T07:30:00Z' } }]),
    );
  const rowOf = (recipient: string) => test.dataSource.manager.findOneByOrFail(OutboxMail, { recipient });

  beforeAll(async () => {
    mail = await startMailServer();
    database = await makeDatabase();
    test = await startTestApp({ KERFSIDE_SMTP_URL: mail.smtpUrl }, database.url);
    await test.dataSource.runMigrations({ transaction: 'none' });
    other = await startTestApp({ KERFSIDE_SMTP_URL: mail.smtpUrl }, database.url);
    sender = test.app.get(OutboxSender);
  });

  afterAll(async () => {
    await test?.close();
    await other?.close();
    await database?.drop();
    await mail?.remove();
  });

  afterEach(async () => {
    await mail.start();
    await mail.behave({ mode: 'accept' });
    await test.dataSource.manager.clear(OutboxMail);
  });

  it('sends a mail whole, with text, HTML and headers that stop automatic answers', async () => {
    const address = someone();
    await put(address);
    expect(await sender.sendDue()).toEqual({ sent: 1, putBack: 0, failed: 0, uncertain: 0 });
    const [caught, ...more] = await mail.to(address);
    expect(more).toEqual([]);
    expect(caught!.subject).toBe('HIP-0042: your rating is due');
    expect(caught!.from).toBe('no-reply@kerfside.example');
    expect(caught!.text).toContain('http://kerfside.test/cases/1');
    expect(caught!.html).toContain('href="http://kerfside.test/cases/1"');
    // RFC 3834, 5
    expect(caught!.headers['auto-submitted']).toBe('auto-generated');
    const row = await rowOf(address);
    expect(caught!.headers['message-id']).toBe(row.messageId);
    expect(row).toMatchObject({ state: 'sent', attempts: 1, lastError: null, claimedBy: null });
    expect(row.sentAt).toBeInstanceOf(Date);
  });

  it('keeps lines that begin with a dot (RFC 5321, 4.5.2)', async () => {
    const address = someone();
    await test.app.get(UnitOfWork).run(null, (tx) =>
      tx.mail([{ purpose: address, personId: null, recipient: address, template: 'mention', data: { name: '.', code: 'HIP-0042', author: `${'word '.repeat(11)}\n. Moor`, url: 'http://kerfside.test/' } }]),
    );
    await sender.sendDue();
    const [caught] = await mail.to(address);
    expect(caught!.text.split('\n').some((line) => /^\.,? /.test(line))).toBe(true);
  });

  it('writes one purpose once', async () => {
    const address = someone();
    await put(address, 'one-purpose');
    await put(address, 'one-purpose');
    await Promise.all([put(address, 'one-purpose'), put(address, 'one-purpose', other)]);
    await sender.sendDue();
    expect(await mail.to(address)).toHaveLength(1);
  });

  it('gives each person exactly one mail with two processes at work', async () => {
    const addresses = Array.from({ length: 60 }, someone);
    for (const address of addresses) await put(address);
    const results = await Promise.all([sender.sendDue(), other.app.get(OutboxSender).sendDue()]);
    expect(results[0].sent + results[1].sent).toBe(60);
    for (const address of addresses) expect(await mail.to(address)).toHaveLength(1);
  });

  it('sends the more urgent first', async () => {
    const [slow, quick] = [someone(), someone()];
    await put(slow);
    await test.app.get(UnitOfWork).run(null, (tx) =>
      tx.mail([{ purpose: quick, personId: null, recipient: quick, template: 'mention', data: { name: 'A', code: 'C', author: 'B', url: 'http://kerfside.test/' }, priority: 1 }]),
    );
    await sender.sendDue();
    const [slowRow, quickRow] = [await rowOf(slow), await rowOf(quick)];
    expect(quickRow.sentAt!.getTime()).toBeLessThanOrEqual(slowRow.sentAt!.getTime());
    expect((await mail.to(quick))[0]!.date <= (await mail.to(slow))[0]!.date).toBe(true);
  });

  it('tries again after a temporary refusal, with growing pauses, and sends one', async () => {
    const address = someone();
    await put(address);
    await mail.behave({ mode: 'refuse', code: 451, at: 'rcpt' });
    expect((await sender.sendDue()).putBack).toBe(1);
    const first = await rowOf(address);
    expect(first).toMatchObject({ state: 'queued', attempts: 1, lastError: 'The mail server refused it for now (451 at RCPT TO).' });
    // not due yet: nothing is tried
    expect(await sender.sendDue()).toEqual({ sent: 0, putBack: 0, failed: 0, uncertain: 0 });
    await sender.sendDue(later(10_000));
    const second = await rowOf(address);
    expect(second.attempts).toBe(2);
    expect(second.nextAttemptAt.getTime() - Date.now()).toBeGreaterThan(first.nextAttemptAt.getTime() - Date.now());
    await mail.behave({ mode: 'accept' });
    expect((await sender.sendDue(later(HOUR))).sent).toBe(1);
    expect(await mail.to(address)).toHaveLength(1);
  });

  it('tries again where the whole mail is refused for now, and the server has kept nothing', async () => {
    const address = someone();
    await put(address);
    await mail.behave({ mode: 'refuse', code: 451, at: 'data' });
    expect((await sender.sendDue()).putBack).toBe(1);
    expect(await rowOf(address)).toMatchObject({ state: 'queued', lastError: 'The mail server refused it for now (451 at DATA).' });
    await mail.behave({ mode: 'accept' });
    await sender.sendDue(later(HOUR));
    expect(await mail.to(address)).toHaveLength(1);
  });

  it.each(['rcpt', 'data'] as const)('gives up after a refusal for good at %s', async (at) => {
    const address = someone();
    await put(address);
    await mail.behave({ mode: 'refuse', code: 550, at });
    expect((await sender.sendDue()).failed).toBe(1);
    const row = await rowOf(address);
    expect(row.state).toBe('failed');
    expect(row.lastError).not.toContain('@');
    await mail.behave({ mode: 'accept' });
    expect((await sender.sendDue(later(HOUR))).sent).toBe(0);
    expect(await mail.to(address)).toEqual([]);
  });

  it('keeps everything while the mail server is away, and sends it when it is back', async () => {
    const addresses = [someone(), someone(), someone()];
    for (const address of addresses) await put(address);
    await mail.stop();
    expect((await sender.sendDue()).putBack).toBe(3);
    for (const address of addresses) expect(await rowOf(address)).toMatchObject({ state: 'queued', lastError: 'The mail server can not be reached (ECONNREFUSED).' });
    await mail.start();
    expect((await sender.sendDue(later(60_000))).sent).toBe(3);
    for (const address of addresses) expect(await mail.to(address)).toHaveLength(1);
  });

  it('does not wait longer than a minute for a server that is away, however long it was', async () => {
    const address = someone();
    await put(address);
    await mail.stop();
    for (let time = 1; time <= 8; time++) await sender.sendDue(later(time * HOUR));
    const row = await rowOf(address);
    expect(row.attempts).toBe(8);
    expect(row.nextAttemptAt.getTime()).toBeLessThanOrEqual(later(8 * HOUR + 72_000).getTime());
  });

  it('tries again what a process had claimed and not handed over when it died', async () => {
    const address = someone();
    await put(address);
    await test.dataSource.manager.update(OutboxMail, { recipient: address }, { state: 'sending', claimedBy: 'a process that died', claimedUntil: later(30_000), attempts: 1 });
    expect((await sender.sendDue()).sent).toBe(0);
    expect((await sender.sendDue(later(31_000))).sent).toBe(1);
    expect(await mail.to(address)).toHaveLength(1);
  });

  it('never sends again by itself what may have arrived', async () => {
    const address = someone();
    await put(address);
    await test.dataSource.manager.update(OutboxMail, { recipient: address }, { state: 'handing-over', claimedBy: 'a process that died', claimedUntil: later(-1000) });
    expect((await sender.sendDue()).sent).toBe(0);
    expect((await sender.sendDue(later(24 * HOUR))).sent).toBe(0);
    expect(await rowOf(address)).toMatchObject({ state: 'uncertain', lastError: 'The server ended while it handed this over. It may have arrived.' });
    expect(await mail.to(address)).toEqual([]);
  });

  it('empties the link of an invitation once it is sent, and not before', async () => {
    const address = someone();
    await test.app.get(UnitOfWork).run(null, (tx) =>
      tx.mail([
        { purpose: address, personId: null, recipient: address, template: 'password-reset', data: { name: 'Ada', url: 'http://kerfside.test/reset-password/s3cret', expires: '2026-12-14T07:30:00Z' } },
      ]),
    );
    expect((await rowOf(address)).data['url']).toContain('s3cret');
    await sender.sendDue();
    expect((await mail.to(address))[0]!.text).toContain('s3cret');
    expect(JSON.stringify((await rowOf(address)).data)).not.toContain('s3cret');
  });

  it('sets aside a mail that can not be written, and goes on', async () => {
    const [broken, good] = [someone(), someone()];
    await put(broken, broken, test, 'no-such-template');
    await put(good);
    expect(await sender.sendDue()).toMatchObject({ sent: 1, failed: 1 });
    expect(await rowOf(broken)).toMatchObject({ state: 'failed', lastError: 'It could not be written from the template no-such-template.' });
  });

  describe('with a server that can die at any moment', () => {
    let server: Server;
    let app: TestApp;
    /** Answers a line of the body. */
    let script: (line: string, socket: Socket) => void;
    let atCommand: (line: string, socket: Socket) => void = () => undefined;
    let onClose: () => void = () => undefined;
    let states: string[];

    beforeAll(async () => {
      server = createServer((socket) => {
        let isData = false;
        socket.on('error', () => undefined);
        socket.on('close', () => onClose());
        socket.write('220 hand-made\r\n');
        let rest = '';
        socket.on('data', (chunk) => {
          rest += chunk.toString('latin1');
          for (let end = rest.indexOf('\r\n'); end >= 0; end = rest.indexOf('\r\n')) {
            const line = rest.slice(0, end);
            rest = rest.slice(end + 2);
            if (isData) {
              script(line, socket);
              isData = line !== '.';
              continue;
            }
            atCommand(line, socket);
            isData = /^DATA/.test(line);
            if (/^QUIT/.test(line)) socket.end('221 bye\r\n');
            else socket.write(isData ? '354 go on\r\n' : '250 fine\r\n');
          }
        });
      });
      await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
      app = await startTestApp({ KERFSIDE_SMTP_URL: `smtp://127.0.0.1:${(server.address() as AddressInfo).port}` }, database.url);
    });

    beforeEach(() => {
      states = [];
      atCommand = () => undefined;
      onClose = () => undefined;
    });

    afterAll(async () => {
      await app?.close();
      server?.close();
    });

    it('marks the mail before the closing dot, and not before the body is on its way', async () => {
      const address = someone();
      await put(address);
      const asked: Promise<unknown>[] = [];
      script = (line, socket) => {
        if (/^Message-ID/i.test(line) || line === '.')
          asked.push(
            rowOf(address).then((row) => {
              states.push(`${line === '.' ? 'dot' : 'body'}: ${row.state}`);
              if (line === '.') socket.write('250 kept\r\n');
            }),
          );
      };
      expect((await app.app.get(OutboxSender).sendDue()).sent).toBe(1);
      await Promise.all(asked);
      expect(states.at(-1)).toBe('dot: handing-over');
      expect((await rowOf(address)).state).toBe('sent');
    });

    it('leaves the dot away where another process has taken the mail over', async () => {
      const address = someone();
      await put(address);
      let dots = 0;
      const closed = new Promise<void>((resolve) => {
        onClose = resolve;
      });
      script = (line) => {
        if (line === '.') dots += 1;
      };
      // the claim is lost between taking the mail and handing it over, as when a process was held up
      await test.dataSource.query(
        "CREATE TRIGGER lose_claim BEFORE UPDATE ON outbox_mails FOR EACH ROW BEGIN IF NEW.state = 'handing-over' THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'lost'; END IF; END",
      );
      try {
        await app.app.get(OutboxSender).sendDue();
        await closed;
      } finally {
        await test.dataSource.query('DROP TRIGGER lose_claim');
      }
      expect(dots).toBe(0);
      expect((await rowOf(address)).state).toBe('queued');
    });

    it('is tried again where the connection breaks before the body', async () => {
      const address = someone();
      await put(address);
      let isBreaking = true;
      atCommand = (line, socket) => {
        if (isBreaking && /^RCPT/.test(line)) socket.destroy();
      };
      script = (line, socket) => {
        if (line === '.') socket.write('250 kept\r\n');
      };
      expect(await app.app.get(OutboxSender).sendDue()).toMatchObject({ sent: 0, putBack: 1 });
      expect((await rowOf(address)).state).toBe('queued');
      isBreaking = false;
      expect((await app.app.get(OutboxSender).sendDue(later(HOUR))).sent).toBe(1);
    });

    it('is uncertain where the connection breaks after the dot, and is not sent again', async () => {
      const address = someone();
      await put(address);
      let dots = 0;
      script = (line, socket) => {
        if (line !== '.') return;
        dots += 1;
        socket.destroy();
      };
      expect(await app.app.get(OutboxSender).sendDue()).toMatchObject({ sent: 0, uncertain: 1 });
      await app.app.get(OutboxSender).sendDue(later(24 * HOUR));
      expect(dots).toBe(1);
      expect((await rowOf(address)).state).toBe('uncertain');
    });
  });
});
