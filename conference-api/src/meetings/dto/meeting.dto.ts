import { ApiProperty } from '@nestjs/swagger';
import { IsInt, IsISO8601, IsIn, IsOptional, IsUUID, Max, Min } from 'class-validator';
import { SIDES, type Side, type Stage, STAGES, URGENCIES, type Urgency } from '../../calc/vocabulary/case.js';
import {
  AGENDA_ITEM_STATES,
  type AgendaItemState,
  ATTENDANCE_STATES,
  type AttendanceState,
  MEETING_STATES,
  type MeetingState,
} from '../../calc/vocabulary/meetings.js';
import { PageQueryDto } from '../../common/paging/page-query.dto.js';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { RequiredInteger, RequiredList, RequiredText } from '../../common/validation/fields.js';

export class ListMeetingsDto extends PageQueryDto {
  @IsOptional()
  @IsIn(['upcoming', 'past'])
  when?: 'upcoming' | 'past';
}

export class CreateMeetingDto {
  /** Instant, for example 2026-12-09T07:30:00Z. */
  @IsISO8601({ strict: true, strictSeparator: true })
  startsAt: string;

  @RequiredInteger(5, 480)
  minutes: number;
}

export class UpdateMeetingDto extends CreateMeetingDto {
  @IsInt()
  @Min(1)
  baseVersion: number;
}

export class CancelMeetingDto {
  @RequiredText(1000)
  reason: string;
}

export class MeetingSummaryDto {
  id: string;
  conferenceId: string;
  conferenceName: string;
  startsAt: string;
  minutes: number;
  timeZone: string;
  @ApiProperty({ enum: MEETING_STATES }) state: MeetingState;
  agendaDueAt: string;
  agendaSentAt: string | null;
  caseCount: number;
  plannedMinutes: number;
}

export class MeetingListDto {
  items: MeetingSummaryDto[];
  nextCursor: string | null;
}

export class AgendaItemDto {
  id: string;
  caseId: string;
  code: string;
  title: string;
  @ApiProperty({ enum: SIDES, nullable: true }) side: Side | null;
  @ApiProperty({ enum: URGENCIES }) urgency: Urgency;
  @ApiProperty({ enum: STAGES }) stage: Stage;
  presenter: PersonRefDto;
  position: number;
  minutes: number;
  @ApiProperty({ enum: AGENDA_ITEM_STATES }) state: AgendaItemState;
  deferredReason: string | null;
  ratings: number;
}

export class AttendanceDto {
  person: PersonRefDto;
  role: string;
  @ApiProperty({ enum: ATTENDANCE_STATES, nullable: true }) state: AttendanceState | null;
}

export class QuorumDto {
  met: boolean;
  /** In plain words, for example '1 more of infection and microbiology'. */
  missing: string[];
}

export class MeetingActionsDto {
  editAgenda: boolean;
  sendAgenda: boolean;
  run: boolean;
  writeAttendance: boolean;
}

export class MeetingDto extends MeetingSummaryDto {
  startedAt: string | null;
  closedAt: string | null;
  cancelledReason: string | null;
  version: number;
  items: AgendaItemDto[];
  attendance: AttendanceDto[];
  quorum: QuorumDto;
  actions: MeetingActionsDto;
}

export class AgendaEntryDto {
  @IsUUID()
  caseId: string;

  @RequiredInteger(1, 240)
  minutes: number;
}

export class SetAgendaDto {
  @IsInt()
  @Min(1)
  @Max(1000000)
  baseVersion: number;

  /** In their order. A case left out goes back to open. */
  @RequiredList(() => AgendaEntryDto, 60)
  items: AgendaEntryDto[];
}

export class SendAgendaDto {
  @IsInt()
  @Min(1)
  baseVersion: number;
}

export class AgendaSentDto {
  /** Mails put in the outbox. */
  mails: number;
  meeting: MeetingDto;
}

export class SetAttendanceDto {
  @IsIn([...ATTENDANCE_STATES, null])
  @ApiProperty({ enum: ATTENDANCE_STATES, nullable: true })
  state: AttendanceState | null;
}

export class DeferItemDto {
  @RequiredText(1000)
  reason: string;
}

export class ListableCaseDto {
  id: string;
  code: string;
  title: string;
  @ApiProperty({ enum: URGENCIES }) urgency: Urgency;
  presenter: PersonRefDto;
  releasedAt: string | null;
  ratings: number;
  canBeListed: boolean;
  missing: string[];
}

export class ListableCasesDto {
  items: ListableCaseDto[];
}
