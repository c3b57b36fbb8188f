import type { MixedList } from 'typeorm';
import { CreateTheTableAuditEntries1796147401229 } from './migrations/1796147401229-create-the-table-audit-entries.js';
import { CreateTheTableConferences1796147401230 } from './migrations/1796147401230-create-the-table-conferences.js';
import { CreateTheTableMemberships1796147401231 } from './migrations/1796147401231-create-the-table-memberships.js';
import { CreateTheTableUnits1796147401232 } from './migrations/1796147401232-create-the-table-units.js';
import { CreateTheTablePeople1796147401233 } from './migrations/1796147401233-create-the-table-people.js';
import { CreateTheTableOneTimeTokens1796147401234 } from './migrations/1796147401234-create-the-table-one-time-tokens.js';
import { CreateTheTableSessions1796147401235 } from './migrations/1796147401235-create-the-table-sessions.js';
import { CreateTheTableRefreshTokens1796147401236 } from './migrations/1796147401236-create-the-table-refresh-tokens.js';
import { CreateTheTableSignInFailures1796147401237 } from './migrations/1796147401237-create-the-table-sign-in-failures.js';
import { CreateTheTableCases1796147401238 } from './migrations/1796147401238-create-the-table-cases.js';
import { CreateTheTableCaseVersions1796147401239 } from './migrations/1796147401239-create-the-table-case-versions.js';
import { CreateTheTableDecisions1796147401240 } from './migrations/1796147401240-create-the-table-decisions.js';
import { CreateTheTableFinalDecisions1796147401241 } from './migrations/1796147401241-create-the-table-final-decisions.js';
import { CreateTheTableCaseReadings1796147401242 } from './migrations/1796147401242-create-the-table-case-readings.js';
import { CreateTheTableThreads1796147401243 } from './migrations/1796147401243-create-the-table-threads.js';
import { CreateTheTableRemarks1796147401244 } from './migrations/1796147401244-create-the-table-remarks.js';
import { CreateTheTableMentions1796147401245 } from './migrations/1796147401245-create-the-table-mentions.js';
import { CreateTheTableRemarkVersions1796147401246 } from './migrations/1796147401246-create-the-table-remark-versions.js';
import { CreateTheTableLiveEvents1796147401247 } from './migrations/1796147401247-create-the-table-live-events.js';
import { CreateTheTableCaseImages1796147401248 } from './migrations/1796147401248-create-the-table-case-images.js';
import { CreateTheTableOutboxMails1796147401249 } from './migrations/1796147401249-create-the-table-outbox-mails.js';
import { CreateTheTableMeetings1796147401250 } from './migrations/1796147401250-create-the-table-meetings.js';
import { CreateTheTableAgendaItems1796147401251 } from './migrations/1796147401251-create-the-table-agenda-items.js';
import { CreateTheTableAttendances1796147401252 } from './migrations/1796147401252-create-the-table-attendances.js';
import { CreateTheTableOutcomes1796147401253 } from './migrations/1796147401253-create-the-table-outcomes.js';
import { CreateTheTableBallotRatings1796147401254 } from './migrations/1796147401254-create-the-table-ballot-ratings.js';
import { CreateTheTableRatingRounds1796147401255 } from './migrations/1796147401255-create-the-table-rating-rounds.js';
import { CreateTheTableBallots1796147401256 } from './migrations/1796147401256-create-the-table-ballots.js';
import { TieMembershipsToConferencesByConferenceId1796147401257 } from './migrations/1796147401257-tie-memberships-to-conferences-by-conference-id.js';
import { TieMembershipsToPeopleByPersonId1796147401258 } from './migrations/1796147401258-tie-memberships-to-people-by-person-id.js';
import { TiePeopleToUnitsByUnitId1796147401259 } from './migrations/1796147401259-tie-people-to-units-by-unit-id.js';
import { TieOneTimeTokensToPeopleByPersonId1796147401260 } from './migrations/1796147401260-tie-one-time-tokens-to-people-by-person-id.js';
import { TieSessionsToPeopleByPersonId1796147401261 } from './migrations/1796147401261-tie-sessions-to-people-by-person-id.js';
import { TieRefreshTokensToSessionsBySessionId1796147401262 } from './migrations/1796147401262-tie-refresh-tokens-to-sessions-by-session-id.js';
import { TieCasesToConferencesByConferenceId1796147401263 } from './migrations/1796147401263-tie-cases-to-conferences-by-conference-id.js';
import { TieCasesToPeopleByPresenterId1796147401264 } from './migrations/1796147401264-tie-cases-to-people-by-presenter-id.js';
import { TieCasesToPeopleByTreatingSurgeonId1796147401265 } from './migrations/1796147401265-tie-cases-to-people-by-treating-surgeon-id.js';
import { TieCaseVersionsToCasesByCaseId1796147401266 } from './migrations/1796147401266-tie-case-versions-to-cases-by-case-id.js';
import { TieCaseVersionsToPeopleByAuthorId1796147401267 } from './migrations/1796147401267-tie-case-versions-to-people-by-author-id.js';
import { TieDecisionsToConferencesByConferenceId1796147401268 } from './migrations/1796147401268-tie-decisions-to-conferences-by-conference-id.js';
import { TieDecisionsToCasesByCaseId1796147401269 } from './migrations/1796147401269-tie-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToCasesByCaseId1796147401270 } from './migrations/1796147401270-tie-final-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToPeopleByById1796147401271 } from './migrations/1796147401271-tie-final-decisions-to-people-by-by-id.js';
import { TieCaseReadingsToPeopleByPersonId1796147401272 } from './migrations/1796147401272-tie-case-readings-to-people-by-person-id.js';
import { TieCaseReadingsToCasesByCaseId1796147401273 } from './migrations/1796147401273-tie-case-readings-to-cases-by-case-id.js';
import { TieThreadsToCasesByCaseId1796147401274 } from './migrations/1796147401274-tie-threads-to-cases-by-case-id.js';
import { TieRemarksToThreadsByThreadId1796147401275 } from './migrations/1796147401275-tie-remarks-to-threads-by-thread-id.js';
import { TieRemarksToPeopleByAuthorId1796147401276 } from './migrations/1796147401276-tie-remarks-to-people-by-author-id.js';
import { TieMentionsToRemarksByRemarkId1796147401277 } from './migrations/1796147401277-tie-mentions-to-remarks-by-remark-id.js';
import { TieMentionsToPeopleByPersonId1796147401278 } from './migrations/1796147401278-tie-mentions-to-people-by-person-id.js';
import { TieRemarkVersionsToRemarksByRemarkId1796147401279 } from './migrations/1796147401279-tie-remark-versions-to-remarks-by-remark-id.js';
import { TieCaseImagesToCasesByCaseId1796147401280 } from './migrations/1796147401280-tie-case-images-to-cases-by-case-id.js';
import { TieMeetingsToConferencesByConferenceId1796147401281 } from './migrations/1796147401281-tie-meetings-to-conferences-by-conference-id.js';
import { TieAgendaItemsToMeetingsByMeetingId1796147401282 } from './migrations/1796147401282-tie-agenda-items-to-meetings-by-meeting-id.js';
import { TieAgendaItemsToCasesByCaseId1796147401283 } from './migrations/1796147401283-tie-agenda-items-to-cases-by-case-id.js';
import { TieAttendancesToMeetingsByMeetingId1796147401284 } from './migrations/1796147401284-tie-attendances-to-meetings-by-meeting-id.js';
import { TieAttendancesToPeopleByPersonId1796147401285 } from './migrations/1796147401285-tie-attendances-to-people-by-person-id.js';
import { TieOutcomesToCasesByCaseId1796147401286 } from './migrations/1796147401286-tie-outcomes-to-cases-by-case-id.js';
import { TieOutcomesToPeopleByById1796147401287 } from './migrations/1796147401287-tie-outcomes-to-people-by-by-id.js';
import { TieBallotRatingsToBallotsByBallotId1796147401288 } from './migrations/1796147401288-tie-ballot-ratings-to-ballots-by-ballot-id.js';
import { TieRatingRoundsToCasesByCaseId1796147401289 } from './migrations/1796147401289-tie-rating-rounds-to-cases-by-case-id.js';
import { TieBallotsToRatingRoundsByRoundId1796147401290 } from './migrations/1796147401290-tie-ballots-to-rating-rounds-by-round-id.js';
import { TieBallotsToPeopleByPersonId1796147401291 } from './migrations/1796147401291-tie-ballots-to-people-by-person-id.js';
import { RefuseChangesOfSignedDecisions1796500000001 } from './migrations/1796500000001-refuse-changes-of-signed-decisions.js';
import { RefuseDeletingSignedDecisions1796500000002 } from './migrations/1796500000002-refuse-deleting-signed-decisions.js';

