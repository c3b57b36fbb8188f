import { once } from 'node:events';
import { appendFile, readdir, writeFile } from 'node:fs/promises';
import { createConnection } from 'node:net';
import { join } from 'node:path';
import { Bench, swaks, until } from './support.js';

// Lines end in CR LF (RFC 5545 3.1).
const CALENDAR = [
  'BEGIN:VCALENDAR',
  'VERSION:2.0',
  'PRODID:-//test//EN',
  'METHOD:REQUEST',
  'BEGIN:VEVENT',
  'UID:meeting-1@clinic.example',
  'DTSTAMP:20261201T090000Z',
  'DTSTART:20261207T170000Z',
  'SUMMARY:Wöchentliche Besprechung',
  'END:VEVENT',
  'END:VCALENDAR',
  '',
].join('\r\n');

let bench: Bench;

beforeEach(async () => {
  bench = await Bench.start();
});

afterEach(() => bench.stop());

describe('a message sent with nodemailer', () => {
  it('is kept with text, HTML, calendar and attachment', async () => {
    const picture = Buffer.from(Array.from({ length: 3000 }, (_, index) => (index * 7) % 256));
    await bench.send({
      from: '"Jörg Ångström" <joerg@clinic.example>',
      to: 'Ada@clinic.example',
      cc: 'bo@clinic.example',
      subject: 'Tagesordnung für Montag: 関節',
      messageId: '<only-this@clinic.example>',
      text: 'Grüße aus dem Text',
      html: '<p>Grüße aus dem <b>HTML</b></p>',
      icalEvent: { method: 'REQUEST', content: CALENDAR, filename: 'meeting.ics' },
      attachments: [{ filename: 'bild größe.bin', content: picture, contentType: 'application/x-test' }],
      headers: { 'X-Kind': 'agenda' },
    });

    const message = await bench.readNewest();
    expect(message).toMatchObject({
      from: 'joerg@clinic.example',
      to: ['Ada@clinic.example', 'bo@clinic.example'],
      subject: 'Tagesordnung für Montag: 関節',
      html: '<p>Grüße aus dem <b>HTML</b></p>',
      ics: CALENDAR,
    });
    expect(message.text.trim()).toBe('Grüße aus dem Text');
    expect(Date.now() - Date.parse(message.date)).toBeLessThan(60_000);
    expect(message.headers).toMatchObject({
      'message-id': '<only-this@clinic.example>',
      'x-kind': 'agenda',
      from: expect.stringContaining('Jörg Ångström'),
      subject: 'Tagesordnung für Montag: 関節',
    });
    const attachment = message.attachments.find(
      ({ contentType }: { contentType: string }) => contentType === 'application/x-test',
    );
    expect(attachment).toMatchObject({ filename: 'bild größe.bin', size: picture.length });

    const download = await fetch(`${bench.origin}/api/messages/${message.id}/attachments/${attachment.index}`);
    expect(download.headers.get('content-type')).toBe('application/x-test');
    expect(download.headers.get('content-disposition')).toMatch(/^attachment;/);
    expect(picture.equals(Buffer.from(await download.arrayBuffer()))).toBe(true);
  });

  it('says null for the parts that it does not have', async () => {
    await bench.send({ to: 'ada@clinic.example', subject: 'Only HTML', html: '<p>x</p>' });
    expect(await bench.readNewest()).toMatchObject({ text: null, ics: null, attachments: [] });
    await bench.send({ to: 'ada@clinic.example', subject: 'Only text', text: 'x' });
    expect(await bench.readNewest()).toMatchObject({ html: null, ics: null, attachments: [] });
  });

  it('is kept twice when it is delivered twice', async () => {
    const mail = { to: 'ada@clinic.example', subject: 'Once', text: 'x', messageId: '<same@clinic.example>' };
    await bench.send(mail);
    await bench.send(mail);
    const messages = await bench.list();
    expect(messages.map(({ subject }) => subject)).toEqual(['Once', 'Once']);
    expect(new Set(messages.map(({ id }) => id)).size).toBe(2);
  });

  it('needs no sign-in, and takes any', async () => {
    await bench.send({ to: 'ada@clinic.example', subject: 'Signed in', text: 'x' }, { auth: { user: 'who', pass: 'ever' } });
    expect(await bench.list()).toHaveLength(1);
  });

  it('is refused over the size limit, with the code of RFC 1870', async () => {
    const large = Buffer.alloc(20 * 1024 * 1024, 'x'); // over 25 MB in base64
    const mail = { to: 'ada@clinic.example', attachments: [{ filename: 'large.bin', content: large }] };
    await expect(bench.send(mail)).rejects.toMatchObject({ responseCode: 552 });
    expect(await bench.list()).toEqual([]);
    expect(await readdir(join(bench.dataDir, 'incoming'))).toEqual([]);
  });
});

