/**
 * Who gets which answer on which route: the expectation, written from who may do what in the domain, not read
 * from the code under test. A route that stands in no row fails the test.
 *
 * Answers: `ok` is anything that is no refusal of permission (2xx, or 409 where the call itself is stale);
 * a number is that status and nothing else. 404 where a person may not know that the thing exists.
 */
export const KINDS = [
  'nobody',
  'presenter',
  'surgeon',
  'panellist',
  'chair',
  'coordinator',
  'observer',
  'administrator',
  'stranger',
] as const;
export type Kind = (typeof KINDS)[number];

export interface PermissionRow {
  route: string;
  /** What the call is about: a maker of `permission-subjects.ts`. */
  about: string;
  answers: Record<Kind, string>;
}

const row = (route: string, about: string, answers: string): PermissionRow => {
  const list = answers.split(/\s+/);
  if (list.length !== KINDS.length) throw new Error(`${route}: ${list.length} answers for ${KINDS.length} kinds of people`);
  return { route, about, answers: Object.fromEntries(KINDS.map((kind, index) => [kind, list[index]!])) as Record<Kind, string> };
};

// nobody presenter surgeon panellist chair coordinator observer administrator stranger
const ANYONE = 'ok ok ok ok ok ok ok ok ok';
const SIGNED_IN = '401 ok ok ok ok ok ok ok ok';
const MEMBERS = '401 ok ok ok ok ok ok 404 404';
const RATERS = '401 ok ok ok ok 403 403 404 404';
const SURGEONS = '401 ok ok 403 403 403 403 404 404';
const OWN_CASE = '401 ok 403 403 403 403 403 404 404';
// a draft: for another surgeon it is not there; who may never write cases is told so without looking
const OWN_DRAFT = '401 ok 404 403 403 403 403 404 404';
const CHAIR = '401 403 403 403 ok 403 403 404 403';
const COORDINATOR = '401 403 403 403 403 ok 403 404 403';
const CHAIR_AND_COORDINATOR = '401 403 403 403 ok ok 403 404 403';
const ADMINISTRATOR = '401 403 403 403 403 403 403 ok 403';

const ACCOUNT = [
  row('POST /api/auth/sign-in', 'the right password', ANYONE),
  row('POST /api/auth/refresh', 'a signed-in browser', ANYONE),
  row('POST /api/auth/sign-out', 'a signed-in browser', ANYONE),
  row('POST /api/auth/password-reset', 'nothing', ANYONE),
  row('POST /api/auth/password-reset/confirm', 'a reset link', ANYONE),
  row('GET /api/auth/invitations/:token', 'an invitation', ANYONE),
  row('POST /api/auth/invitations/:token/accept', 'an invitation', ANYONE),
  row('GET /api/auth/me', 'nothing', SIGNED_IN),
  // the call gives a wrong present password: 422 is past every permission
  row('POST /api/auth/password', 'nothing', '401 422 422 422 422 422 422 422 422'),
  row('GET /api/auth/sessions', 'nothing', SIGNED_IN),
  row('DELETE /api/auth/sessions', 'nothing', SIGNED_IN),
  row('DELETE /api/auth/sessions/:id', 'the own session', SIGNED_IN),
  row('DELETE /api/auth/sessions/:id', 'the session of somebody else', '401 404 404 404 404 404 404 404 404'),
  row('GET /api/events', 'nothing', SIGNED_IN),
  row('GET /api/unread', 'nothing', SIGNED_IN),
  row('GET /api/health/live', 'nothing', ANYONE),
  row('GET /api/health/ready', 'nothing', ANYONE),
  row('POST /api/calculators/:name', 'nothing', SIGNED_IN),
];

const SITE = [
  row('GET /api/people', 'nothing', ADMINISTRATOR),
  row('POST /api/people/invitations', 'nothing', ADMINISTRATOR),
  row('GET /api/people/:id', 'a newcomer', ADMINISTRATOR),
  row('PATCH /api/people/:id', 'a newcomer', ADMINISTRATOR),
  row('POST /api/people/:id/invitation', 'a newcomer', ADMINISTRATOR),
  row('GET /api/units', 'nothing', SIGNED_IN),
  row('POST /api/units', 'nothing', ADMINISTRATOR),
  row('PATCH /api/units/:id', 'a unit', ADMINISTRATOR),
  row('GET /api/audit', 'nothing', ADMINISTRATOR),
  row('GET /api/mail', 'nothing', ADMINISTRATOR),
  row('POST /api/mail/:id/retry', 'a failed mail', ADMINISTRATOR),
  row('POST /api/mail/:id/drop', 'a failed mail', ADMINISTRATOR),
];

