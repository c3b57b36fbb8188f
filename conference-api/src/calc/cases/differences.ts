import { type CaseContent, CONTENT_SECTIONS, type ContentSection } from '../vocabulary/case-content.js';
import { FIELD_WORDS, type FieldWords, type ItemWords, saysNothing, valueInWords } from './field-words.js';

/** One field that says something else than before, in words. */
export interface Difference {
  section: ContentSection;
  /** For example `parts[shell-1].outerDiameterMm`. */
  path: string;
  label: string;
  /** Null where nothing was said. */
  from: string | null;
  to: string | null;
}

type Item = Record<string, unknown>;
interface Place {
  section: ContentSection;
  path: string;
  label: string;
}

/**
 * What `to` says otherwise than `from`, field by field in the order of the sheet. Items of lists are told
 * apart by their id (rim sectors by their hour), so that an inserted item is one addition and not a
 * change of all that follow; a changed order is named once. Empty text, null and absent are the same.
 */
export function contentDifferences(from: CaseContent, to: CaseContent): Difference[] {
  return CONTENT_SECTIONS.flatMap((section) => sectionDifferences(section, from[section], to[section]));
}

/** The same for one section. */
export function sectionDifferences(section: ContentSection, from: object | undefined, to: object | undefined): Difference[] {
  const before = (from ?? {}) as Item;
  const after = (to ?? {}) as Item;
  return Object.entries(FIELD_WORDS[section]).flatMap(([name, field]) =>
    fieldDifferences({ section, path: name, label: field.label }, field, before[name], after[name]),
  );
}

/** The sections in which two contents differ. */
export const changedSections = (from: CaseContent, to: CaseContent): ContentSection[] =>
  CONTENT_SECTIONS.filter((section) => sectionDifferences(section, from[section], to[section]).length > 0);

function fieldDifferences(place: Place, field: FieldWords, from: unknown, to: unknown): Difference[] {
  if (field.kind === 'list') return listDifferences(place, field.item, asItems(from), asItems(to));
  if (sameValue(field, from, to)) return [];
  return [{ ...place, from: valueInWords(field, from), to: valueInWords(field, to) }];
}

const asItems = (value: unknown): Item[] => (Array.isArray(value) ? (value as Item[]) : []);

function sameValue(field: FieldWords, from: unknown, to: unknown): boolean {
  if (saysNothing(from) || saysNothing(to)) return saysNothing(from) && saysNothing(to);
  if (field.kind === 'many') return valueInWords(field, from) === valueInWords(field, to);
  return from === to;
}

function listDifferences(place: Place, item: ItemWords, from: Item[], to: Item[]): Difference[] {
  const keyOf = (one: Item) => String(one[item.key]);
  const before = new Map(from.map((one) => [keyOf(one), one]));
  const after = new Map(to.map((one) => [keyOf(one), one]));
  const found: Difference[] = [];
  for (const [key, one] of after) {
    const earlier = before.get(key);
    const at = { ...place, path: `${place.path}[${key}]`, label: item.name(one) };
    if (earlier) found.push(...itemDifferences(at, item, earlier, one));
    else found.push({ ...at, from: null, to: itemInWords(item, one) });
  }
  for (const [key, one] of before)
    if (!after.has(key))
      found.push({ ...place, path: `${place.path}[${key}]`, label: item.name(one), from: itemInWords(item, one), to: null });
  return [...found, ...orderDifference(place, item, before, after)];
}

const itemDifferences = (place: Place, item: ItemWords, from: Item, to: Item): Difference[] =>
  Object.entries(item.fields).flatMap(([name, field]) =>
    fieldDifferences({ ...place, path: `${place.path}.${name}`, label: `${place.label}, ${field.label}` }, field, from[name], to[name]),
  );

// where items stay, they should stay in their order: that of a plan's steps has a meaning
function orderDifference(place: Place, item: ItemWords, before: Map<string, Item>, after: Map<string, Item>): Difference[] {
  if (item.key !== 'id') return [];
  const kept = [...before.keys()].filter((key) => after.has(key));
  const keptAfter = [...after.keys()].filter((key) => before.has(key));
  if (kept.every((key, index) => keptAfter[index] === key)) return [];
  const inWords = (keys: string[]) => keys.map((key) => item.name(after.get(key)!)).join(' → ');
  return [{ ...place, label: `${place.label}, order`, from: inWords(kept), to: inWords(keptAfter) }];
}

/** All that an item says in one line: 'Fixation: Loose; outer diameter: 54 mm'. */
function itemInWords(item: ItemWords, one: Item): string {
  const parts = Object.entries(item.fields)
    .filter(([name, field]) => field.kind !== 'id' && !saysNothing(one[name]))
    .map(([name, field]) => `${field.label}: ${valueInWords(field, one[name]) ?? ''}`);
  return parts.join('; ') || item.name(one);
}
