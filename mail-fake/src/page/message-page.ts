import type { MessageContent } from '../message.js';
import type { MessageSummary } from '../store.js';
import { formatDate, formatSize } from './formats.js';
import { html, linkified, type Markup } from './html.js';
import { layout } from './layout.js';

// Shown inside the frame: no scripts, no requests to anywhere; links open in a new tab.
const FRAME_HEAD =
  '<meta http-equiv="Content-Security-Policy" content="default-src \'none\'; style-src \'unsafe-inline\'; img-src data:">' +
  '<meta charset="utf-8"><base target="_blank">';

export function messagePage(message: MessageSummary, content: MessageContent): string {
  const subject = message.subject || '(no subject)';
  return layout(
    subject,
    html`<nav class="paging" aria-label="Back"><a href="/">All messages</a></nav>
<h1>${subject}</h1>
<dl class="envelope">
<dt>From</dt><dd>${message.from || '(no sender)'}</dd>
<dt>Delivered to</dt><dd>${message.to.join(', ')}</dd>
<dt>Received</dt><dd><time datetime="${message.date}">${formatDate(message.date)}</time></dd>
<dt>Message-ID</dt><dd>${headerText(content.headers['message-id']) || '(none)'}</dd>
</dl>
<p><a href="/api/messages/${message.id}/raw">Download as received</a></p>
${content.html === null ? '' : htmlPart(content.html)}
${content.text === null ? '' : textPart('Text part', linkified(content.text))}
${content.ics === null ? '' : textPart('Calendar part', [html`${content.ics}`])}
${partsTable(message.id, content)}
${headersTable(content)}`,
  );
}

function htmlPart(markup: string): Markup {
  return html`<section><h2>HTML part</h2>
<iframe title="HTML part of the message" sandbox="allow-popups allow-popups-to-escape-sandbox" referrerpolicy="no-referrer" srcdoc="${
    FRAME_HEAD + markup
  }"></iframe></section>`;
}

function textPart(title: string, text: Markup[]): Markup {
  return html`<section><h2>${title}</h2>
<pre tabindex="0">${text}</pre></section>`;
}

function partsTable(id: string, content: MessageContent): Markup {
  const bodies = [
    ['text/plain', content.text],
    ['text/html', content.html],
  ].filter((body): body is [string, string] => body[1] !== null);
  return html`<section><h2>Parts and attachments</h2>
<table class="parts">
<thead><tr><th scope="col">Name</th><th scope="col">Type</th><th scope="col" class="figure">Size</th></tr></thead>
<tbody>
${bodies.map(
  ([type, body]) => html`<tr><td>shown above</td><td>${type}</td><td class="figure">${formatSize(Buffer.byteLength(body))}</td></tr>
`,
)}${content.attachments.map(
    ({ filename, contentType, size, index }) => html`<tr><td><a href="/api/messages/${id}/attachments/${index}" download>${
      filename ?? `part-${index}`
    }</a></td><td>${contentType}</td><td class="figure">${formatSize(size)}</td></tr>
`,
  )}</tbody>
</table></section>`;
}

function headersTable(content: MessageContent): Markup {
  return html`<details><summary>Headers</summary>
<dl class="headers">
${Object.entries(content.headers).map(
  ([name, value]) => html`<dt>${name}</dt><dd>${headerText(value)}</dd>
`,
)}</dl></details>`;
}

function headerText(value: string | string[] | undefined): string {
  return Array.isArray(value) ? value.join('\n') : (value ?? '');
}
