import { ATTENDANCE_WORDS, type AttendanceState } from '@kerfside/calc/vocabulary/meetings.js';
import { DISCIPLINE_WORDS, DISCIPLINES, type Discipline } from '@kerfside/calc/vocabulary/people.js';
import type { Decision } from './api/list-decisions-of-case';

type Attendance = Decision['attendance'][number];

const orderOf = (discipline: string) => DISCIPLINES.indexOf(discipline as Discipline);

/** Who was there, by discipline in the trade's own order. */
export function presentByDiscipline(attendance: readonly Attendance[]): { discipline: string; people: Attendance[] }[] {
  const names = [...new Set(attendance.map(({ discipline }) => discipline))].sort((a, b) => orderOf(a) - orderOf(b));
  return names.map((name) => ({
    discipline: DISCIPLINE_WORDS[name as Discipline] ?? name,
    people: attendance.filter(({ discipline }) => discipline === name),
  }));
}

/** `Ada Example (remote), North Hospital`. */
export function attendeeWords({ name, unit, state }: Attendance): string {
  const word = state === 'present' ? '' : ` (${(ATTENDANCE_WORDS[state as AttendanceState] ?? state).toLowerCase()})`;
  return `${name}${word}, ${unit}`;
}

/** A fingerprint in groups of eight, so that two can be compared by eye. */
export const grouped = (hash: string): string => hash.match(/.{1,8}/g)?.join(' ') ?? hash;

/** `Decision 12`, `Advice 12`, `Draft of a decision`. */
export function decisionName({ kind, number }: Pick<Decision, 'kind' | 'number'>): string {
  const word = kind === 'advice' ? 'Advice' : 'Decision';
  return number === null ? `Draft of ${kind === 'advice' ? 'an advice' : 'a decision'}` : `${word} ${number}`;
}
