import { sectionDifferences } from '@kerfside/calc/cases/differences.js';
import { FIELD_WORDS } from '@kerfside/calc/cases/field-words.js';
import { type CaseContent, CONTENT_SECTIONS, type ContentSection } from '@kerfside/calc/vocabulary/case-content.js';

/** The fields of a section that two people changed, each in their own way. */
export type HeldFields = Partial<Record<ContentSection, string[]>>;

export interface Merged {
  content: CaseContent;
  /** Both changed these: `content` has mine until a person decides. */
  held: HeldFields;
  /** Only the others changed these: `content` has theirs. */
  takenOver: ContentSection[];
}

type Values = Record<string, unknown>;

const fieldOf = (path: string) => path.split(/[[.]/, 1)[0]!;

/** The fields (lists as a whole) in which two states of a section say something else. */
const changedFields = (section: ContentSection, from: object, to: object): Set<string> =>
  new Set(sectionDifferences(section, from, to).map(({ path }) => fieldOf(path)));

/**
 * Brings together what I wrote and what was saved elsewhere since `base`. A field that one side changed is that
 * side's; where both changed it, mine stays and the field is held. Nothing of either is dropped without being named.
 */
export function mergeContent(base: CaseContent, mine: CaseContent, theirs: CaseContent): Merged {
  const merged: Merged = { content: { ...mine }, held: {}, takenOver: [] };
  for (const section of CONTENT_SECTIONS) {
    const byMe = changedFields(section, base[section], mine[section]);
    const byThem = changedFields(section, base[section], theirs[section]);
    const apart = changedFields(section, mine[section], theirs[section]);
    const held = [...byMe].filter((field) => byThem.has(field) && apart.has(field));
    const taken = [...byThem].filter((field) => !byMe.has(field));
    merged.content[section] = withFields(section, theirs[section], mine[section], [...byMe]) as never;
    if (held.length) merged.held[section] = held;
    if (taken.length) merged.takenOver.push(section);
  }
  return merged;
}

/** A section with some of its fields as another state has them. */
export function withFields<S extends ContentSection>(section: S, value: CaseContent[S], from: CaseContent[S], fields: string[]): CaseContent[S] {
  const known = FIELD_WORDS[section];
  const changed: Values = { ...value };
  for (const field of fields) if (field in known) changed[field] = (from as Values)[field];
  return changed as CaseContent[S];
}

/** What stands against what in the held fields: `from` is mine, `to` is theirs. */
export const heldDifferences = (section: ContentSection, fields: string[], mine: CaseContent, theirs: CaseContent) =>
  sectionDifferences(section, mine[section], theirs[section]).filter(({ path }) => fields.includes(fieldOf(path)));
