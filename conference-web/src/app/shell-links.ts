import type { Me } from '@/lib/auth/session';
import { paths } from './paths';

export const WORK_LINKS = [
  { to: paths.cases, word: 'Cases' },
  { to: paths.meetings, word: 'Meetings' },
  { to: paths.decisions, word: 'Decisions' },
];

const ADMIN_LINKS = [
  { to: paths.adminPeople, word: 'People' },
  { to: paths.adminConferences, word: 'Conferences' },
  { to: paths.adminMail, word: 'Mail' },
  { to: paths.adminAudit, word: 'Audit' },
];

/** What the person sets up: all of it, the own conferences, or nothing. */
export function setUpLinks({ isAdministrator, memberships }: Me): typeof ADMIN_LINKS {
  if (isAdministrator) return ADMIN_LINKS;
  return memberships.some(({ role }) => role === 'chair') ? ADMIN_LINKS.filter(({ to }) => to === paths.adminConferences) : [];
}
