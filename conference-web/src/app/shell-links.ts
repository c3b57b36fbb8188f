import { paths } from './paths';

export const WORK_LINKS = [
  { to: paths.cases, word: 'Cases' },
  { to: paths.meetings, word: 'Meetings' },
  { to: paths.decisions, word: 'Decisions' },
];

export const ADMIN_LINKS = [
  { to: paths.adminPeople, word: 'People' },
  { to: paths.adminConferences, word: 'Conferences' },
  { to: paths.adminMail, word: 'Mail' },
  { to: paths.adminAudit, word: 'Audit' },
];
