import type { MixedList } from 'typeorm';
import { CreateTheTableAuditEntries1796149650212 } from './migrations/1796149650212-create-the-table-audit-entries.js';
import { CreateTheTableConferences1796149650213 } from './migrations/1796149650213-create-the-table-conferences.js';
import { CreateTheTableMemberships1796149650214 } from './migrations/1796149650214-create-the-table-memberships.js';
import { CreateTheTableUnits1796149650215 } from './migrations/1796149650215-create-the-table-units.js';
import { CreateTheTablePeople1796149650216 } from './migrations/1796149650216-create-the-table-people.js';
import { CreateTheTableOneTimeTokens1796149650217 } from './migrations/1796149650217-create-the-table-one-time-tokens.js';
import { CreateTheTableSessions1796149650218 } from './migrations/1796149650218-create-the-table-sessions.js';
import { CreateTheTableRefreshTokens1796149650219 } from './migrations/1796149650219-create-the-table-refresh-tokens.js';
import { CreateTheTableSignInFailures1796149650220 } from './migrations/1796149650220-create-the-table-sign-in-failures.js';
import { CreateTheTableCases1796149650221 } from './migrations/1796149650221-create-the-table-cases.js';
import { CreateTheTableCaseVersions1796149650222 } from './migrations/1796149650222-create-the-table-case-versions.js';
import { CreateTheTableDecisions1796149650223 } from './migrations/1796149650223-create-the-table-decisions.js';
import { CreateTheTableFinalDecisions1796149650224 } from './migrations/1796149650224-create-the-table-final-decisions.js';
import { CreateTheTableCaseReadings1796149650225 } from './migrations/1796149650225-create-the-table-case-readings.js';
import { CreateTheTableThreads1796149650226 } from './migrations/1796149650226-create-the-table-threads.js';
import { CreateTheTableRemarks1796149650227 } from './migrations/1796149650227-create-the-table-remarks.js';
import { CreateTheTableMentions1796149650228 } from './migrations/1796149650228-create-the-table-mentions.js';
import { CreateTheTableRemarkVersions1796149650229 } from './migrations/1796149650229-create-the-table-remark-versions.js';
import { CreateTheTableLiveEvents1796149650230 } from './migrations/1796149650230-create-the-table-live-events.js';
import { CreateTheTableCaseImages1796149650231 } from './migrations/1796149650231-create-the-table-case-images.js';
import { CreateTheTableOutboxMails1796149650232 } from './migrations/1796149650232-create-the-table-outbox-mails.js';
import { CreateTheTableMeetings1796149650233 } from './migrations/1796149650233-create-the-table-meetings.js';
import { CreateTheTableAgendaItems1796149650234 } from './migrations/1796149650234-create-the-table-agenda-items.js';
import { CreateTheTableAttendances1796149650235 } from './migrations/1796149650235-create-the-table-attendances.js';
import { CreateTheTableOutcomes1796149650236 } from './migrations/1796149650236-create-the-table-outcomes.js';
import { CreateTheTableBallotRatings1796149650237 } from './migrations/1796149650237-create-the-table-ballot-ratings.js';
import { CreateTheTableRatingRounds1796149650238 } from './migrations/1796149650238-create-the-table-rating-rounds.js';
import { CreateTheTableBallots1796149650239 } from './migrations/1796149650239-create-the-table-ballots.js';
import { TieMembershipsToConferencesByConferenceId1796149650240 } from './migrations/1796149650240-tie-memberships-to-conferences-by-conference-id.js';
import { TieMembershipsToPeopleByPersonId1796149650241 } from './migrations/1796149650241-tie-memberships-to-people-by-person-id.js';
import { TiePeopleToUnitsByUnitId1796149650242 } from './migrations/1796149650242-tie-people-to-units-by-unit-id.js';
import { TieOneTimeTokensToPeopleByPersonId1796149650243 } from './migrations/1796149650243-tie-one-time-tokens-to-people-by-person-id.js';
import { TieSessionsToPeopleByPersonId1796149650244 } from './migrations/1796149650244-tie-sessions-to-people-by-person-id.js';
import { TieRefreshTokensToSessionsBySessionId1796149650245 } from './migrations/1796149650245-tie-refresh-tokens-to-sessions-by-session-id.js';
import { TieCasesToConferencesByConferenceId1796149650246 } from './migrations/1796149650246-tie-cases-to-conferences-by-conference-id.js';
import { TieCasesToPeopleByPresenterId1796149650247 } from './migrations/1796149650247-tie-cases-to-people-by-presenter-id.js';
import { TieCasesToPeopleByTreatingSurgeonId1796149650248 } from './migrations/1796149650248-tie-cases-to-people-by-treating-surgeon-id.js';
import { TieCaseVersionsToCasesByCaseId1796149650249 } from './migrations/1796149650249-tie-case-versions-to-cases-by-case-id.js';
import { TieCaseVersionsToPeopleByAuthorId1796149650250 } from './migrations/1796149650250-tie-case-versions-to-people-by-author-id.js';
import { TieDecisionsToConferencesByConferenceId1796149650251 } from './migrations/1796149650251-tie-decisions-to-conferences-by-conference-id.js';
import { TieDecisionsToCasesByCaseId1796149650252 } from './migrations/1796149650252-tie-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToCasesByCaseId1796149650253 } from './migrations/1796149650253-tie-final-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToPeopleByById1796149650254 } from './migrations/1796149650254-tie-final-decisions-to-people-by-by-id.js';
import { TieCaseReadingsToPeopleByPersonId1796149650255 } from './migrations/1796149650255-tie-case-readings-to-people-by-person-id.js';
import { TieCaseReadingsToCasesByCaseId1796149650256 } from './migrations/1796149650256-tie-case-readings-to-cases-by-case-id.js';
import { TieThreadsToCasesByCaseId1796149650257 } from './migrations/1796149650257-tie-threads-to-cases-by-case-id.js';
import { TieRemarksToThreadsByThreadId1796149650258 } from './migrations/1796149650258-tie-remarks-to-threads-by-thread-id.js';
import { TieRemarksToPeopleByAuthorId1796149650259 } from './migrations/1796149650259-tie-remarks-to-people-by-author-id.js';
import { TieMentionsToRemarksByRemarkId1796149650260 } from './migrations/1796149650260-tie-mentions-to-remarks-by-remark-id.js';
import { TieMentionsToPeopleByPersonId1796149650261 } from './migrations/1796149650261-tie-mentions-to-people-by-person-id.js';
import { TieRemarkVersionsToRemarksByRemarkId1796149650262 } from './migrations/1796149650262-tie-remark-versions-to-remarks-by-remark-id.js';
import { TieCaseImagesToCasesByCaseId1796149650263 } from './migrations/1796149650263-tie-case-images-to-cases-by-case-id.js';
import { TieMeetingsToConferencesByConferenceId1796149650264 } from './migrations/1796149650264-tie-meetings-to-conferences-by-conference-id.js';
import { TieAgendaItemsToMeetingsByMeetingId1796149650265 } from './migrations/1796149650265-tie-agenda-items-to-meetings-by-meeting-id.js';
import { TieAgendaItemsToCasesByCaseId1796149650266 } from './migrations/1796149650266-tie-agenda-items-to-cases-by-case-id.js';
import { TieAttendancesToMeetingsByMeetingId1796149650267 } from './migrations/1796149650267-tie-attendances-to-meetings-by-meeting-id.js';
import { TieAttendancesToPeopleByPersonId1796149650268 } from './migrations/1796149650268-tie-attendances-to-people-by-person-id.js';
import { TieOutcomesToCasesByCaseId1796149650269 } from './migrations/1796149650269-tie-outcomes-to-cases-by-case-id.js';
import { TieOutcomesToPeopleByById1796149650270 } from './migrations/1796149650270-tie-outcomes-to-people-by-by-id.js';
import { TieBallotRatingsToBallotsByBallotId1796149650271 } from './migrations/1796149650271-tie-ballot-ratings-to-ballots-by-ballot-id.js';
import { TieRatingRoundsToCasesByCaseId1796149650272 } from './migrations/1796149650272-tie-rating-rounds-to-cases-by-case-id.js';
import { TieBallotsToRatingRoundsByRoundId1796149650273 } from './migrations/1796149650273-tie-ballots-to-rating-rounds-by-round-id.js';
import { TieBallotsToPeopleByPersonId1796149650274 } from './migrations/1796149650274-tie-ballots-to-people-by-person-id.js';
import { RefuseChangesOfSignedDecisions1796500000001 } from './migrations/1796500000001-refuse-changes-of-signed-decisions.js';
import { RefuseDeletingSignedDecisions1796500000002 } from './migrations/1796500000002-refuse-deleting-signed-decisions.js';