const CONFERENCES = [
  row('GET /api/conferences', 'nothing', SIGNED_IN),
  row('POST /api/conferences', 'nothing', ADMINISTRATOR),
  row('GET /api/conferences/:id', 'the conference', '401 ok ok ok ok ok ok ok 404'),
  row('PATCH /api/conferences/:id', 'the conference', '401 403 403 403 ok 403 403 ok 404'),
  row('GET /api/conferences/:id/members', 'the conference', '401 ok ok ok ok ok ok ok 404'),
  row('PUT /api/conferences/:id/members/:personId', 'a newcomer to the conference', ADMINISTRATOR),
  row('DELETE /api/conferences/:id/members/:personId', 'a member', ADMINISTRATOR),
];

const CASES = [
  row('GET /api/cases', 'nothing', SIGNED_IN),
  row('POST /api/cases', 'the conference', SURGEONS),
  row('GET /api/cases/:id', 'a draft', '401 ok 404 404 404 404 404 404 404'),
  row('GET /api/cases/:id', 'a case being checked', '401 ok 404 404 404 ok 404 404 404'),
  row('GET /api/cases/:id', 'an open case', MEMBERS),
  row('GET /api/cases/:id', 'a listed case', MEMBERS),
  row('GET /api/cases/:id', 'a decided case', MEMBERS),
  row('GET /api/cases/:id', 'a withdrawn case', '401 ok 404 404 ok ok 404 404 404'),
  row('GET /api/cases/:id', 'a case of the other conference', '401 404 404 404 404 404 404 404 ok'),
  row('PATCH /api/cases/:id', 'a draft', OWN_DRAFT),
  row('PATCH /api/cases/:id', 'an open case', OWN_CASE),
  row('GET /api/cases/:id/readiness', 'a draft', '401 ok 404 404 404 404 404 404 404'),
  row('GET /api/cases/:id/readiness', 'an open case', MEMBERS),
  row('GET /api/cases/:id/identifiers', 'a case being checked', '401 ok 404 404 404 ok 404 404 404'),
  row('GET /api/cases/:id/identifiers', 'an open case', '401 ok 403 403 403 ok 403 404 404'),
  row('POST /api/cases/:id/post', 'a draft', OWN_DRAFT),
  row('POST /api/cases/:id/release', 'a case being checked', COORDINATOR),
  row('POST /api/cases/:id/release', 'a draft', '401 403 403 403 403 404 403 404 403'),
  row('POST /api/cases/:id/return', 'a case being checked', COORDINATOR),
  row('POST /api/cases/:id/withdraw', 'an open case', OWN_CASE),
  row('POST /api/cases/:id/withdraw', 'a draft', OWN_DRAFT),
  row('GET /api/cases/:id/versions', 'an open case', MEMBERS),
  row('GET /api/cases/:id/versions', 'a draft', '401 ok 404 404 404 404 404 404 404'),
  row('GET /api/cases/:id/versions/:version/differences', 'an open case', MEMBERS),
  row('GET /api/cases/:caseId/audit', 'an open case', CHAIR),
  row('GET /api/cases/:caseId/audit', 'a draft', '401 403 403 403 404 403 403 404 403'),
];

const IMAGES = [
  row('GET /api/cases/:caseId/images', 'an open case', MEMBERS),
  row('GET /api/cases/:caseId/images', 'a draft', '401 ok 404 404 404 404 404 404 404'),
  row('POST /api/cases/:caseId/images', 'an open case', OWN_CASE),
  row('POST /api/cases/:caseId/images', 'a draft', OWN_DRAFT),
  row('PATCH /api/images/:id', 'a picture', OWN_CASE),
  row('DELETE /api/images/:id', 'a picture', OWN_CASE),
  // the signature in the address is the permission
  row('GET /api/images/:id/file/:size', 'a stored picture', ANYONE),
  row('GET /api/images/:id/file/:size', 'a stored picture under a changed address', '403 403 403 403 403 403 403 403 403'),
];

