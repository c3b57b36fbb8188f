import { AuditEntry } from '../audit/entities/audit-entry.entity.js';
import { OneTimeToken } from '../auth/entities/one-time-token.entity.js';
import { RefreshToken } from '../auth/entities/refresh-token.entity.js';
import { Session } from '../auth/entities/session.entity.js';
import { SignInFailure } from '../auth/entities/sign-in-failure.entity.js';
import { Case } from '../cases/entities/case.entity.js';
import { CaseVersion } from '../cases/entities/case-version.entity.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { Decision } from '../decisions/entities/decision.entity.js';
import { FinalDecision } from '../decisions/entities/final-decision.entity.js';
import { CaseReading } from '../discussions/entities/case-reading.entity.js';
import { Mention } from '../discussions/entities/mention.entity.js';
import { Remark } from '../discussions/entities/remark.entity.js';
import { RemarkVersion } from '../discussions/entities/remark-version.entity.js';
import { Thread } from '../discussions/entities/thread.entity.js';
import { LiveEvent } from '../events/entities/live-event.entity.js';
import { CaseImage } from '../images/entities/case-image.entity.js';
import { OutboxMail } from '../mail/entities/outbox-mail.entity.js';
import { AgendaItem } from '../meetings/entities/agenda-item.entity.js';
import { Attendance } from '../meetings/entities/attendance.entity.js';
import { Meeting } from '../meetings/entities/meeting.entity.js';
import { Outcome } from '../outcomes/entities/outcome.entity.js';
import { Person } from '../people/entities/person.entity.js';
import { Unit } from '../people/entities/unit.entity.js';
import { Ballot } from '../ratings/entities/ballot.entity.js';
import { BallotRating } from '../ratings/entities/ballot-rating.entity.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';

export const ENTITIES = [
  Unit,
  Person,
  Session,
  RefreshToken,
  OneTimeToken,
  SignInFailure,
  Conference,
  Membership,
  Case,
  CaseVersion,
  CaseImage,
  Thread,
  Remark,
  RemarkVersion,
  Mention,
  CaseReading,
  RatingRound,
  Ballot,
  BallotRating,
  Meeting,
  AgendaItem,
  Attendance,
  Decision,
  FinalDecision,
  Outcome,
  OutboxMail,
  AuditEntry,
  LiveEvent,
];
