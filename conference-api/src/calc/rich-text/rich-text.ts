import { getSchema } from '@tiptap/core';
import type { Schema } from '@tiptap/pm/model';
import { CalcInputError } from '../common/calc-input-error.js';
import type { RichText } from '../vocabulary/discussions.js';
import { attributesOfMark, attributesOfNode } from './attributes.js';
import { richTextExtensions } from './extensions.js';

export const RICH_TEXT_LIMITS = { depth: 20, characters: 20_000, nodes: 5_000, mentions: 20 } as const;

let built: Schema | undefined;
const schema = (): Schema => (built ??= getSchema(richTextExtensions()));

interface Count {
  characters: number;
  nodes: number;
  mentions: number;
}

const refuse = (path: string, code: string, message: string): never => {
  throw new CalcInputError(path, code, message);
};

/**
 * The document as it may be kept: every node, mark and attribute is one of the editor's own, links lead to
 * http, https or mailto, and what only changes the look of a link is replaced by fixed values. The answer is
 * ProseMirror's own form of it, so that nothing comes through that the schema does not know.
 *
 * @param value what was sent as TipTap JSON
 * @param field name of the field, for the path of a refusal
 * @throws CalcInputError `type`, `unknown-node`, `unknown-mark`, `unknown-attribute`, `attribute`, `link`,
 * `too-deep`, `too-long`, `too-many`, `empty` or `schema`, with the path of what is refused
 */
export function readRichText(value: unknown, field = 'content'): RichText {
  const count: Count = { characters: 0, nodes: 0, mentions: 0 };
  const node = readNode(value, field, 1, count);
  if (node.type !== 'doc') refuse(field, 'schema', `${field} must be a whole document.`);
  if (!hasSubstance(node)) refuse(field, 'empty', 'Write something first.');
  try {
    const checked = schema().nodeFromJSON(node);
    checked.check();
    return checked.toJSON() as RichText;
  } catch {
    return refuse(field, 'schema', `${field} is not a document that the editor makes: its parts stand where they can not.`);
  }
}

function readNode(value: unknown, path: string, depth: number, count: Count): RichText {
  if (depth > RICH_TEXT_LIMITS.depth) refuse(path, 'too-deep', `A remark may be nested ${RICH_TEXT_LIMITS.depth} deep at most.`);
  if (++count.nodes > RICH_TEXT_LIMITS.nodes) refuse(path, 'too-many', `A remark may have ${RICH_TEXT_LIMITS.nodes} parts at most.`);
  const sent = readObject(value, path, ['type', 'attrs', 'content', 'marks', 'text']);
  const { type } = sent;
  if (typeof type !== 'string' || !Object.hasOwn(schema().nodes, type))
    return refuse(`${path}.type`, 'unknown-node', `${path}.type is not a part that a remark can have.`);
  const node: RichText = { type };
  const attrs = attributesOfNode(type, readAttributes(sent['attrs'], `${path}.attrs`, schema().nodes[type]!.spec.attrs), `${path}.attrs`);
  if (attrs) node.attrs = attrs;
  if (type === 'mention' && ++count.mentions > RICH_TEXT_LIMITS.mentions)
    refuse(path, 'too-many', `A remark may mention ${RICH_TEXT_LIMITS.mentions} people at most.`);
  if (type === 'text') node.text = readText(sent['text'], `${path}.text`, count);
  else if (sent['text'] !== undefined) refuse(`${path}.text`, 'schema', 'Only a text has text.');
  if (sent['marks'] !== undefined) node.marks = readList(sent['marks'], `${path}.marks`).map((mark, index) => readMark(mark, `${path}.marks[${index}]`));
  if (sent['content'] !== undefined)
    node.content = readList(sent['content'], `${path}.content`).map((child, index) => readNode(child, `${path}.content[${index}]`, depth + 1, count));
  return node;
}

function readMark(value: unknown, path: string): { type: string; attrs?: Record<string, unknown> } {
  const sent = readObject(value, path, ['type', 'attrs']);
  const { type } = sent;
  if (typeof type !== 'string' || !Object.hasOwn(schema().marks, type))
    return refuse(`${path}.type`, 'unknown-mark', `${path}.type is not a marking that a remark can have.`);
  const attrs = attributesOfMark(type, readAttributes(sent['attrs'], `${path}.attrs`, schema().marks[type]!.spec.attrs), `${path}.attrs`);
  return attrs ? { type, attrs } : { type };
}

function readObject(value: unknown, path: string, known: readonly string[]): Record<string, unknown> {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return refuse(path, 'type', `${path} must be an object.`);
  const stranger = Object.keys(value).find((key) => !known.includes(key));
  if (stranger !== undefined) refuse(`${path}.${stranger.slice(0, 40)}`, 'unknown-attribute', `${path} has a field that the editor does not make.`);
  return value as Record<string, unknown>;
}

const readAttributes = (value: unknown, path: string, known: object | undefined | null): Record<string, unknown> =>
  value === undefined || value === null ? {} : readObject(value, path, Object.keys(known ?? {}));

function readList(value: unknown, path: string): unknown[] {
  if (!Array.isArray(value)) return refuse(path, 'type', `${path} must be a list.`);
  if (value.length > RICH_TEXT_LIMITS.nodes) refuse(path, 'too-many', `${path} has too many entries.`);
  return value;
}

function readText(value: unknown, path: string, count: Count): string {
  if (typeof value !== 'string' || value === '') return refuse(path, 'type', `${path} must be text.`);
  count.characters += value.length;
  if (count.characters > RICH_TEXT_LIMITS.characters)
    refuse(path, 'too-long', `A remark may have ${RICH_TEXT_LIMITS.characters} characters at most.`);
  // half of a surrogate pair is no character: the database would not take it
  return value.replace(/\p{Surrogate}/gu, '\ufffd');
}

const hasSubstance = (node: RichText): boolean =>
  node.type === 'mention' || (node.text ?? '').trim() !== '' || (node.content ?? []).some(hasSubstance);
