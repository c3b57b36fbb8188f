import { S3Error } from './errors.js';

export interface XmlElement {
  name: string;
  children: XmlElement[];
  text: string;
}

/** What `element` takes as content: text, one built element, or several. */
type Content = string | number | boolean | Xml | readonly Xml[];

/** Marks text that is XML already, so that it isn't escaped twice. */
export class Xml {
  constructor(readonly source: string) {}
}

const ESCAPES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&apos;' };

function escapeText(text: string): string {
  // Control characters may be part of a key, so they are written as references, as S3 does.
  return text.replace(
    /[&<>"'\u0000-\u001f\u007f]/g,
    (character) => ESCAPES[character] ?? `&#x${character.charCodeAt(0).toString(16)};`,
  );
}

export function element(name: string, content: Content, namespace?: string): Xml {
  const opening = namespace === undefined ? name : `${name} xmlns="${namespace}"`;
  let inner: string;
  if (content instanceof Xml) inner = content.source;
  else if (typeof content === 'object') inner = content.map((child) => child.source).join('');
  else inner = escapeText(String(content));
  return new Xml(`<${opening}>${inner}</${name}>`);
}

const S3_NAMESPACE = 'http://s3.amazonaws.com/doc/2006-03-01/';

/** A whole answer whose root element stands in S3's namespace. */
export function document(name: string, children: readonly Xml[]): string {
  return `<?xml version="1.0" encoding="UTF-8"?>\n${element(name, children, S3_NAMESPACE).source}`;
}

/** S3's error answer, which has no namespace. */
export function errorDocument(error: S3Error, resource: string, requestId: string): string {
  const children = [
    element('Code', error.code),
    element('Message', error.message),
    ...Object.entries(error.details).map(([name, value]) => element(name, value)),
    element('Resource', resource),
    element('RequestId', requestId),
  ];
  return `<?xml version="1.0" encoding="UTF-8"?>\n${element('Error', children).source}`;
}

const ENTITIES: Record<string, string> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };

function unescapeText(text: string): string {
  return text.replace(/&([^;&]{0,10});?/g, (whole, name: string) => {
    const number = /^#(?:x([0-9a-f]+)|([0-9]+))$/i.exec(name);
    if (number !== null && whole.endsWith(';')) {
      const point = number[1] === undefined ? Number(number[2]) : Number.parseInt(number[1], 16);
      if (point <= 0x10ffff) return String.fromCodePoint(point);
    }
    const known = ENTITIES[name];
    if (known === undefined || !whole.endsWith(';')) throw new S3Error('MalformedXML');
    return known;
  });
}

// Document types are left out on purpose: without them there are no entities to expand.
const TOKEN = /<\?[^>]*\?>|<!--[\s\S]*?-->|<(\/?)([A-Za-z_][\w.:-]*)((?:\s+[\w.:-]+\s*=\s*(?:"[^"<]*"|'[^'<]*'))*)\s*(\/?)>|([^<]+)/y;

/** Reads the small documents that S3 takes as request bodies; prefixes and attributes are dropped. */
export function parseXml(source: string): XmlElement {
  const top: XmlElement = { name: '', children: [], text: '' };
  const open = [top];
  TOKEN.lastIndex = 0;
  const text = source.replace(/^\ufeff/, '');
  while (TOKEN.lastIndex < text.length) {
    const match = TOKEN.exec(text);
    if (match === null) throw new S3Error('MalformedXML');
    const [, closing, qualifiedName, , empty, characters] = match;
    const current = open[open.length - 1] ?? top;
    if (characters !== undefined) current.text += unescapeText(characters);
    if (qualifiedName === undefined) continue;
    const name = qualifiedName.replace(/^.*:/, '');
    if (closing === '/') {
      if (current.name !== name || open.length === 1) throw new S3Error('MalformedXML');
      open.pop();
      continue;
    }
    const child: XmlElement = { name, children: [], text: '' };
    current.children.push(child);
    if (empty !== '/') open.push(child);
  }
  const [root] = top.children;
  if (open.length !== 1 || root === undefined || top.children.length !== 1 || top.text.trim() !== '') {
    throw new S3Error('MalformedXML');
  }
  return root;
}

export function childText(parent: XmlElement, name: string): string | undefined {
  return parent.children.find((child) => child.name === name)?.text;
}

export function childrenNamed(parent: XmlElement, name: string): XmlElement[] {
  return parent.children.filter((child) => child.name === name);
}
