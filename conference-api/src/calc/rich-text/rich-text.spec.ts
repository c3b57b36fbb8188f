/**
 * In jsdom: its parser reads HTML as the standard says browsers do.
 * @jest-environment jsdom
 */
import { generateHTML } from '@tiptap/html';
import { HOSTILE_ADDRESSES, HOSTILE_MARKUP } from '../../../test/data/hostile-strings.js';
import { CalcInputError } from '../common/calc-input-error.js';
import type { RichText } from '../vocabulary/discussions.js';
import { richTextExtensions } from './extensions.js';
import { readRichText, RICH_TEXT_LIMITS } from './rich-text.js';
import { mentionedIds, richTextPlain, withMentionNames } from './rich-text-words.js';

const PERSON = '5f0c3f58-6f2e-4b53-9a0e-0d3b1f2a4c5d';
const text = (words: string, marks?: object[]) => ({ type: 'text', text: words, ...(marks ? { marks } : {}) });
const paragraph = (...content: object[]) => ({ type: 'paragraph', content });
const doc = (...content: object[]) => ({ type: 'doc', content });
const linked = (attrs: object) => doc(paragraph(text('x', [{ type: 'link', attrs }])));

const refusal = (value: unknown): { field: string; code: string } => {
  try {
    readRichText(value);
  } catch (error) {
    if (error instanceof CalcInputError) return { field: error.field, code: error.code };
    throw error;
  }
  throw new Error('was not refused');
};

interface Parsed {
  tagName: string;
  textContent: string;
  innerHTML: string;
  querySelector: (selector: string) => Parsed | null;
  querySelectorAll: (selector: string) => Iterable<Parsed>;
  getAttribute: (name: string) => string | null;
  getAttributeNames: () => string[];
}
const { document } = globalThis as unknown as { document: { createElement: (tag: string) => Parsed } };

/** As a browser would show it: the editor's own HTML of it, read back by a standard parser. */
function rendered(content: RichText): Parsed {
  const shown = document.createElement('div');
  shown.innerHTML = generateHTML(content, richTextExtensions());
  return shown;
}

describe('what the editor makes', () => {
  it('comes through whole', () => {
    const made = doc(
      { type: 'heading', attrs: { level: 2 }, content: [text('Plan')] },
      paragraph(text('Take the '), text('liner', [{ type: 'bold' }, { type: 'italic' }]), { type: 'hardBreak' }, text('out', [{ type: 'code' }])),
      { type: 'bulletList', content: [{ type: 'listItem', content: [paragraph(text('screws')), { type: 'bulletList', content: [{ type: 'listItem', content: [paragraph(text('hex'))] }] }] }] },
      { type: 'orderedList', attrs: { start: 3, type: null }, content: [{ type: 'listItem', content: [paragraph(text('third', [{ type: 'strike' }, { type: 'underline' }]))] }] },
      { type: 'blockquote', content: [paragraph(text('quoted'))] },
      { type: 'codeBlock', attrs: { language: null }, content: [text('a < b')] },
      { type: 'horizontalRule' },
      { type: 'paragraph' },
    );
    expect(readRichText(made)).toEqual(made);
    expect(richTextPlain(readRichText(made))).toBe('Plan\nTake the liner\nout\nscrews\nhex\nthird\nquoted\na < b');
  });

  it.each(['https://example.org/a?b=c#d', 'http://example.org/', 'mailto:someone@example.org'])('keeps the link %s with fixed manners', (href) => {
    const sent = linked({ href, target: '_self', rel: 'opener', class: 'admin-button', title: 'Sign in again' });
    expect(readRichText(sent).content![0]!.content![0]!.marks).toEqual([
      { type: 'link', attrs: { href, target: '_blank', rel: 'noopener noreferrer nofollow', class: null, title: null } },
    ]);
  });

  it('names people as the server knows them, not as was sent', () => {
    const mention = { type: 'mention', attrs: { id: PERSON.toUpperCase(), label: '<b>The Chair</b>', mentionSuggestionChar: '@' } };
    const read = readRichText(doc(paragraph(text('See '), mention, text(' and '), mention)));
    expect(mentionedIds(read)).toEqual([PERSON]);
    const named = withMentionNames(read, new Map([[PERSON, 'R. Hollowbrook']]));
    expect(richTextPlain(named)).toBe('See @R. Hollowbrook and @R. Hollowbrook');
    expect(richTextPlain(named, { mentions: false })).toBe('See  and');
  });

  it('mends half a surrogate pair', () => {
    expect(richTextPlain(readRichText(doc(paragraph(text('a\ud800b')))))).toBe('a\ufffdb');
  });
});

