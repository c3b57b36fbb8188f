import { CalcInputError } from '../common/calc-input-error.js';
import { HEADING_LEVELS, LINK_ATTRIBUTES } from './extensions.js';

type Attributes = Record<string, unknown>;

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;
const LANGUAGE = /^[A-Za-z0-9+#-]{1,20}$/;
const LIST_TYPES: unknown[] = ['1', 'a', 'A', 'i', 'I'];
const LINK_PROTOCOLS = ['http:', 'https:', 'mailto:'];
const LONGEST_LINK = 2000;
// browsers drop these inside an address: 'java\tscript:' would become a script
const UNSEEN = /[\u0000-\u0020\u007f-\u00a0\u00ad\u200b-\u200f\u2028-\u202f\u2060-\u206f\ufeff]/;

const refuse = (path: string, name: string, message: string): never => {
  throw new CalcInputError(`${path}.${name}`, name === 'href' ? 'link' : 'attribute', message);
};

/** The attributes that a node keeps; undefined where it has none. */
export function attributesOfNode(type: string, sent: Attributes, path: string): Attributes | undefined {
  switch (type) {
    case 'heading':
      if (!HEADING_LEVELS.some((level) => level === sent['level'])) refuse(path, 'level', 'A heading has one of the levels 1 to 4.');
      return { level: sent['level'] };
    case 'orderedList':
      return { start: listStart(sent['start'], path), type: listType(sent['type'], path) };
    case 'codeBlock':
      if (isSet(sent['language']) && !(typeof sent['language'] === 'string' && LANGUAGE.test(sent['language'])))
        refuse(path, 'language', 'A language has letters, digits, + # - only.');
      return { language: sent['language'] ?? null };
    case 'mention':
      return mention(sent, path);
    default:
      return undefined;
  }
}

/** The attributes that a mark keeps: of a link its address, the rest is fixed. */
export const attributesOfMark = (type: string, sent: Attributes, path: string): Attributes | undefined =>
  type === 'link' ? { href: linkAddress(sent['href'], path), ...LINK_ATTRIBUTES } : undefined;

const isSet = (value: unknown): boolean => value !== undefined && value !== null;

function listStart(value: unknown, path: string): number {
  if (!isSet(value)) return 1;
  if (!Number.isInteger(value) || (value as number) < 1 || (value as number) > 9999) refuse(path, 'start', 'A list starts at a whole number from 1 to 9999.');
  return value as number;
}

function listType(value: unknown, path: string): unknown {
  if (isSet(value) && !LIST_TYPES.includes(value)) refuse(path, 'type', 'A list is numbered by 1, a, A, i or I.');
  return value ?? null;
}

function mention(sent: Attributes, path: string): Attributes {
  const { id, label, mentionSuggestionChar } = sent;
  if (typeof id !== 'string' || !UUID.test(id)) refuse(path, 'id', 'A mention names a person by the id.');
  if (isSet(label) && typeof label !== 'string') refuse(path, 'label', 'The label of a mention is text.');
  if (isSet(mentionSuggestionChar) && mentionSuggestionChar !== '@') refuse(path, 'mentionSuggestionChar', 'A mention begins with @.');
  // the label is the server's to set: see withMentionNames
  return { id: (id as string).toLowerCase(), label: null, mentionSuggestionChar: '@' };
}

function linkAddress(value: unknown, path: string): string {
  const href = typeof value === 'string' ? value.trim() : '';
  const remedy = 'A link must be a whole address that begins with http://, https:// or mailto:.';
  if (!href || href.length > LONGEST_LINK || UNSEEN.test(href) || !URL.canParse(href)) return refuse(path, 'href', remedy);
  const url = new URL(href);
  if (!LINK_PROTOCOLS.includes(url.protocol)) return refuse(path, 'href', remedy);
  if (url.username || url.password) return refuse(path, 'href', 'A link must not carry a user name or a password.');
  return url.href;
}
