import { asHtml } from './as-html.js';
import { asText, wrap } from './as-text.js';
import { renderTemplate, TEMPLATE_NAMES, type TemplateData, withoutSecrets } from './registry.js';

const SAMPLES: TemplateData = {
  invitation: { name: 'Ada Fell', unit: 'Alder Fell', conferences: ['Hip revision'], url: 'http://k.example/invitation/t0k', expires: '2026-12-14T07:30:00Z' },
  'password-reset': { name: 'Ada Fell', url: 'http://k.example/reset-password/t0k', expires: '2026-12-07T09:30:00Z' },
  agenda: {
    conference: 'Hip revision',
    meetingId: 'm1',
    sequence: 0,
    startsAt: '2026-12-09T07:30:00Z',
    minutes: 60,
    timeZone: 'Europe/London',
    items: [
      { code: 'HIP-0042', minutes: 20, presenter: 'Ada Fell' },
      { code: 'HIP-0043', minutes: 45, presenter: 'Ben Moor' },
    ],
    url: 'http://k.example/meetings/m1',
  },
  'case-returned': { name: 'Ada Fell', code: 'HIP-0042', url: 'http://k.example/cases/c1' },
  'case-released': { name: 'Ada Fell', code: 'HIP-0042', conference: 'Hip revision', url: 'http://k.example/cases/c1' },
  'question-asked': { name: 'Ada Fell', code: 'HIP-0042', asker: 'Ben Moor', url: 'http://k.example/cases/c1' },
  mention: { name: 'Ada Fell', code: 'HIP-0042', author: 'Ben Moor', url: 'http://k.example/cases/c1' },
  'rating-due': { name: 'Ada Fell', code: 'HIP-0042', url: 'http://k.example/cases/c1' },
  'decision-signed': { name: 'Ada Fell', code: 'HIP-0042', number: 7, version: 1, conference: 'Hip revision', kind: 'decision', url: 'http://k.example/decisions/d1', amended: false },
  'final-decision-due': { name: 'Ada Fell', code: 'HIP-0042', url: 'http://k.example/cases/c1' },
  'final-decision': { name: 'Ada Fell', code: 'HIP-0042', kind: 'as-agreed', url: 'http://k.example/cases/c1' },
};

const render = (name: string, changes: object = {}) => {
  const { subject, blocks } = renderTemplate(name, { ...(SAMPLES as unknown as Record<string, object>)[name], ...changes });
  return { subject, text: asText(blocks, 'Footer.'), html: asHtml(subject, blocks, 'Footer.') };
};

describe.each(TEMPLATE_NAMES)('the mail %s', (name) => {
  it('says the same as text and as HTML, with its link in both', () => {
    const { text, html } = render(name);
    const { url } = SAMPLES[name];
    expect(text).toContain(url);
    expect(html).toContain(`href="${url}"`);
    expect(`${text}${html}`).not.toMatch(/undefined|null|NaN|\[object/);
  });

  it('can be read without pictures and fetches nothing', () => {
    const { html } = render(name);
    expect(html).not.toMatch(/<img|<link|<script|url\(|src=|@import/i);
  });

  it('keeps markup and line breaks in names as text', () => {
    const hostile = '<b onclick=x>"Ada"</b>\r\nBcc: all@x.example';
    const changes = Object.fromEntries(
      Object.entries(SAMPLES[name])
        .filter(([key, value]) => typeof value === 'string' && !['url', 'expires', 'startsAt', 'timeZone', 'kind', 'meetingId'].includes(key))
        .map(([key]) => [key, hostile]),
    );
    const { subject, html } = render(name, changes);
    expect(subject).not.toMatch(/[\r\n]/);
    expect(html).not.toContain('<b onclick');
  });

  it('is not written where something it needs is missing, and says no more than which', () => {
    const { url, ...rest } = SAMPLES[name];
    expect(() => renderTemplate(name, rest)).toThrow(`the mail template ${name} lacks url`);
    expect(url).toBeTruthy();
  });
});

describe('the agenda mail', () => {
  it('names conference and day in its subject, by the conference’s own calendar', () => {
    expect(render('agenda').subject).toBe('Hip revision: agenda for 9 Dec 2026');
    // 20:30Z on Sunday is Monday in Sydney
    expect(render('agenda', { startsAt: '2026-03-29T20:30:00Z', timeZone: 'Australia/Sydney' }).subject).toBe('Hip revision: agenda for 30 Mar 2026');
    expect(render('agenda', { sequence: 1 }).subject).toBe('Hip revision: changed agenda for 9 Dec 2026');
    expect(render('agenda', { cancelled: true, items: [] }).subject).toBe('Hip revision: meeting of 9 Dec 2026 cancelled');
  });

  it('gives the local time with its zone, on both sides of a change of the clocks', () => {
    // Europe/London: GMT until 29 Mar 2026 01:00Z, BST after (check by the tz database of the runtime)
    expect(render('agenda', { startsAt: '2026-03-25T07:30:00Z' }).text).toContain('Wednesday 25 Mar 2026, 07:30 (Europe/London)');
    expect(render('agenda', { startsAt: '2026-04-01T06:30:00Z' }).text).toContain('Wednesday 1 Apr 2026, 07:30 (Europe/London)');
  });

  it('lists the cases in order and says what does not fit', () => {
    const { text } = render('agenda');
    expect(text.indexOf('HIP-0042')).toBeLessThan(text.indexOf('HIP-0043'));
    expect(text).toContain('The cases ask for 65 minutes');
    expect(render('agenda', { items: [] }).text).toContain('No cases are listed so far.');
  });
});

describe('mails of decisions', () => {
  it.each(['decision-signed', 'final-decision-due', 'final-decision'] as const)('carry the caution: %s', (name) => {
    expect(wrap(render(name).text)).toMatch(/panel advises/);
  });

  it('say when it is advice only', () => {
    const { subject, text } = render('decision-signed', { kind: 'advice' });
    expect(subject).toBe('HIP-0042: advice 7 signed');
    expect(text).toContain('no quorum');
  });
});

describe('what stays in the outbox', () => {
  it('loses the links that let somebody in, and no others', () => {
    expect(withoutSecrets('invitation', { ...SAMPLES.invitation })).toMatchObject({ name: 'Ada Fell', url: null });
    expect(withoutSecrets('password-reset', { ...SAMPLES['password-reset'] })['url']).toBeNull();
    expect(withoutSecrets('agenda', { ...SAMPLES.agenda })['url']).toBe(SAMPLES.agenda.url);
  });

  it('an unknown template is refused', () => {
    expect(() => renderTemplate('constructor', {})).toThrow('there is no mail template constructor');
  });
});

describe('wrapping text', () => {
  it('breaks at spaces and keeps long words whole', () => {
    expect(wrap('aaa bbb ccc', 7)).toBe('aaa bbb\nccc');
    expect(wrap('a http://k.example/very/long/address b', 10)).toBe('a\nhttp://k.example/very/long/address\nb');
  });
});
