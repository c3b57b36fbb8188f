import type { DecisionRecord, OptionFigures } from '../calc/vocabulary/decisions.js';
import type { Case } from '../cases/entities/case.entity.js';
import { toPersonRef } from '../common/people/person-ref.js';
import type { Person } from '../people/entities/person.entity.js';
import type { DecisionAttendanceDto, DecisionDto } from './dto/decision.dto.js';
import type { Decision } from './entities/decision.entity.js';

/** What a draft will be signed with, as it stands now. */
export interface Circumstances {
  rounds: { number: number; figures: OptionFigures[] }[];
  attendance: DecisionAttendanceDto[];
  quorum: { met: boolean; missing: string[] };
}

export interface DecisionViewParts {
  decision: Decision;
  case: Case;
  meetingAt: Date | null;
  dissenters: Person[];
  signedBy: string | null;
  circumstances: Circumstances;
  replacesNumber: number | null;
  replacedByNumber: number | null;
}

/** A signed decision is shown from its record, a draft from what stands now. */
export function toDecisionDto(parts: DecisionViewParts): DecisionDto {
  const { decision, circumstances } = parts;
  const record: DecisionRecord | null = decision.record;
  const options = parts.case.content.options.options ?? [];
  const shown: Circumstances = record ? { rounds: record.rounds, attendance: record.attendance, quorum: record.quorum } : circumstances;
  return {
    id: decision.id,
    caseId: decision.caseId,
    caseCode: parts.case.code,
    conferenceId: decision.conferenceId,
    conferenceName: parts.case.conference.name,
    meetingId: decision.meetingId,
    meetingAt: parts.meetingAt?.toISOString() ?? null,
    version: decision.version,
    number: decision.number,
    revision: decision.revision,
    state: decision.signedAt ? 'signed' : 'draft',
    kind: record?.kind ?? (shown.quorum.met ? 'decision' : 'advice'),
    content: decision.content,
    chosenOptionTitle: record ? record.content.chosenOption : (options.find((option) => option.id === decision.content.chosenOptionId)?.title ?? null),
    dissenters: parts.dissenters.map(toPersonRef),
    rounds: shown.rounds,
    attendance: shown.attendance,
    quorumMissing: shown.quorum.missing,
    amendmentReason: decision.amendmentReason,
    replacesNumber: parts.replacesNumber,
    replacedByNumber: parts.replacedByNumber,
    signedBy: parts.signedBy,
    signedAt: decision.signedAt?.toISOString() ?? null,
    hash: decision.hash,
    previousHash: decision.previousHash,
  };
}
