import { ApiProperty } from '@nestjs/swagger';
import { IsInt, IsOptional, IsString, IsUUID, Matches, MaxLength, Min } from 'class-validator';
import { FINAL_DECISION_KINDS, type FinalDecisionKind } from '../../calc/vocabulary/decisions.js';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { OptionalFlag, OptionalText, RequiredList, RequiredOneOf, RequiredText } from '../../common/validation/fields.js';
import { OptionFiguresDto } from '../../ratings/dto/rating.dto.js';

export class DissentDto {
  @IsUUID()
  personId: string;

  @RequiredText(4000)
  words: string;
}

export class WriteDecisionDto {
  /** Revision of the draft that was edited; absent for the first. */
  @IsOptional()
  @IsInt()
  @Min(1)
  baseRevision?: number;

  @IsOptional()
  @Matches(/^[A-Za-z0-9_-]{1,40}$/)
  chosenOptionId?: string | null;

  @OptionalText(8000) text?: string;
  @OptionalText(4000) conditions?: string;
  @OptionalText(1000) timing?: string;
  @RequiredList(() => DissentDto, 40) dissent: DissentDto[];
}

export class SignDecisionDto {
  @IsInt()
  @Min(1)
  baseRevision: number;

  /** The own password again. */
  @IsString()
  @MaxLength(256)
  password: string;
}

export class AmendDecisionDto {
  @RequiredText(2000)
  reason: string;
}

export class DecisionContentDto {
  chosenOptionId: string | null;
  text: string;
  conditions: string;
  timing: string;
  dissent: DissentDto[];
}

export class DecisionRoundDto {
  number: number;
  figures: OptionFiguresDto[];
}

export class DecisionAttendanceDto {
  name: string;
  discipline: string;
  unit: string;
  state: string;
}

export class DecisionDto {
  id: string;
  caseId: string;
  caseCode: string;
  conferenceId: string;
  conferenceName: string;
  meetingId: string | null;
  meetingAt: string | null;
  version: number;
  /** Given when it is signed. */
  number: number | null;
  revision: number;
  @ApiProperty({ enum: ['draft', 'signed'] }) state: 'draft' | 'signed';
  /** Advice where the quorum was not met. */
  @ApiProperty({ enum: ['decision', 'advice'] }) kind: 'decision' | 'advice';
  content: DecisionContentDto;
  chosenOptionTitle: string | null;
  dissenters: PersonRefDto[];
  rounds: DecisionRoundDto[];
  attendance: DecisionAttendanceDto[];
  quorumMissing: string[];
  amendmentReason: string | null;
  replacesNumber: number | null;
  replacedByNumber: number | null;
  signedBy: string | null;
  signedAt: string | null;
  hash: string | null;
  previousHash: string | null;
}

export class DecisionListDto {
  items: DecisionDto[];
}

export class DecisionSummaryDto {
  id: string;
  caseId: string;
  caseCode: string;
  number: number;
  version: number;
  @ApiProperty({ enum: ['decision', 'advice'] }) kind: 'decision' | 'advice';
  signedAt: string;
  signedBy: string;
}

export class DecisionSummaryListDto {
  items: DecisionSummaryDto[];
  nextCursor: string | null;
}

export class DecisionCheckDto {
  intact: boolean;
  /** What does not fit, by decision number. */
  faults: string[];
  checked: number;
}

export class WriteFinalDecisionDto {
  @RequiredOneOf(FINAL_DECISION_KINDS) kind: FinalDecisionKind;
  /** Required for a variation and for not proceeding. */
  @OptionalText(4000) reason?: string;
  /** Week of the operation, for example 2026-W51. */
  @IsOptional()
  @Matches(/^20\d{2}-W(0[1-9]|[1-4]\d|5[0-3])$/)
  plannedWeek?: string | null;
  @OptionalFlag() patientInformed?: boolean | null;
}

export class FinalDecisionDto {
  id: string;
  version: number;
  @ApiProperty({ enum: FINAL_DECISION_KINDS }) kind: FinalDecisionKind;
  reason: string;
  plannedWeek: string | null;
  patientInformed: boolean | null;
  by: PersonRefDto;
  at: string;
}

export class FinalDecisionListDto {
  items: FinalDecisionDto[];
}
