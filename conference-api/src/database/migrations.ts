import type { MixedList } from 'typeorm';
import { CreateTheTableAuditEntries1796146450932 } from './migrations/1796146450932-create-the-table-audit-entries.js';
import { CreateTheTableConferences1796146450933 } from './migrations/1796146450933-create-the-table-conferences.js';
import { CreateTheTableMemberships1796146450934 } from './migrations/1796146450934-create-the-table-memberships.js';
import { CreateTheTableUnits1796146450935 } from './migrations/1796146450935-create-the-table-units.js';
import { CreateTheTablePeople1796146450936 } from './migrations/1796146450936-create-the-table-people.js';
import { CreateTheTableOneTimeTokens1796146450937 } from './migrations/1796146450937-create-the-table-one-time-tokens.js';
import { CreateTheTableSessions1796146450938 } from './migrations/1796146450938-create-the-table-sessions.js';
import { CreateTheTableRefreshTokens1796146450939 } from './migrations/1796146450939-create-the-table-refresh-tokens.js';
import { CreateTheTableSignInFailures1796146450940 } from './migrations/1796146450940-create-the-table-sign-in-failures.js';
import { CreateTheTableCases1796146450941 } from './migrations/1796146450941-create-the-table-cases.js';
import { CreateTheTableCaseVersions1796146450942 } from './migrations/1796146450942-create-the-table-case-versions.js';
import { CreateTheTableDecisions1796146450943 } from './migrations/1796146450943-create-the-table-decisions.js';
import { CreateTheTableFinalDecisions1796146450944 } from './migrations/1796146450944-create-the-table-final-decisions.js';
import { CreateTheTableCaseReadings1796146450945 } from './migrations/1796146450945-create-the-table-case-readings.js';
import { CreateTheTableThreads1796146450946 } from './migrations/1796146450946-create-the-table-threads.js';
import { CreateTheTableRemarks1796146450947 } from './migrations/1796146450947-create-the-table-remarks.js';
import { CreateTheTableMentions1796146450948 } from './migrations/1796146450948-create-the-table-mentions.js';
import { CreateTheTableRemarkVersions1796146450949 } from './migrations/1796146450949-create-the-table-remark-versions.js';
import { CreateTheTableLiveEvents1796146450950 } from './migrations/1796146450950-create-the-table-live-events.js';
import { CreateTheTableCaseImages1796146450951 } from './migrations/1796146450951-create-the-table-case-images.js';
import { CreateTheTableOutboxMails1796146450952 } from './migrations/1796146450952-create-the-table-outbox-mails.js';
import { CreateTheTableMeetings1796146450953 } from './migrations/1796146450953-create-the-table-meetings.js';
import { CreateTheTableAgendaItems1796146450954 } from './migrations/1796146450954-create-the-table-agenda-items.js';
import { CreateTheTableAttendances1796146450955 } from './migrations/1796146450955-create-the-table-attendances.js';
import { CreateTheTableOutcomes1796146450956 } from './migrations/1796146450956-create-the-table-outcomes.js';
import { CreateTheTableBallotRatings1796146450957 } from './migrations/1796146450957-create-the-table-ballot-ratings.js';
import { CreateTheTableRatingRounds1796146450958 } from './migrations/1796146450958-create-the-table-rating-rounds.js';
import { CreateTheTableBallots1796146450959 } from './migrations/1796146450959-create-the-table-ballots.js';
import { TieMembershipsToConferencesByConferenceId1796146450960 } from './migrations/1796146450960-tie-memberships-to-conferences-by-conference-id.js';
import { TieMembershipsToPeopleByPersonId1796146450961 } from './migrations/1796146450961-tie-memberships-to-people-by-person-id.js';
import { TiePeopleToUnitsByUnitId1796146450962 } from './migrations/1796146450962-tie-people-to-units-by-unit-id.js';
import { TieOneTimeTokensToPeopleByPersonId1796146450963 } from './migrations/1796146450963-tie-one-time-tokens-to-people-by-person-id.js';
import { TieSessionsToPeopleByPersonId1796146450964 } from './migrations/1796146450964-tie-sessions-to-people-by-person-id.js';
import { TieRefreshTokensToSessionsBySessionId1796146450965 } from './migrations/1796146450965-tie-refresh-tokens-to-sessions-by-session-id.js';
import { TieCasesToConferencesByConferenceId1796146450966 } from './migrations/1796146450966-tie-cases-to-conferences-by-conference-id.js';
import { TieCasesToPeopleByPresenterId1796146450967 } from './migrations/1796146450967-tie-cases-to-people-by-presenter-id.js';
import { TieCasesToPeopleByTreatingSurgeonId1796146450968 } from './migrations/1796146450968-tie-cases-to-people-by-treating-surgeon-id.js';
import { TieCaseVersionsToCasesByCaseId1796146450969 } from './migrations/1796146450969-tie-case-versions-to-cases-by-case-id.js';
import { TieCaseVersionsToPeopleByAuthorId1796146450970 } from './migrations/1796146450970-tie-case-versions-to-people-by-author-id.js';
import { TieDecisionsToConferencesByConferenceId1796146450971 } from './migrations/1796146450971-tie-decisions-to-conferences-by-conference-id.js';
import { TieDecisionsToCasesByCaseId1796146450972 } from './migrations/1796146450972-tie-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToCasesByCaseId1796146450973 } from './migrations/1796146450973-tie-final-decisions-to-cases-by-case-id.js';
import { TieFinalDecisionsToPeopleByById1796146450974 } from './migrations/1796146450974-tie-final-decisions-to-people-by-by-id.js';
import { TieCaseReadingsToPeopleByPersonId1796146450975 } from './migrations/1796146450975-tie-case-readings-to-people-by-person-id.js';
import { TieCaseReadingsToCasesByCaseId1796146450976 } from './migrations/1796146450976-tie-case-readings-to-cases-by-case-id.js';
import { TieThreadsToCasesByCaseId1796146450977 } from './migrations/1796146450977-tie-threads-to-cases-by-case-id.js';
import { TieRemarksToThreadsByThreadId1796146450978 } from './migrations/1796146450978-tie-remarks-to-threads-by-thread-id.js';
import { TieRemarksToPeopleByAuthorId1796146450979 } from './migrations/1796146450979-tie-remarks-to-people-by-author-id.js';
import { TieMentionsToRemarksByRemarkId1796146450980 } from './migrations/1796146450980-tie-mentions-to-remarks-by-remark-id.js';
import { TieMentionsToPeopleByPersonId1796146450981 } from './migrations/1796146450981-tie-mentions-to-people-by-person-id.js';
import { TieRemarkVersionsToRemarksByRemarkId1796146450982 } from './migrations/1796146450982-tie-remark-versions-to-remarks-by-remark-id.js';
import { TieCaseImagesToCasesByCaseId1796146450983 } from './migrations/1796146450983-tie-case-images-to-cases-by-case-id.js';
import { TieMeetingsToConferencesByConferenceId1796146450984 } from './migrations/1796146450984-tie-meetings-to-conferences-by-conference-id.js';
import { TieAgendaItemsToMeetingsByMeetingId1796146450985 } from './migrations/1796146450985-tie-agenda-items-to-meetings-by-meeting-id.js';
import { TieAgendaItemsToCasesByCaseId1796146450986 } from './migrations/1796146450986-tie-agenda-items-to-cases-by-case-id.js';
import { TieAttendancesToMeetingsByMeetingId1796146450987 } from './migrations/1796146450987-tie-attendances-to-meetings-by-meeting-id.js';
import { TieAttendancesToPeopleByPersonId1796146450988 } from './migrations/1796146450988-tie-attendances-to-people-by-person-id.js';
import { TieOutcomesToCasesByCaseId1796146450989 } from './migrations/1796146450989-tie-outcomes-to-cases-by-case-id.js';
import { TieOutcomesToPeopleByById1796146450990 } from './migrations/1796146450990-tie-outcomes-to-people-by-by-id.js';
import { TieBallotRatingsToBallotsByBallotId1796146450991 } from './migrations/1796146450991-tie-ballot-ratings-to-ballots-by-ballot-id.js';
import { TieRatingRoundsToCasesByCaseId1796146450992 } from './migrations/1796146450992-tie-rating-rounds-to-cases-by-case-id.js';
import { TieBallotsToRatingRoundsByRoundId1796146450993 } from './migrations/1796146450993-tie-ballots-to-rating-rounds-by-round-id.js';
import { TieBallotsToPeopleByPersonId1796146450994 } from './migrations/1796146450994-tie-ballots-to-people-by-person-id.js';

