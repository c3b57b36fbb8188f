import { once } from 'node:events';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { type Browser, chromium, type Page } from 'playwright-core';
import { Bench } from './support.js';

// Common forms of script injection, from memory, no source; each would call hit() where it runs.
const SCRIPTS = [
  '<script>top.hit()</script>',
  '<img src=x onerror="top.hit()">',
  '<svg onload="top.hit()"></svg>',
  '"><script>hit()</script>',
  "'-hit()-'",
  '</iframe><script>hit()</script>',
  '</pre></textarea></title><script>hit()</script>',
  '<iframe srcdoc="<script>top.hit()</script>"></iframe>',
  '<meta http-equiv="refresh" content="0;url=javascript:hit()">',
].join('\n');

let bench: Bench;
let browser: Browser;
let page: Page;
let tracker: Server;
let trackerUrl: string;
let asked: (string | undefined)[];

beforeAll(async () => {
  browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking'],
  });
});

afterAll(() => browser?.close());

beforeEach(async () => {
  bench = await Bench.start();
  page = await browser.newPage();
  asked = [];
  tracker = createServer((request, response) => {
    asked.push(request.url);
    response.end();
  }).listen(0, '127.0.0.1');
  await once(tracker, 'listening');
  trackerUrl = `http://127.0.0.1:${(tracker.address() as AddressInfo).port}`;
});

afterEach(async () => {
  await page.close();
  tracker.closeAllConnections();
  tracker.close();
  await bench.stop();
});

it('shows the list and a message with its parts', async () => {
  await bench.send({
    to: 'ada@clinic.example',
    subject: 'Agenda for Monday',
    text: 'See https://clinic.example/a?b=1&c=2 for more',
    html: '<p style="color: rgb(1, 2, 3)">Cases to discuss</p>',
    attachments: [{ filename: 'list.csv', content: 'a,b' }],
  });
  await page.goto(bench.origin);
  expect(await page.title()).toBe('Mail that was caught');
  await page.getByRole('link', { name: 'Agenda for Monday' }).click();
  expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe('Agenda for Monday');
  const paragraph = page.frameLocator('iframe').getByText('Cases to discuss');
  expect(await paragraph.evaluate((element) => element.ownerDocument.defaultView?.getComputedStyle(element).color)).toBe(
    'rgb(1, 2, 3)',
  );
  expect(await page.getByRole('link', { name: 'https://clinic.example' }).getAttribute('href')).toBe(
    'https://clinic.example/a?b=1&c=2',
  );
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: 'list.csv' }).click(),
  ]);
  expect(download.suggestedFilename()).toBe('list.csv');
});

it('runs nothing and loads nothing that a message brings', async () => {
  const loads = `<img src="${trackerUrl}/1"><link rel="stylesheet" href="${trackerUrl}/2"><p style="background: url(${trackerUrl}/3)">x`;
  const hostile = `${SCRIPTS}\n${loads}`;
  await bench.send({
    to: { name: hostile.replaceAll('\n', ' '), address: 'ada@clinic.example' },
    subject: hostile.replaceAll('\n', ' '),
    text: hostile,
    html: hostile,
    icalEvent: { content: hostile },
    attachments: [{ filename: '<script>hit()</script>.html', content: hostile, contentType: 'text/html' }],
    headers: { 'X-Hostile': '<script>hit()</script>' },
  });
  const hits: string[] = [];
  await page.exposeFunction('hit', () => hits.push(page.url()));
  await page.goto(bench.origin);
  await page.locator('.subject a').click();
  await page.frameLocator('iframe').locator('body').waitFor();
  await page.locator('summary').click();
  expect(await page.locator('h1').textContent()).toContain('<script>top.hit()</script>');
  expect(await page.locator('pre').first().textContent()).toContain('</iframe><script>hit()</script>');
  expect(hits).toEqual([]);
  expect(asked).toEqual([]);
  // Both traps are set: they tell of what does get through.
  await page.evaluate('hit()');
  expect(hits).toHaveLength(1);
  await page.goto(`${trackerUrl}/loaded`);
  expect(asked).toContain('/loaded');
});

it('sets the behaviour', async () => {
  await page.goto(bench.origin);
  await page.getByLabel('It should').selectOption('refuse');
  await page.getByLabel('Refusal').selectOption('550');
  await page.getByRole('button', { name: 'Set behaviour' }).click();
  await page.getByText('Now: refuse').waitFor();
  expect((await bench.http.get('/api/behaviour')).body).toMatchObject({ mode: 'refuse', code: 550 });
  await page.getByLabel('It should').selectOption('delay');
  await page.getByLabel('Delay in ms').fill('0');
  await page.getByRole('button', { name: 'Set behaviour' }).click();
  await page.getByRole('alert').waitFor();
  expect(await page.getByRole('alert').textContent()).toContain('delayMs');
});

it('deletes all after asking', async () => {
  await bench.send({ to: 'ada@clinic.example', subject: 'To be deleted', text: 'x' });
  await page.goto(bench.origin);
  page.once('dialog', (dialog) => void dialog.dismiss());
  await page.getByRole('button', { name: 'Delete all messages' }).click();
  expect(await bench.list()).toHaveLength(1);
  page.once('dialog', (dialog) => void dialog.accept());
  await page.getByRole('button', { name: 'Delete all messages' }).click();
  await page.getByText('No mail was caught yet.').waitFor();
  expect(await bench.list()).toEqual([]);
});

it.each([390, 1280])('fits a width of %i px', async (width) => {
  await bench.send({
    to: `${'long-name-'.repeat(6)}@clinic.example`,
    subject: 'A'.repeat(200),
    text: 'b'.repeat(500),
    headers: { 'X-Long': 'c'.repeat(300) },
  });
  await page.setViewportSize({ width, height: 800 });
  for (const path of ['/', `/messages/${(await bench.list())[0]?.id}`]) {
    await page.goto(bench.origin + path);
    await page.locator('details').evaluateAll((all) => all.forEach((details) => details.setAttribute('open', '')));
    expect(await page.evaluate('document.documentElement.scrollWidth')).toBeLessThanOrEqual(width);
  }
});

it('filters and pages the list', async () => {
  const numbered = Array.from({ length: 51 }, (_, index) => `Number ${index + 1}`);
  await bench.send(numbered.map((subject) => ({ to: 'ada@clinic.example', subject, text: 'x' })));
  await bench.send({ to: 'bo@clinic.example', subject: 'For Bo', text: 'x' });
  await page.goto(bench.origin);
  await page.getByRole('searchbox', { name: 'Recipient' }).fill('ADA@clinic.example');
  await page.getByRole('button', { name: 'Filter' }).click();
  await page.getByText('51 messages to ADA@clinic.example').waitFor();
  expect(await page.locator('tbody tr').count()).toBe(50);
  await page.getByRole('link', { name: 'Older' }).click();
  await page.getByRole('link', { name: 'Newest' }).waitFor();
  expect(await page.locator('.subject a').allTextContents()).toEqual(['Number 1']);
});
