import type { MixedList } from 'typeorm';
import { CreateTheTableAuditEntries1796147500742 } from './migrations/1796147500742-create-the-table-audit-entries.js';
import { CreateTheTableConferences1796147500743 } from './migrations/1796147500743-create-the-table-conferences.js';
import { CreateTheTableMemberships1796147500744 } from './migrations/1796147500744-create-the-table-memberships.js';
import { CreateTheTableUnits1796147500745 } from './migrations/1796147500745-create-the-table-units.js';
import { CreateTheTablePeople1796147500746 } from './migrations/1796147500746-create-the-table-people.js';
import { CreateTheTableOneTimeTokens1796147500747 } from './migrations/1796147500747-create-the-table-one-time-tokens.js';
import { CreateTheTableSessions1796147500748 } from './migrations/1796147500748-create-the-table-sessions.js';
import { CreateTheTableRefreshTokens1796147500749 } from './migrations/1796147500749-create-the-table-refresh-tokens.js';
import { CreateTheTableSignInFailures1796147500750 } from './migrations/1796147500750-create-the-table-sign-in-failures.js';
import { CreateTheTableCases1796147500751 } from './migrations/1796147500751-create-the-table-cases.js';
import { CreateTheTableCaseVersions1796147500752 } from './migrations/1796147500752-create-the-table-case-versions.js';
import { CreateTheTableDecisions1796147500753 } from './migrations/1796147500753-create-the-table-decisions.js';
import { CreateTheTableFinalDecisions1796147500754 } from './migrations/1796147500754-create-the-table-final-decisions.js';
import { CreateTheTableCaseReadings1796147500755 } from './migrations/1796147500755-create-the-table-case-readings.js';
import { CreateTheTableThreads1796147500756 } from './migrations/1796147500756-create-the-table-threads.js';
import { CreateTheTableRemarks1796147500757 } from './migrations/1796147500757-create-the-table-remarks.js';
import { CreateTheTableMentions1796147500758 } from './migrations/1796147500758-create-the-table-mentions.js';
import { CreateTheTableRemarkVersions1796147500759 } from './migrations/1796147500759-create-the-table-remark-versions.js';
import { CreateTheTableLiveEvents1796147500760 } from './migrations/1796147500760-create-the-table-live-events.js';
import { CreateTheTableCaseImages1796147500761 } from './migrations/1796147500761-create-the-table-case-images.js';
import { CreateTheTableOutboxMails1796147500762 } from './migrations/1796147500762-create-the-table-outbox-mails.js';
import { CreateTheTableMeetings1796147500763 } from './migrations/1796147500763-create-the-table-meetings.js';
import { CreateTheTableAgendaItems1796147500764 } from './migrations/1796147500764-create-the-table-agenda-items.js';
import { CreateTheTableAttendances1796147500765 } from './migrations/1796147500765-create-the-table-attendances.js';
import { CreateTheTableOutcomes1796147500766 } from './migrations/1796147500766-create-the-table-outcomes.js';
import { CreateTheTableBallotRatings1796147500767 } from './migrations/1796147500767-create-the-table-ballot-ratings.js';
import { CreateTheTableRatingRounds1796147500768 } from './migrations/1796147500768-create-the-table-rating-rounds.js';
import { CreateTheTableBallots1796147500769 } from './migrations/1796147500769-create-the-table-ballots.js';
import { TieMembershipsToConferencesByConferenceId1796147500770 } from './migrations/1796147500770-tie-memberships-to-conferences-by-conference-id.js';
import { TieMembershipsToPeopleByPersonId1796147500771 } from './migrations/1796147500771-tie-memberships-to-people-by-person-id.js';
import { TiePeopleToUnitsByUnitId1796147500772 } from './migrations/1796147500772-tie-people-to-units-by-unit-id.js';
import { TieOneTimeTokensToPeopleByPersonId1796147500773 } from './migrations/1796147500773-tie-one-time-tokens-to-people-by-person-id.js';
import { TieSessionsToPeopleByPersonId1796147500774 } from './migrations/1796147500774-tie-sessions-to-people-by-person-id.js';
import { TieRefreshTokensToSessionsBySessionId1796147500775 } from './migrations/1796147500775-tie-refresh-tokens-to-sessions-by-session-id.js';
import { TieCasesToConferencesByConferenceId1796147500776 } from './migrations/1796147500776-tie-cases-to-conferences-by-conference-id.js';
import { TieCasesToPeopleByPresenterId1796147500777 } from './migrations/1796147500777-tie-cases-to-people-by-presenter-id.js';
import { TieCasesToPeopleByTreatingSurgeonId1796147500778 } from './migrations/1796147500778-tie-cases-to-people-by-treating-surgeon-id.js';
import { TieCaseVersionsToCasesByCaseId1796147500779 } from './migrations/1796147500779-tie-case-versions-to-cases-by-case-id.js';
import { TieCaseVersionsToPeopleByAuthorId1796147500780 } from './migrations/1796147500780-tie-case-versions-to-people-by-author-id.js';
import { TieDecisionsToConferencesByConferenceId1796147500781 } from './migrations/1796147500781-tie-decisions-to-conferences-by-conference-id.js';
import { TieDecisionsToCasesByCaseId1796147500782 } from './migrations/1796147500782-tie-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToCasesByCaseId1796147500783 } from './migrations/1796147500783-tie-final-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToPeopleByById1796147500784 } from './migrations/1796147500784-tie-final-decisions-to-people-by-by-id.js';
import { TieCaseReadingsToPeopleByPersonId1796147500785 } from './migrations/1796147500785-tie-case-readings-to-people-by-person-id.js';
import { TieCaseReadingsToCasesByCaseId1796147500786 } from './migrations/1796147500786-tie-case-readings-to-cases-by-case-id.js';
import { TieThreadsToCasesByCaseId1796147500787 } from './migrations/1796147500787-tie-threads-to-cases-by-case-id.js';
import { TieRemarksToThreadsByThreadId1796147500788 } from './migrations/1796147500788-tie-remarks-to-threads-by-thread-id.js';
import { TieRemarksToPeopleByAuthorId1796147500789 } from './migrations/1796147500789-tie-remarks-to-people-by-author-id.js';
import { TieMentionsToRemarksByRemarkId1796147500790 } from './migrations/1796147500790-tie-mentions-to-remarks-by-remark-id.js';
import { TieMentionsToPeopleByPersonId1796147500791 } from './migrations/1796147500791-tie-mentions-to-people-by-person-id.js';
import { TieRemarkVersionsToRemarksByRemarkId1796147500792 } from './migrations/1796147500792-tie-remark-versions-to-remarks-by-remark-id.js';
import { TieCaseImagesToCasesByCaseId1796147500793 } from './migrations/1796147500793-tie-case-images-to-cases-by-case-id.js';
import { TieMeetingsToConferencesByConferenceId1796147500794 } from './migrations/1796147500794-tie-meetings-to-conferences-by-conference-id.js';
import { TieAgendaItemsToMeetingsByMeetingId1796147500795 } from './migrations/1796147500795-tie-agenda-items-to-meetings-by-meeting-id.js';
import { TieAgendaItemsToCasesByCaseId1796147500796 } from './migrations/1796147500796-tie-agenda-items-to-cases-by-case-id.js';
import { TieAttendancesToMeetingsByMeetingId1796147500797 } from './migrations/1796147500797-tie-attendances-to-meetings-by-meeting-id.js';
import { TieAttendancesToPeopleByPersonId1796147500798 } from './migrations/1796147500798-tie-attendances-to-people-by-person-id.js';
import { TieOutcomesToCasesByCaseId1796147500799 } from './migrations/1796147500799-tie-outcomes-to-cases-by-case-id.js';
import { TieOutcomesToPeopleByById1796147500800 } from './migrations/1796147500800-tie-outcomes-to-people-by-by-id.js';
import { TieBallotRatingsToBallotsByBallotId1796147500801 } from './migrations/1796147500801-tie-ballot-ratings-to-ballots-by-ballot-id.js';
import { TieRatingRoundsToCasesByCaseId1796147500802 } from './migrations/1796147500802-tie-rating-rounds-to-cases-by-case-id.js';
import { TieBallotsToRatingRoundsByRoundId1796147500803 } from './migrations/1796147500803-tie-ballots-to-rating-rounds-by-round-id.js';
import { TieBallotsToPeopleByPersonId1796147500804 } from './migrations/1796147500804-tie-ballots-to-people-by-person-id.js';
import { RefuseChangesOfSignedDecisions1796500000001 } from './migrations/1796500000001-refuse-changes-of-signed-decisions.js';
import { RefuseDeletingSignedDecisions1796500000002 } from './migrations/1796500000002-refuse-deleting-signed-decisions.js';

