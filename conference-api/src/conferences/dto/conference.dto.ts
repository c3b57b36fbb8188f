import { ApiProperty } from '@nestjs/swagger';
import { IsBoolean, IsIn, IsInt, IsOptional, IsString, Matches, Max, MaxLength, Min } from 'class-validator';
import { CONSENSUS_RULES, type ConsensusRule, NAMES_SHOWN, type NamesShown, type QuorumRule } from '../../calc/vocabulary/conference.js';
import { DISCIPLINES, type Discipline, type Role, ROLES } from '../../calc/vocabulary/people.js';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { OptionalObject, RequiredInteger, RequiredList, RequiredOneOf, RequiredText } from '../../common/validation/fields.js';

export class QuorumDisciplineDto {
  @RequiredOneOf(DISCIPLINES) discipline: Discipline;
  @RequiredInteger(1, 20) atLeast: number;
  @IsOptional() @IsBoolean() infectionOnly?: boolean;
}

export class QuorumRuleDto implements QuorumRule {
  /** Fewest members present who may rate. */
  @RequiredInteger(1, 100) raters: number;
  @RequiredList(() => QuorumDisciplineDto, 10) disciplines: QuorumDisciplineDto[];
}

export class ConferenceSettingsDto {
  /** IANA name. */
  @IsOptional() @IsString() @MaxLength(64) timeZone?: string;
  /** First meeting, local: YYYY-MM-DDTHH:mm. */
  @IsOptional() @Matches(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/) slotStart?: string;
  /** RFC 5545 recurrence rule. */
  @IsOptional() @IsString() @MaxLength(200) slotRule?: string;
  @IsOptional() @IsInt() @Min(5) @Max(480) slotMinutes?: number;
  @IsOptional() @IsInt() @Min(1) @Max(336) agendaHoursBefore?: number;
  @OptionalObject(() => QuorumRuleDto) quorumRule?: QuorumRuleDto;
  @IsOptional() @IsIn(CONSENSUS_RULES) @ApiProperty({ enum: CONSENSUS_RULES, required: false }) consensusRule?: ConsensusRule;
  @IsOptional() @IsIn(NAMES_SHOWN) @ApiProperty({ enum: NAMES_SHOWN, required: false }) namesShown?: NamesShown;
}

export class CreateConferenceDto extends ConferenceSettingsDto {
  @RequiredText(120)
  name: string;

  /** Begins the case codes. */
  @Matches(/^[A-Z]{2,6}$/)
  code: string;
}

export class UpdateConferenceDto extends ConferenceSettingsDto {
  @IsInt()
  @Min(1)
  baseVersion: number;

  @IsOptional() @IsString() @MaxLength(120) name?: string;
}

export class SetMembershipDto {
  @RequiredOneOf(ROLES)
  role: Role;
}

export class ConferenceDto {
  id: string;
  name: string;
  code: string;
  timeZone: string;
  slotStart: string;
  slotRule: string;
  slotMinutes: number;
  agendaHoursBefore: number;
  quorumRule: QuorumRuleDto;
  @ApiProperty({ enum: CONSENSUS_RULES }) consensusRule: ConsensusRule;
  @ApiProperty({ enum: NAMES_SHOWN }) namesShown: NamesShown;
  version: number;
  /** Null for an administrator who is not a member. */
  @ApiProperty({ enum: ROLES, nullable: true }) myRole: Role | null;
  maySetUp: boolean;
}

export class ConferenceListDto {
  items: ConferenceDto[];
}

export class MemberDto {
  person: PersonRefDto;
  @ApiProperty({ enum: ROLES }) role: Role;
}

export class MemberListDto {
  items: MemberDto[];
}
