import type { Schemas } from '@/lib/api/types';

/** What of an agenda is edited. */
export type AgendaEntry = Schemas['AgendaEntryDto'];

export const entriesOf = (items: readonly AgendaEntry[]): AgendaEntry[] => items.map(({ caseId, minutes }) => ({ caseId, minutes }));

export const sameAgenda = (one: readonly AgendaEntry[], other: readonly AgendaEntry[]): boolean =>
  one.length === other.length && one.every(({ caseId, minutes }, index) => other[index]?.caseId === caseId && other[index].minutes === minutes);

const minutesBy = (entries: readonly AgendaEntry[]) => new Map(entries.map(({ caseId, minutes }) => [caseId, minutes]));

/** What turned one agenda into another, a line for each change. */
export function agendaChanges(from: readonly AgendaEntry[], to: readonly AgendaEntry[], name: (caseId: string) => string): string[] {
  const before = minutesBy(from);
  const after = minutesBy(to);
  const added = to.filter(({ caseId }) => !before.has(caseId)).map(({ caseId, minutes }) => `${name(caseId)} put on, ${minutes} min`);
  const removed = from.filter(({ caseId }) => !after.has(caseId)).map(({ caseId }) => `${name(caseId)} taken off`);
  const timed = to
    .filter(({ caseId, minutes }) => before.has(caseId) && before.get(caseId) !== minutes)
    .map(({ caseId, minutes }) => `${name(caseId)}: ${before.get(caseId)} → ${minutes} min`);
  const kept = (entries: readonly AgendaEntry[]) => entries.map(({ caseId }) => caseId).filter((id) => before.has(id) && after.has(id));
  const isReordered = kept(from).join() !== kept(to).join();
  return [...added, ...removed, ...timed, ...(isReordered ? ['Another order'] : [])];
}

/**
 * My agenda with what the other person changed since we both began: what they put on goes to the end, what they took
 * off goes, their minutes count where I left the minutes alone. Where both changed the same, mine is kept.
 */
export function mergeAgendas(base: readonly AgendaEntry[], mine: readonly AgendaEntry[], theirs: readonly AgendaEntry[]): AgendaEntry[] {
  const inBase = minutesBy(base);
  const inMine = minutesBy(mine);
  const inTheirs = minutesBy(theirs);
  const kept = mine
    .filter(({ caseId }) => inTheirs.has(caseId) || !inBase.has(caseId))
    .map((entry) => (inBase.get(entry.caseId) === entry.minutes ? { ...entry, minutes: inTheirs.get(entry.caseId) ?? entry.minutes } : entry));
  const added = theirs.filter(({ caseId }) => !inBase.has(caseId) && !inMine.has(caseId));
  return [...kept, ...entriesOf(added)];
}

export const plannedMinutes = (entries: readonly AgendaEntry[]): number => entries.reduce((sum, { minutes }) => sum + minutes, 0);