// Written by `npm run migrations:generate`: every migration, in the order they run.
export const MIGRATIONS: MixedList<Function> = [
  CreateTheTableAuditEntries1796147401229,
  CreateTheTableConferences1796147401230,
  CreateTheTableMemberships1796147401231,
  CreateTheTableUnits1796147401232,
  CreateTheTablePeople1796147401233,
  CreateTheTableOneTimeTokens1796147401234,
  CreateTheTableSessions1796147401235,
  CreateTheTableRefreshTokens1796147401236,
  CreateTheTableSignInFailures1796147401237,
  CreateTheTableCases1796147401238,
  CreateTheTableCaseVersions1796147401239,
  CreateTheTableDecisions1796147401240,
  CreateTheTableFinalDecisions1796147401241,
  CreateTheTableCaseReadings1796147401242,
  CreateTheTableThreads1796147401243,
  CreateTheTableRemarks1796147401244,
  CreateTheTableMentions1796147401245,
  CreateTheTableRemarkVersions1796147401246,
  CreateTheTableLiveEvents1796147401247,
  CreateTheTableCaseImages1796147401248,
  CreateTheTableOutboxMails1796147401249,
  CreateTheTableMeetings1796147401250,
  CreateTheTableAgendaItems1796147401251,
  CreateTheTableAttendances1796147401252,
  CreateTheTableOutcomes1796147401253,
  CreateTheTableBallotRatings1796147401254,
  CreateTheTableRatingRounds1796147401255,
  CreateTheTableBallots1796147401256,
  TieMembershipsToConferencesByConferenceId1796147401257,
  TieMembershipsToPeopleByPersonId1796147401258,
  TiePeopleToUnitsByUnitId1796147401259,
  TieOneTimeTokensToPeopleByPersonId1796147401260,
  TieSessionsToPeopleByPersonId1796147401261,
  TieRefreshTokensToSessionsBySessionId1796147401262,
  TieCasesToConferencesByConferenceId1796147401263,
  TieCasesToPeopleByPresenterId1796147401264,
  TieCasesToPeopleByTreatingSurgeonId1796147401265,
  TieCaseVersionsToCasesByCaseId1796147401266,
  TieCaseVersionsToPeopleByAuthorId1796147401267,
  TieDecisionsToConferencesByConferenceId1796147401268,
  TieDecisionsToCasesByCaseId1796147401269,
  TieFinalDecisionsToCasesByCaseId1796147401270,
  TieFinalDecisionsToPeopleByById1796147401271,
  TieCaseReadingsToPeopleByPersonId1796147401272,
  TieCaseReadingsToCasesByCaseId1796147401273,
  TieThreadsToCasesByCaseId1796147401274,
  TieRemarksToThreadsByThreadId1796147401275,
  TieRemarksToPeopleByAuthorId1796147401276,
  TieMentionsToRemarksByRemarkId1796147401277,
  TieMentionsToPeopleByPersonId1796147401278,
  TieRemarkVersionsToRemarksByRemarkId1796147401279,
  TieCaseImagesToCasesByCaseId1796147401280,
  TieMeetingsToConferencesByConferenceId1796147401281,
  TieAgendaItemsToMeetingsByMeetingId1796147401282,
  TieAgendaItemsToCasesByCaseId1796147401283,
  TieAttendancesToMeetingsByMeetingId1796147401284,
  TieAttendancesToPeopleByPersonId1796147401285,
  TieOutcomesToCasesByCaseId1796147401286,
  TieOutcomesToPeopleByById1796147401287,
  TieBallotRatingsToBallotsByBallotId1796147401288,
  TieRatingRoundsToCasesByCaseId1796147401289,
  TieBallotsToRatingRoundsByRoundId1796147401290,
  TieBallotsToPeopleByPersonId1796147401291,
  RefuseChangesOfSignedDecisions1796500000001,
  RefuseDeletingSignedDecisions1796500000002,
];
