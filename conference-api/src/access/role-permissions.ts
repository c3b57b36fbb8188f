import type { Role } from '../calc/vocabulary/people.js';
import { Permission as P } from './permission.js';

const READING = [P.ConferenceRead, P.CaseRead, P.RatingRead, P.AgendaRead, P.DecisionRead];
const PANEL = [...READING, P.RemarkWrite, P.Rate];

/** What each role may do in its conference. What hangs on being the presenter stands in `access.policy.ts`. */
export const ROLE_PERMISSIONS: Record<Role, ReadonlySet<P>> = {
  surgeon: new Set([
    ...PANEL,
    P.CaseCreate,
    P.CaseWrite,
    P.CaseWithdraw,
    P.ImageWrite,
    P.QuestionAnswer,
    P.FinalDecisionWrite,
    P.OutcomeWrite,
  ]),
  panellist: new Set(PANEL),
  chair: new Set([
    ...PANEL,
    P.RoundControl,
    P.AgendaWrite,
    P.AttendanceWrite,
    P.MeetingRun,
    P.DecisionWrite,
    P.CaseAudit,
    P.ConferenceSettings,
  ]),
  coordinator: new Set([...READING, P.RemarkWrite, P.CaseCheck, P.AgendaWrite, P.AttendanceWrite]),
  observer: new Set([...READING, P.RemarkWrite]),
};

export const ADMINISTRATOR_PERMISSIONS: ReadonlySet<P> = new Set([
  P.PeopleManage,
  P.UnitsManage,
  P.ConferencesManage,
  P.AuditRead,
  P.MailQueue,
]);

/** Held only for one's own case. */
export const OWN_CASE_ONLY: ReadonlySet<P> = new Set([
  P.CaseWrite,
  P.CaseWithdraw,
  P.ImageWrite,
  P.QuestionAnswer,
]);

/** Held only by the treating surgeon of the case. */
export const TREATING_SURGEON_ONLY: ReadonlySet<P> = new Set([P.FinalDecisionWrite, P.OutcomeWrite]);