// Written by `npm run migrations:generate`: every migration, in the order they run.
export const MIGRATIONS: MixedList<Function> = [
  CreateTheTableAuditEntries1796147500742,
  CreateTheTableConferences1796147500743,
  CreateTheTableMemberships1796147500744,
  CreateTheTableUnits1796147500745,
  CreateTheTablePeople1796147500746,
  CreateTheTableOneTimeTokens1796147500747,
  CreateTheTableSessions1796147500748,
  CreateTheTableRefreshTokens1796147500749,
  CreateTheTableSignInFailures1796147500750,
  CreateTheTableCases1796147500751,
  CreateTheTableCaseVersions1796147500752,
  CreateTheTableDecisions1796147500753,
  CreateTheTableFinalDecisions1796147500754,
  CreateTheTableCaseReadings1796147500755,
  CreateTheTableThreads1796147500756,
  CreateTheTableRemarks1796147500757,
  CreateTheTableMentions1796147500758,
  CreateTheTableRemarkVersions1796147500759,
  CreateTheTableLiveEvents1796147500760,
  CreateTheTableCaseImages1796147500761,
  CreateTheTableOutboxMails1796147500762,
  CreateTheTableMeetings1796147500763,
  CreateTheTableAgendaItems1796147500764,
  CreateTheTableAttendances1796147500765,
  CreateTheTableOutcomes1796147500766,
  CreateTheTableBallotRatings1796147500767,
  CreateTheTableRatingRounds1796147500768,
  CreateTheTableBallots1796147500769,
  TieMembershipsToConferencesByConferenceId1796147500770,
  TieMembershipsToPeopleByPersonId1796147500771,
  TiePeopleToUnitsByUnitId1796147500772,
  TieOneTimeTokensToPeopleByPersonId1796147500773,
  TieSessionsToPeopleByPersonId1796147500774,
  TieRefreshTokensToSessionsBySessionId1796147500775,
  TieCasesToConferencesByConferenceId1796147500776,
  TieCasesToPeopleByPresenterId1796147500777,
  TieCasesToPeopleByTreatingSurgeonId1796147500778,
  TieCaseVersionsToCasesByCaseId1796147500779,
  TieCaseVersionsToPeopleByAuthorId1796147500780,
  TieDecisionsToConferencesByConferenceId1796147500781,
  TieDecisionsToCasesByCaseId1796147500782,
  TieFinalDecisionsToCasesByCaseId1796147500783,
  TieFinalDecisionsToPeopleByById1796147500784,
  TieCaseReadingsToPeopleByPersonId1796147500785,
  TieCaseReadingsToCasesByCaseId1796147500786,
  TieThreadsToCasesByCaseId1796147500787,
  TieRemarksToThreadsByThreadId1796147500788,
  TieRemarksToPeopleByAuthorId1796147500789,
  TieMentionsToRemarksByRemarkId1796147500790,
  TieMentionsToPeopleByPersonId1796147500791,
  TieRemarkVersionsToRemarksByRemarkId1796147500792,
  TieCaseImagesToCasesByCaseId1796147500793,
  TieMeetingsToConferencesByConferenceId1796147500794,
  TieAgendaItemsToMeetingsByMeetingId1796147500795,
  TieAgendaItemsToCasesByCaseId1796147500796,
  TieAttendancesToMeetingsByMeetingId1796147500797,
  TieAttendancesToPeopleByPersonId1796147500798,
  TieOutcomesToCasesByCaseId1796147500799,
  TieOutcomesToPeopleByById1796147500800,
  TieBallotRatingsToBallotsByBallotId1796147500801,
  TieRatingRoundsToCasesByCaseId1796147500802,
  TieBallotsToRatingRoundsByRoundId1796147500803,
  TieBallotsToPeopleByPersonId1796147500804,
  RefuseChangesOfSignedDecisions1796500000001,
  RefuseDeletingSignedDecisions1796500000002,
];
