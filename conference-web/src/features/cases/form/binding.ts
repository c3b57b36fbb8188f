import { FIELD_WORDS, type FieldWords } from '@kerfside/calc/cases/field-words.js';
import type { CaseContent, ContentSection } from '@kerfside/calc/vocabulary/case-content.js';
import type { FieldError } from '@/lib/api/problem';
import type { CaseDraft } from '../draft/case-draft';
import { LIST_LIMITS, type ListName } from './field-limits';

/** A part of the case (a section or an item of a list) as its fields see it. */
export interface Binding<T extends object> {
  value: T;
  /** Works on what is there at that moment, so that two changes in a row never undo each other. */
  update: (change: (value: T) => T) => void;
  fields: Record<string, FieldWords>;
  /** The name under which the limits stand: a section or a list. */
  kind: string;
  /** Where it is, by ids, as findings name it: `parts[shell-1]`; empty for a section. */
  path: string;
  section: ContentSection;
  /** What the server refused here, by field. */
  refusals: FieldError[];
  disabled?: boolean;
}

export interface Identified {
  id: string;
}

/** `parts.0.sizeMm` and `parts[0].sizeMm` are the same place. */
const normal = (field: string) => field.replace(/\.(\d+)(?=\.|$)/g, '[$1]');

const below = (refusals: FieldError[], place: string): FieldError[] =>
  refusals
    .map((refusal) => ({ ...refusal, field: normal(refusal.field) }))
    .filter(({ field }) => field.startsWith(`${place}.`))
    .map((refusal) => ({ ...refusal, field: refusal.field.slice(place.length + 1) }));

export function bindSection<S extends ContentSection>(
  draft: Pick<CaseDraft, 'change' | 'getState'>,
  section: S,
  value: CaseContent[S],
  refusals: FieldError[],
  disabled?: boolean,
): Binding<CaseContent[S]> {
  return {
    value,
    update: (change) => draft.change(section, change(draft.getState().content[section])),
    fields: FIELD_WORDS[section],
    kind: section,
    path: '',
    section,
    refusals: below(refusals, section),
    disabled,
  };
}

/** The items of a list in a part of the case, each bound for itself, and what can be done with them. */
export function bindList<T extends object, I extends Identified>(parent: Binding<T>, list: ListName & keyof T & string) {
  const words = parent.fields[list];
  if (words?.kind !== 'list') throw new Error(`${list} is not a list`);
  const items = (parent.value[list] ?? []) as unknown as I[];
  const change = (how: (items: I[]) => I[]) => parent.update((value) => ({ ...value, [list]: how((value[list] ?? []) as unknown as I[]) }));
  const place = (id: string) => `${parent.path ? `${parent.path}.` : ''}${list}[${id}]`;
  return {
    items,
    name: (item: I) => words.item.name(item as unknown as Record<string, unknown>),
    isFull: items.length >= LIST_LIMITS[list],
    bind: (item: I, index: number): Binding<I> => ({
      value: item,
      update: (how) => change((all) => all.map((other) => (other.id === item.id ? how(other) : other))),
      fields: words.item.fields,
      kind: list,
      path: place(item.id),
      section: parent.section,
      refusals: below(parent.refusals, `${list}[${index}]`),
      disabled: parent.disabled,
    }),
    add: (item: I, at?: number) => change((all) => all.toSpliced(at ?? all.length, 0, item)),
    remove: (id: string) => change((all) => all.filter((item) => item.id !== id)),
    move: (id: string, by: number) =>
      change((all) => {
        const from = all.findIndex((item) => item.id === id);
        const to = from + by;
        return from < 0 || to < 0 || to >= all.length ? all : all.toSpliced(from, 1).toSpliced(to, 0, all[from]!);
      }),
  };
}

export type BoundList<T extends object, I extends Identified> = ReturnType<typeof bindList<T, I>>;

/** An id that stays with an item, so that remarks and versions can point at it. */
export const newId = (kind: string): string => `${kind}-${crypto.randomUUID().slice(0, 8)}`;

/** Marks the place of a field on the page, for those who are led there. */
export const fieldPlace = (section: string, path: string): string => `${section}.${path}`;