describe('hostile strings', () => {
  it.each(HOSTILE_MARKUP)('as text stay text: %s', (words) => {
    const read = readRichText(doc(paragraph(text(words)), { type: 'codeBlock', content: [text(words)] }));
    const shown = rendered(read);
    expect([...shown.querySelectorAll('*')].map((element) => element.tagName)).toEqual(['P', 'PRE', 'CODE']);
    expect([...shown.querySelectorAll('*')].flatMap((element) => element.getAttributeNames())).toEqual([]);
    expect(shown.querySelector('p')!.textContent).toBe(words);
  });

  it.each(HOSTILE_MARKUP)('as names of nodes, marks, attributes and values are refused or dropped: %s', (words) => {
    expect(refusal(doc({ type: words, content: [text('x')] })).code).toBe('unknown-node');
    expect(refusal(doc(paragraph(text('x', [{ type: words }])))).code).toBe('unknown-mark');
    expect(refusal(doc({ type: 'paragraph', attrs: { [words]: 'x' }, content: [text('x')] })).code).toBe('unknown-attribute');
    expect(refusal(doc({ type: 'codeBlock', attrs: { language: words }, content: [text('x')] })).code).toBe('attribute');
    expect(refusal(doc({ type: 'heading', attrs: { level: words }, content: [text('x')] })).code).toBe('attribute');
    expect(refusal(doc({ type: 'orderedList', attrs: { type: words }, content: [{ type: 'listItem', content: [paragraph(text('x'))] }] })).code).toBe('attribute');
    expect(refusal(doc(paragraph({ type: 'mention', attrs: { id: words } }))).code).toBe('attribute');
    expect(refusal(linked({ href: words })).code).toBe('link');
    const dressed = readRichText(linked({ href: 'https://example.org/', title: words, class: words, rel: words, target: words }));
    expect(JSON.stringify(dressed)).not.toContain(JSON.stringify(words).slice(1, -1));
    const labelled = readRichText(doc(paragraph({ type: 'mention', attrs: { id: PERSON, label: words } })));
    expect(labelled.content![0]!.content![0]!.attrs!['label']).toBeNull();
  });

  it.each(HOSTILE_ADDRESSES)('as the address of a link are refused: %j', (href) => {
    expect(refusal(linked({ href }))).toEqual({ field: 'content.content[0].content[0].marks[0].attrs.href', code: 'link' });
  });

  // an address may carry signs of markup; it is one address all the same
  it('inside an allowed address do not leave the attribute', () => {
    const read = readRichText(linked({ href: 'https://example.org/?"onmouseover="alert(1)"><script>' }));
    const link = rendered(read).querySelector('a')!;
    expect(link.getAttributeNames().sort()).toEqual(['href', 'rel', 'target']);
    expect(link.getAttribute('href')).toBe('https://example.org/?%22onmouseover=%22alert(1)%22%3E%3Cscript%3E');
  });
});

