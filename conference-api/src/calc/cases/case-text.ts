import { type CaseContent, CONTENT_SECTIONS, type ContentSection } from '../vocabulary/case-content.js';
import { FIELD_WORDS, type FieldWords, saysNothing, valueInWords } from './field-words.js';

/** A text that somebody typed, with where it stands. */
export interface CaseText {
  section: ContentSection;
  /** For example `operations[op-1].procedure`. */
  path: string;
  label: string;
  text: string;
}

type Fields = Record<string, FieldWords>;
type Visit = (path: string, label: string, field: FieldWords, value: unknown) => void;

/** Every text field that says something, in the order of the sheet. */
export function caseTexts(content: CaseContent): CaseText[] {
  const found: CaseText[] = [];
  for (const section of CONTENT_SECTIONS)
    visit(FIELD_WORDS[section], content[section], '', '', (path, label, field, value) => {
      if (field.kind === 'text' && typeof value === 'string') found.push({ section, path, label, text: value });
    });
  return found;
}

/** What the search looks through: the code, all typed text, and the words of what was chosen. */
export function caseSearchText(code: string, content: CaseContent): string {
  const lines = [code];
  for (const section of CONTENT_SECTIONS)
    visit(FIELD_WORDS[section], content[section], '', '', (_path, _label, field, value) => {
      if (field.kind === 'text' || field.kind === 'one' || field.kind === 'many') lines.push(valueInWords(field, value) ?? '');
    });
  return lines.join('\n');
}

function visit(fields: Fields, holder: unknown, path: string, label: string, seen: Visit): void {
  const values = (holder ?? {}) as Record<string, unknown>;
  for (const [name, field] of Object.entries(fields)) {
    const value = values[name];
    if (saysNothing(value)) continue;
    const at = path ? `${path}.${name}` : name;
    if (field.kind !== 'list') {
      seen(at, label ? `${label}, ${field.label}` : field.label, field, value);
      continue;
    }
    for (const item of value as Record<string, unknown>[])
      visit(field.item.fields, item, `${at}[${String(item[field.item.key])}]`, field.item.name(item), seen);
  }
}
