import type { BehaviourSettings } from '../behaviour.js';
import type { MessageSummary } from '../store.js';
import { formatDate } from './formats.js';
import { html, type Markup } from './html.js';
import { layout, TITLE } from './layout.js';

export interface ListPage {
  messages: MessageSummary[];
  total: number;
  next: string | null;
  to: string;
  isFirst: boolean;
  behaviour: BehaviourSettings;
}

export function listPage(page: ListPage): string {
  return layout(
    TITLE,
    html`<h1>${TITLE}</h1>
<div class="tools">
<form action="/" method="get" role="search">
<label for="to">Recipient</label>
<input id="to" name="to" type="search" value="${page.to}" placeholder="name@host.example" autocomplete="off">
<button>Filter</button>
</form>
<button type="button" id="delete-all"${page.total === 0 && page.to === '' ? html` disabled` : ''}>Delete all messages</button>
</div>
${messageTable(page)}
${behaviourForm(page.behaviour)}`,
  );
}

function messageTable({ messages, total, next, to, isFirst }: ListPage): Markup {
  const filter = to === '' ? '' : `to=${encodeURIComponent(to)}`;
  const nextLink = next === null ? null : `/?${[filter, `before=${next}`].filter(Boolean).join('&')}`;
  const newestLink = isFirst ? null : `/?${filter}`;
  if (messages.length === 0) {
    const what = to === '' ? 'No mail was caught yet.' : `No mail to ${to} was caught.`;
    return html`<p class="empty">${what}${to === '' ? '' : html` <a href="/">Show all</a>`}</p>`;
  }
  return html`<p class="count">${total} ${total === 1 ? 'message' : 'messages'}${to === '' ? '' : ` to ${to}`}, newest first</p>
<table class="messages">
<thead><tr><th scope="col">Received</th><th scope="col">To</th><th scope="col">Subject</th><th scope="col">From</th></tr></thead>
<tbody>
${messages.map(
  (message) => html`<tr>
<td class="when"><time datetime="${message.date}">${formatDate(message.date)}</time></td>
<td data-label="To">${message.to.join(', ')}</td>
<td class="subject"><a href="/messages/${message.id}">${message.subject || '(no subject)'}</a></td>
<td data-label="From">${message.from || '(no sender)'}</td>
</tr>
`,
)}</tbody>
</table>
<nav class="paging" aria-label="Pages">${newestLink === null ? '' : html`<a href="${newestLink}">Newest</a>`}${
    nextLink === null ? '' : html`<a href="${nextLink}">Older</a>`
  }</nav>`;
}

function behaviourForm(current: BehaviourSettings): Markup {
  const option = (value: string, text: string, chosen: string) =>
    html`<option value="${value}"${value === chosen ? html` selected` : ''}>${text}</option>`;
  return html`<section aria-labelledby="behaviour-title">
<h2 id="behaviour-title">How the mail server behaves</h2>
<form id="behaviour">
<label>It should
<select name="mode">${[
    option('accept', 'accept everything', current.mode),
    option('refuse', 'refuse', current.mode),
    option('delay', 'answer late', current.mode),
  ]}</select></label>
<label>At
<select name="at">${[
    option('connect', 'the connection', current.at),
    option('rcpt', 'the recipient', current.at),
    option('data', 'the message', current.at),
  ]}</select></label>
<label>Refusal
<select name="code">${[
    option('451', 'temporary (451)', String(current.code)),
    option('550', 'permanent (550)', String(current.code)),
  ]}</select></label>
<label>Delay in ms
<input name="delayMs" type="number" min="0" max="600000" step="1" value="${current.delayMs}"></label>
<button>Set behaviour</button>
<p id="behaviour-state" role="status">Now: ${current.mode}</p>
</form>
</section>`;
}
