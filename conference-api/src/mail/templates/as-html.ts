import type { Block } from './blocks.js';

// colours of the sand and bronze scales; each pair reaches 4.5:1 (WCAG 2.2 AA)
const INK = '#21201c';
const QUIET = '#63635e';
const LINE = '#dad9d6';
const PAPER = '#fdfdfc';
const GROUND = '#f1f0ef';
const ACCENT = '#7d5e54';

const SERIF = "Merriweather, Georgia, 'Times New Roman', serif";
const SANS = "'Source Sans 3', 'Segoe UI', Helvetica, Arial, sans-serif";

const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

export const escapeHtml = (text: string) => text.replace(/[&<>"']/g, (character) => ENTITIES[character]!);

/** The HTML part of a mail: one column of at most 600 px, no pictures, nothing fetched from outside. */
export function asHtml(title: string, blocks: readonly Block[], footer: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light">
<title>${escapeHtml(title)}</title>
<style>
body { margin: 0; padding: 0; background: ${GROUND}; -webkit-text-size-adjust: 100%; }
@media (max-width: 480px) {
  .sheet { padding: 20px 16px !important; }
  .cell { padding-right: 8px !important; font-size: 15px !important; }
  .button { display: block !important; text-align: center; }
}
</style>
</head>
<body>
<table role="presentation" width="100%" cellspacing="0" cellpadding="0" border="0" style="background:${GROUND}"><tr><td align="center" style="padding:16px 8px">
<table role="presentation" width="100%" cellspacing="0" cellpadding="0" border="0" style="max-width:600px;background:${PAPER};border:1px solid ${LINE}"><tr><td class="sheet" style="padding:28px 32px;font-family:${SERIF};font-size:16px;line-height:1.6;color:${INK};overflow-wrap:break-word">
<p style="margin:0 0 20px;font-family:${SANS};font-size:14px;letter-spacing:.04em;color:${ACCENT}">Kerfside</p>
${blocks.map(blockAsHtml).join('\n')}
<p style="margin:28px 0 0;padding-top:12px;border-top:1px solid ${LINE};font-family:${SANS};font-size:13px;line-height:1.5;color:${QUIET}">${escapeHtml(footer)}</p>
</td></tr></table>
</td></tr></table>
</body>
</html>
`;
}

function blockAsHtml(block: Block): string {
  switch (block.kind) {
    case 'heading':
      return `<h1 style="margin:0 0 16px;font-size:22px;line-height:1.3;font-weight:bold">${escapeHtml(block.text)}</h1>`;
    case 'paragraph':
      return `<p style="margin:0 0 16px">${escapeHtml(block.text)}</p>`;
    case 'note':
      return `<p style="margin:0 0 16px;padding:8px 12px;border-left:3px solid ${ACCENT};font-family:${SANS};font-size:15px;line-height:1.5">${escapeHtml(block.text)}</p>`;
    case 'link':
      return linkAsHtml(block.label, block.url);
    case 'table':
      return tableAsHtml(block);
  }
}

// the address stands below in full, for programs that show no links
function linkAsHtml(label: string, url: string): string {
  const address = escapeHtml(url);
  return `<p style="margin:8px 0 4px"><a class="button" href="${address}" style="display:inline-block;padding:12px 20px;background:${ACCENT};color:#ffffff;font-family:${SANS};font-size:16px;text-decoration:none">${escapeHtml(label)}</a></p>
<p style="margin:0 0 16px;font-family:${SANS};font-size:13px;line-height:1.5;color:${QUIET};word-break:break-all">${address}</p>`;
}

function tableAsHtml({ columns, rows }: Extract<Block, { kind: 'table' }>): string {
  const align = (index: number) => (columns[index]?.numeric ? 'right' : 'left');
  const wrapping = (index: number) => (columns[index]?.numeric || columns[index]?.isCode ? 'white-space:nowrap;' : 'overflow-wrap:anywhere;');
  const head = columns
    .map(({ title }, index) => `<th scope="col" class="cell" align="${align(index)}" style="padding:6px 16px 6px 0;white-space:nowrap;border-bottom:1px solid ${INK};font-size:14px;font-weight:600">${escapeHtml(title)}</th>`)
    .join('');
  const body = rows
    .map((cells) => `<tr>${cells.map((cell, index) => `<td class="cell" align="${align(index)}" valign="top" style="padding:8px 16px 8px 0;${wrapping(index)}border-bottom:1px solid ${LINE};font-variant-numeric:tabular-nums">${escapeHtml(cell)}</td>`).join('')}</tr>`)
    .join('\n');
  return `<table width="100%" cellspacing="0" cellpadding="0" border="0" style="margin:0 0 16px;border-collapse:collapse;font-family:${SANS};font-size:16px;line-height:1.4">
<thead><tr>${head}</tr></thead>
<tbody>
${body}
</tbody>
</table>`;
}