describe('a message sent with swaks', () => {
  const send = (...args: string[]) =>
    swaks('--server', `127.0.0.1:${bench.smtpPort}`, '--from', 'sender@clinic.example', ...args);

  it('is kept byte for byte', async () => {
    // Leading dots are doubled on the wire and undone by the receiver (RFC 5321 4.5.2).
    const lines = ['From: sender@clinic.example', 'Subject: Dots', '', '.one', '..two', 'end', ''];
    const file = join(bench.dataDir, 'sent.txt');
    await writeFile(file, lines.join('\r\n'));
    const { code, output } = await send('--to', 'ada@clinic.example', '--data', `@${file}`);
    expect(output).toContain('250');
    expect(code).toBe(0);
    const { id } = await bench.readNewest();
    // swaks ends the data with a line break of its own.
    expect((await bench.readRaw(id)).trimEnd()).toBe(lines.join('\r\n').trimEnd());
  });

  it('shows the recipients of the envelope, who need not be in a header', async () => {
    await send('--to', 'ada@clinic.example,hidden@clinic.example', '--header', 'To: ada@clinic.example');
    expect((await bench.list({ to: 'hidden@clinic.example' }))[0]?.to).toEqual([
      'ada@clinic.example',
      'hidden@clinic.example',
    ]);
  });

  it('has its attachment and its sign-in taken', async () => {
    const { code } = await send(
      ...['--to', 'ada@clinic.example', '--auth', 'PLAIN', '--auth-user', 'u', '--auth-password', 'p'],
      ...['--attach-type', 'text/csv', '--attach-name', 'table.csv', '--attach', 'a,b'],
    );
    expect(code).toBe(0);
    expect((await bench.readNewest()).attachments).toEqual([
      { filename: 'table.csv', contentType: 'text/csv', size: 3, index: 0 },
    ]);
  });

  it('has its encoded subject read', async () => {
    // The worked example of RFC 2047, section 8, with the text that it names.
    const words = '=?ISO-8859-1?B?SWYgeW91IGNhbiByZWFkIHRoaXMgeW8=?= =?ISO-8859-2?B?dSB1bmRlcnN0YW5kIHRoZSBleGFtcGxlLg==?=';
    await send('--to', 'ada@clinic.example', '--header', `Subject: ${words}`);
    expect((await bench.list())[0]?.subject).toBe('If you can read this you understand the example.');
  });
});

describe('what is on disk', () => {
  it('is there after a restart, in the same order', async () => {
    for (const subject of ['first', 'second', 'third']) {
      await bench.send({ to: 'ada@clinic.example', subject, text: subject });
    }
    const before = await bench.list();
    await bench.restart();
    expect(await bench.list()).toEqual(before);
    expect(before.map(({ subject }) => subject)).toEqual(['third', 'second', 'first']);
    expect((await bench.readNewest()).text.trim()).toBe('third');
  });

  it('is not spoilt by a line of the index that was torn', async () => {
    await bench.send({ to: 'ada@clinic.example', subject: 'before', text: 'x' });
    await appendFile(join(bench.dataDir, 'index.jsonl'), '\n{"id":"torn","to":["a');
    await bench.restart();
    await bench.send({ to: 'ada@clinic.example', subject: 'after', text: 'x' });
    await bench.restart();
    expect((await bench.list()).map(({ subject }) => subject)).toEqual(['after', 'before']);
  });

  it('stays empty after all was deleted', async () => {
    await bench.send({ to: 'ada@clinic.example', subject: 'gone', text: 'x' });
    const { id } = await bench.readNewest();
    await bench.http.delete('/api/messages').expect(204);
    await bench.restart();
    expect(await bench.list()).toEqual([]);
    expect(await readdir(join(bench.dataDir, 'messages'))).toEqual([]);
    await bench.http.get(`/api/messages/${id}`).expect(404);
  });

  it('keeps nothing of a message whose sender went away half-way', async () => {
    const incoming = () => readdir(join(bench.dataDir, 'incoming'));
    const socket = createConnection({ host: '127.0.0.1', port: bench.smtpPort });
    await once(socket, 'data'); // the greeting
    const commands = ['EHLO x', 'MAIL FROM:<a@b.example>', 'RCPT TO:<c@d.example>', 'DATA', 'Subject: half', '', 'body'];
    socket.write(`${commands.join('\r\n')}\r\n`);
    await until('the message is coming in', async () => (await incoming()).length === 1);
    socket.destroy();
    await until('the half message is gone', async () => (await incoming()).length === 0);
    expect(await bench.list()).toEqual([]);
  });
});