// the question is the panellist's
const DISCUSSION = [
  row('GET /api/cases/:caseId/threads', 'an open case', MEMBERS),
  row('GET /api/cases/:caseId/threads', 'a draft', '401 ok 404 404 404 404 404 404 404'),
  row('POST /api/cases/:caseId/threads', 'an open case', MEMBERS),
  row('POST /api/threads/:id/remarks', 'a question', MEMBERS),
  row('PUT /api/threads/:id/answered', 'a question', '401 ok 403 ok 403 403 403 404 404'),
  row('PATCH /api/remarks/:id', 'a remark', '401 403 403 ok 403 403 403 404 404'),
  row('DELETE /api/remarks/:id', 'a remark', '401 403 403 ok ok ok 403 404 404'),
  row('GET /api/remarks/:id/versions', 'a remark', MEMBERS),
  row('PUT /api/cases/:caseId/read', 'an open case', MEMBERS),
];

const RATING = [
  row('GET /api/cases/:caseId/rounds', 'an open case', MEMBERS),
  row('PUT /api/cases/:caseId/rounds/:number/rating', 'an open case', RATERS),
  row('POST /api/cases/:caseId/rounds/:number/open', 'a listed case', CHAIR),
  row('POST /api/cases/:caseId/rounds/:number/close', 'an open case', CHAIR),
];

const MEETINGS = [
  row('GET /api/meetings', 'nothing', SIGNED_IN),
  row('GET /api/conferences/:conferenceId/meetings', 'the conference', MEMBERS),
  row('POST /api/conferences/:conferenceId/meetings', 'the conference', CHAIR_AND_COORDINATOR),
  row('GET /api/meetings/:id', 'a planned meeting', MEMBERS),
  row('PATCH /api/meetings/:id', 'a planned meeting', CHAIR_AND_COORDINATOR),
  row('POST /api/meetings/:id/cancel', 'a planned meeting', CHAIR_AND_COORDINATOR),
  row('GET /api/meetings/:id/listable-cases', 'a planned meeting', CHAIR_AND_COORDINATOR),
  row('PUT /api/meetings/:id/agenda', 'a planned meeting', CHAIR_AND_COORDINATOR),
  row('POST /api/meetings/:id/agenda/send', 'a planned meeting', CHAIR_AND_COORDINATOR),
  row('POST /api/meetings/:id/start', 'a planned meeting', CHAIR),
  row('POST /api/meetings/:id/close', 'a running meeting', CHAIR),
  row('PUT /api/meetings/:id/attendance/:personId', 'a running meeting', CHAIR_AND_COORDINATOR),
  row('POST /api/meetings/:id/items/:itemId/defer', 'a running meeting', CHAIR),
];

const DECISIONS = [
  row('GET /api/cases/:caseId/decisions', 'a decided case', MEMBERS),
  row('PUT /api/cases/:caseId/decision', 'a listed case', CHAIR),
  row('POST /api/cases/:caseId/decision/sign', 'a drafted decision', CHAIR),
  row('POST /api/decisions/:id/amend', 'a decided case', CHAIR),
  row('GET /api/decisions/:id', 'a decided case', MEMBERS),
  row('GET /api/decisions/:id', 'a drafted decision', '401 404 404 404 ok 404 404 404 404'),
  row('GET /api/decisions/:id/check', 'a decided case', MEMBERS),
  row('GET /api/conferences/:conferenceId/decisions', 'the conference', MEMBERS),
  row('GET /api/cases/:caseId/final-decisions', 'a decided case', MEMBERS),
  row('POST /api/cases/:caseId/final-decisions', 'a decided case', OWN_CASE),
  row('POST /api/cases/:caseId/final-decisions', 'a decided case that another surgeon treats', '401 403 ok 403 403 403 403 404 404'),
  row('GET /api/cases/:caseId/outcomes', 'a decided case', MEMBERS),
  row('POST /api/cases/:caseId/outcomes', 'a case with its final decision', OWN_CASE),
];

export const PERMISSION_TABLE: readonly PermissionRow[] = [
  ...ACCOUNT,
  ...SITE,
  ...CONFERENCES,
  ...CASES,
  ...IMAGES,
  ...DISCUSSION,
  ...RATING,
  ...MEETINGS,
  ...DECISIONS,
];