describe('what the editor does not make', () => {
  const deep = (levels: number): object => (levels === 0 ? paragraph(text('x')) : { type: 'blockquote', content: [deep(levels - 1)] });

  it.each<[string, unknown, string, string]>([
    ['text for a document', 'hello', 'content', 'type'],
    ['a list', [], 'content', 'type'],
    ['nothing', null, 'content', 'type'],
    ['another root', paragraph(text('x')), 'content', 'schema'],
    ['a document without words', doc(paragraph()), 'content', 'empty'],
    ['only spaces', doc(paragraph(text('  \n '))), 'content', 'empty'],
    ['an image', doc({ type: 'image', attrs: { src: 'https://attacker.example/x.png' } }), 'content.content[0].type', 'unknown-node'],
    ['an inherited name', doc({ type: 'constructor' }), 'content.content[0].type', 'unknown-node'],
    ['a style', doc({ type: 'paragraph', attrs: { style: 'position:fixed' }, content: [text('x')] }), 'content.content[0].attrs.style', 'unknown-attribute'],
    ['a field beside', doc({ ...paragraph(text('x')), onclick: 'x' }), 'content.content[0].onclick', 'unknown-attribute'],
    ['a mark’s field beside', doc(paragraph(text('x', [{ type: 'bold', style: 'x' }]))), 'content.content[0].content[0].marks[0].style', 'unknown-attribute'],
    ['an unknown mark', doc(paragraph(text('x', [{ type: 'textStyle' }]))), 'content.content[0].content[0].marks[0].type', 'unknown-mark'],
    ['text in a list', doc({ type: 'bulletList', content: [text('x')] }), 'content', 'schema'],
    ['a paragraph in a paragraph', doc(paragraph(paragraph(text('x')))), 'content', 'schema'],
    ['bold code in a code block', doc({ type: 'codeBlock', content: [text('x', [{ type: 'bold' }])] }), 'content', 'schema'],
    ['text without words', doc(paragraph({ type: 'text', text: '' })), 'content.content[0].content[0].text', 'type'],
    ['a number for text', doc(paragraph({ type: 'text', text: 5 })), 'content.content[0].content[0].text', 'type'],
    ['a heading of level 7', doc({ type: 'heading', attrs: { level: 7 }, content: [text('x')] }), 'content.content[0].attrs.level', 'attribute'],
    ['a link to an object', linked({ href: { toString: 'x' } }), 'content.content[0].content[0].marks[0].attrs.href', 'link'],
    ['an address without end', linked({ href: `https://example.org/${'a'.repeat(3000)}` }), 'content.content[0].content[0].marks[0].attrs.href', 'link'],
    ['too many characters', doc(paragraph(text('x'.repeat(RICH_TEXT_LIMITS.characters)), text('y'))), 'content.content[0].content[1].text', 'too-long'],
    ['too many mentions', doc(paragraph(...Array.from({ length: RICH_TEXT_LIMITS.mentions + 1 }, () => ({ type: 'mention', attrs: { id: PERSON } })))), 'content.content[0].content[20]', 'too-many'],
  ])('%s', (_what, value, field, code) => {
    expect(refusal(value)).toEqual({ field, code });
  });

  it('takes 20 levels and refuses the 21st, and never runs out of stack', () => {
    // document, quotes, paragraph, text
    expect(() => readRichText(doc(deep(RICH_TEXT_LIMITS.depth - 3)))).not.toThrow();
    expect(refusal(doc(deep(RICH_TEXT_LIMITS.depth - 2))).code).toBe('too-deep');
    let endless: object = paragraph(text('x'));
    for (let level = 0; level < 50_000; level++) endless = { type: 'blockquote', content: [endless] };
    expect(refusal(doc(endless)).code).toBe('too-deep');
  });

  it('refuses too many parts', () => {
    expect(refusal(doc(...Array.from({ length: RICH_TEXT_LIMITS.nodes }, () => paragraph(text('x'))))).code).toBe('too-many');
  });

  it('does not let a field named __proto__ through', () => {
    expect(refusal(JSON.parse('{"type":"doc","content":[{"type":"paragraph","attrs":{"__proto__":{"x":1}},"content":[{"type":"text","text":"x"}]}]}')).code).toBe('unknown-attribute');
  });
});