// Written by `npm run migrations:generate`: every migration, in the order they run.
export const MIGRATIONS: MixedList<Function> = [
  CreateTheTableAuditEntries1796146450932,
  CreateTheTableConferences1796146450933,
  CreateTheTableMemberships1796146450934,
  CreateTheTableUnits1796146450935,
  CreateTheTablePeople1796146450936,
  CreateTheTableOneTimeTokens1796146450937,
  CreateTheTableSessions1796146450938,
  CreateTheTableRefreshTokens1796146450939,
  CreateTheTableSignInFailures1796146450940,
  CreateTheTableCases1796146450941,
  CreateTheTableCaseVersions1796146450942,
  CreateTheTableDecisions1796146450943,
  CreateTheTableFinalDecisions1796146450944,
  CreateTheTableCaseReadings1796146450945,
  CreateTheTableThreads1796146450946,
  CreateTheTableRemarks1796146450947,
  CreateTheTableMentions1796146450948,
  CreateTheTableRemarkVersions1796146450949,
  CreateTheTableLiveEvents1796146450950,
  CreateTheTableCaseImages1796146450951,
  CreateTheTableOutboxMails1796146450952,
  CreateTheTableMeetings1796146450953,
  CreateTheTableAgendaItems1796146450954,
  CreateTheTableAttendances1796146450955,
  CreateTheTableOutcomes1796146450956,
  CreateTheTableBallotRatings1796146450957,
  CreateTheTableRatingRounds1796146450958,
  CreateTheTableBallots1796146450959,
  TieMembershipsToConferencesByConferenceId1796146450960,
  TieMembershipsToPeopleByPersonId1796146450961,
  TiePeopleToUnitsByUnitId1796146450962,
  TieOneTimeTokensToPeopleByPersonId1796146450963,
  TieSessionsToPeopleByPersonId1796146450964,
  TieRefreshTokensToSessionsBySessionId1796146450965,
  TieCasesToConferencesByConferenceId1796146450966,
  TieCasesToPeopleByPresenterId1796146450967,
  TieCasesToPeopleByTreatingSurgeonId1796146450968,
  TieCaseVersionsToCasesByCaseId1796146450969,
  TieCaseVersionsToPeopleByAuthorId1796146450970,
  TieDecisionsToConferencesByConferenceId1796146450971,
  TieDecisionsToCasesByCaseId1796146450972,
  TieFinalDecisionsToCasesByCaseId1796146450973,
  TieFinalDecisionsToPeopleByById1796146450974,
  TieCaseReadingsToPeopleByPersonId1796146450975,
  TieCaseReadingsToCasesByCaseId1796146450976,
  TieThreadsToCasesByCaseId1796146450977,
  TieRemarksToThreadsByThreadId1796146450978,
  TieRemarksToPeopleByAuthorId1796146450979,
  TieMentionsToRemarksByRemarkId1796146450980,
  TieMentionsToPeopleByPersonId1796146450981,
  TieRemarkVersionsToRemarksByRemarkId1796146450982,
  TieCaseImagesToCasesByCaseId1796146450983,
  TieMeetingsToConferencesByConferenceId1796146450984,
  TieAgendaItemsToMeetingsByMeetingId1796146450985,
  TieAgendaItemsToCasesByCaseId1796146450986,
  TieAttendancesToMeetingsByMeetingId1796146450987,
  TieAttendancesToPeopleByPersonId1796146450988,
  TieOutcomesToCasesByCaseId1796146450989,
  TieOutcomesToPeopleByById1796146450990,
  TieBallotRatingsToBallotsByBallotId1796146450991,
  TieRatingRoundsToCasesByCaseId1796146450992,
  TieBallotsToRatingRoundsByRoundId1796146450993,
  TieBallotsToPeopleByPersonId1796146450994,
];
