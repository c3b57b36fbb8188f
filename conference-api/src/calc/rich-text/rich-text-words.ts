import type { RichText } from '../vocabulary/discussions.js';

const BLOCKS = new Set(['paragraph', 'heading', 'codeBlock', 'blockquote', 'listItem', 'bulletList', 'orderedList', 'horizontalRule']);

/** The text alone, a line a block; mentions as `@` with their label, or left out. */
export function richTextPlain(document: RichText, options: { mentions: boolean } = { mentions: true }): string {
  const lines: string[] = [''];
  const add = (text: string) => {
    lines[lines.length - 1] += text;
  };
  const walk = (node: RichText): void => {
    if (node.text) add(node.text);
    if (node.type === 'mention' && options.mentions) add(`@${String(node.attrs?.['label'] ?? '')}`);
    if (node.type === 'hardBreak') lines.push('');
    node.content?.forEach(walk);
    if (BLOCKS.has(node.type) && lines.at(-1) !== '') lines.push('');
  };
  walk(document);
  return lines.join('\n').trim();
}

/** Ids of the people mentioned, each once. */
export function mentionedIds(document: RichText): string[] {
  const ids = new Set<string>();
  const walk = (node: RichText): void => {
    if (node.type === 'mention') ids.add(String(node.attrs?.['id']));
    node.content?.forEach(walk);
  };
  walk(document);
  return [...ids];
}

/** The document with each mention under the person's own name, whatever label was sent. */
export function withMentionNames(document: RichText, names: ReadonlyMap<string, string>): RichText {
  const named: RichText = { ...document };
  if (document.type === 'mention') {
    const id = String(document.attrs?.['id']);
    named.attrs = { ...document.attrs, label: names.get(id) ?? null };
  }
  if (document.content) named.content = document.content.map((node) => withMentionNames(node, names));
  return named;
}