// Written by `npm run migrations:generate`: every migration, in the order they run.
export const MIGRATIONS: MixedList<Function> = [
  CreateTheTableAuditEntries1796149650212,
  CreateTheTableConferences1796149650213,
  CreateTheTableMemberships1796149650214,
  CreateTheTableUnits1796149650215,
  CreateTheTablePeople1796149650216,
  CreateTheTableOneTimeTokens1796149650217,
  CreateTheTableSessions1796149650218,
  CreateTheTableRefreshTokens1796149650219,
  CreateTheTableSignInFailures1796149650220,
  CreateTheTableCases1796149650221,
  CreateTheTableCaseVersions1796149650222,
  CreateTheTableDecisions1796149650223,
  CreateTheTableFinalDecisions1796149650224,
  CreateTheTableCaseReadings1796149650225,
  CreateTheTableThreads1796149650226,
  CreateTheTableRemarks1796149650227,
  CreateTheTableMentions1796149650228,
  CreateTheTableRemarkVersions1796149650229,
  CreateTheTableLiveEvents1796149650230,
  CreateTheTableCaseImages1796149650231,
  CreateTheTableOutboxMails1796149650232,
  CreateTheTableMeetings1796149650233,
  CreateTheTableAgendaItems1796149650234,
  CreateTheTableAttendances1796149650235,
  CreateTheTableOutcomes1796149650236,
  CreateTheTableBallotRatings1796149650237,
  CreateTheTableRatingRounds1796149650238,
  CreateTheTableBallots1796149650239,
  TieMembershipsToConferencesByConferenceId1796149650240,
  TieMembershipsToPeopleByPersonId1796149650241,
  TiePeopleToUnitsByUnitId1796149650242,
  TieOneTimeTokensToPeopleByPersonId1796149650243,
  TieSessionsToPeopleByPersonId1796149650244,
  TieRefreshTokensToSessionsBySessionId1796149650245,
  TieCasesToConferencesByConferenceId1796149650246,
  TieCasesToPeopleByPresenterId1796149650247,
  TieCasesToPeopleByTreatingSurgeonId1796149650248,
  TieCaseVersionsToCasesByCaseId1796149650249,
  TieCaseVersionsToPeopleByAuthorId1796149650250,
  TieDecisionsToConferencesByConferenceId1796149650251,
  TieDecisionsToCasesByCaseId1796149650252,
  TieFinalDecisionsToCasesByCaseId1796149650253,
  TieFinalDecisionsToPeopleByById1796149650254,
  TieCaseReadingsToPeopleByPersonId1796149650255,
  TieCaseReadingsToCasesByCaseId1796149650256,
  TieThreadsToCasesByCaseId1796149650257,
  TieRemarksToThreadsByThreadId1796149650258,
  TieRemarksToPeopleByAuthorId1796149650259,
  TieMentionsToRemarksByRemarkId1796149650260,
  TieMentionsToPeopleByPersonId1796149650261,
  TieRemarkVersionsToRemarksByRemarkId1796149650262,
  TieCaseImagesToCasesByCaseId1796149650263,
  TieMeetingsToConferencesByConferenceId1796149650264,
  TieAgendaItemsToMeetingsByMeetingId1796149650265,
  TieAgendaItemsToCasesByCaseId1796149650266,
  TieAttendancesToMeetingsByMeetingId1796149650267,
  TieAttendancesToPeopleByPersonId1796149650268,
  TieOutcomesToCasesByCaseId1796149650269,
  TieOutcomesToPeopleByById1796149650270,
  TieBallotRatingsToBallotsByBallotId1796149650271,
  TieRatingRoundsToCasesByCaseId1796149650272,
  TieBallotsToRatingRoundsByRoundId1796149650273,
  TieBallotsToPeopleByPersonId1796149650274,
  RefuseChangesOfSignedDecisions1796500000001,
  RefuseDeletingSignedDecisions1796500000002,
];
