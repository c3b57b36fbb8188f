import type { QuorumRule } from '../vocabulary/conference.js';
import type { AttendanceState } from '../vocabulary/meetings.js';
import { DISCIPLINE_WORDS, type Discipline, RATING_ROLES, type Role } from '../vocabulary/people.js';

export interface Attendee {
  discipline: Discipline;
  role: Role;
  state: AttendanceState;
}

/**
 * Whether enough of the panel is there, by head count and by discipline. Only members who rate and are
 * present or remote count; observers and coordinators do not.
 * @param infected whether the case is infected or may be: then rules marked `infectionOnly` hold too
 * @returns `missing` in plain words, for example '1 more of infection and microbiology'
 * Source: common practice, no source.
 */
export function quorum(rule: QuorumRule, attendees: readonly Attendee[], infected: boolean): { met: boolean; missing: string[] } {
  const counted = attendees.filter((attendee) => attendee.state !== 'apologies' && RATING_ROLES.includes(attendee.role));
  const missing: string[] = [];
  const short = rule.raters - counted.length;
  if (short > 0) missing.push(`${short} more ${short === 1 ? 'member' : 'members'} who rate`);
  for (const { discipline, atLeast, infectionOnly } of rule.disciplines) {
    if (infectionOnly && !infected) continue;
    const lacking = atLeast - counted.filter((attendee) => attendee.discipline === discipline).length;
    if (lacking > 0) missing.push(`${lacking} more of ${DISCIPLINE_WORDS[discipline].toLowerCase()}`);
  }
  return { met: missing.length === 0, missing };
}
