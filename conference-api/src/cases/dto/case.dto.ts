import { ApiProperty } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsInt, IsOptional, IsUUID, Max, Min } from 'class-validator';
import { READINESS_WEIGHTS, type ReadinessWeight } from '../../calc/cases/readiness.js';
import { CONTENT_SECTIONS, type ContentSection } from '../../calc/vocabulary/case-content.js';
import { JOINTS, type Joint, SECTIONS, type Section, SIDES, type Side, type Stage, STAGES, URGENCIES, type Urgency } from '../../calc/vocabulary/case.js';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { OptionalObject, OptionalOneOf, OptionalText, RequiredText } from '../../common/validation/fields.js';
import { ImageDto } from '../../images/dto/image.dto.js';
import {
  BoneAndPositionDto,
  HeadingDto,
  HistoryDto,
  ImplantsDto,
  InfectionWorkUpDto,
  OptionsDto,
  PatientDto,
  RemovalPlanDto,
} from './case-content.dto.js';

export class CreateCaseDto {
  @IsUUID()
  conferenceId: string;

  @OptionalText(160)
  title?: string;

  @OptionalOneOf(SIDES)
  side?: Side | null;

  @OptionalOneOf(JOINTS)
  joint?: Joint;
}

/** The sections that change; each is replaced whole. */
export class CaseChangesDto {
  @OptionalObject(() => HeadingDto) heading?: HeadingDto;
  @OptionalObject(() => PatientDto) patient?: PatientDto;
  @OptionalObject(() => HistoryDto) history?: HistoryDto;
  @OptionalObject(() => ImplantsDto) implants?: ImplantsDto;
  @OptionalObject(() => InfectionWorkUpDto) infection?: InfectionWorkUpDto;
  @OptionalObject(() => BoneAndPositionDto) bone?: BoneAndPositionDto;
  @OptionalObject(() => RemovalPlanDto) plan?: RemovalPlanDto;
  @OptionalObject(() => OptionsDto) options?: OptionsDto;
}

export class SaveCaseDto {
  /** The version that the edit was made on. An older one is refused with 409 and what changed since. */
  @IsInt()
  @Min(1)
  @Max(1000000)
  baseVersion: number;

  @OptionalObject(() => CaseChangesDto)
  changes: CaseChangesDto;
}

export class SavedCaseDto {
  version: number;
  savedAt: string;
}

export class CaseContentDto {
  heading: HeadingDto;
  patient: PatientDto;
  history: HistoryDto;
  implants: ImplantsDto;
  infection: InfectionWorkUpDto;
  bone: BoneAndPositionDto;
  plan: RemovalPlanDto;
  options: OptionsDto;
}

/** What the signed-in person may do with the case now. */
export class CaseActionsDto {
  edit: boolean;
  editOptions: boolean;
  post: boolean;
  check: boolean;
  withdraw: boolean;
  comment: boolean;
  rate: boolean;
  controlRounds: boolean;
  list: boolean;
  writeDecision: boolean;
  writeFinalDecision: boolean;
  writeOutcome: boolean;
  readAudit: boolean;
  addImages: boolean;
}

export class CaseDto {
  id: string;
  code: string;
  conferenceId: string;
  conferenceName: string;
  @ApiProperty({ enum: STAGES }) stage: Stage;
  presenter: PersonRefDto;
  treatingSurgeon: PersonRefDto;
  content: CaseContentDto;
  images: ImageDto[];
  version: number;
  createdAt: string;
  updatedAt: string;
  postedAt: string | null;
  releasedAt: string | null;
  returnRemark: string | null;
  withdrawnReason: string | null;
  /** The meeting on whose agenda it stands, or stood last. */
  meeting: { id: string; startsAt: string } | null;
  unread: number;
  actions: CaseActionsDto;
}

export class CaseListItemDto {
  id: string;
  code: string;
  title: string;
  conferenceId: string;
  @ApiProperty({ enum: STAGES }) stage: Stage;
  @ApiProperty({ enum: SIDES, nullable: true }) side: Side | null;
  @ApiProperty({ enum: JOINTS }) joint: Joint;
  @ApiProperty({ enum: URGENCIES }) urgency: Urgency;
  presenter: PersonRefDto;
  updatedAt: string;
  releasedAt: string | null;
  /** Remarks not read yet. */
  unread: number;
  /** Questions to the presenter that are still open. */
  openQuestions: number;
  /** Ratings in the current round that count; null where none is open. */
  ratings: number | null;
  awaitingMyRating: boolean;
  isMine: boolean;
  meetingAt: string | null;
}

export class CaseListDto {
  items: CaseListItemDto[];
  nextCursor: string | null;
}

export class ReturnCaseDto {
  @RequiredText(4000)
  remark: string;
}

export class WithdrawCaseDto {
  @RequiredText(2000)
  reason: string;
}

export class PostCaseDto {
  @IsInt()
  @Min(1)
  baseVersion: number;
}

export class ReleaseCaseDto {
  /** The version that was checked: another one is refused. */
  @IsInt()
  @Min(1)
  baseVersion: number;
}

export class ReadinessItemDto {
  id: string;
  @ApiProperty({ enum: SECTIONS }) section: Section;
  label: string;
  done: boolean;
  @ApiProperty({ enum: READINESS_WEIGHTS }) weight: ReadinessWeight;
  /** What to do where it is not done. */
  remedy: string;
}

export class ReadinessDto {
  items: ReadinessItemDto[];
  canBePosted: boolean;
  canBeListed: boolean;
}

export class DifferenceDto {
  @ApiProperty({ enum: CONTENT_SECTIONS }) section: ContentSection;
  /** For example `parts[shell-1].outerDiameterMm`. */
  path: string;
  /** The same in words. */
  label: string;
  from: string | null;
  to: string | null;
}

export class CaseVersionDto {
  version: number;
  at: string;
  author: PersonRefDto;
  @ApiProperty({ enum: CONTENT_SECTIONS, isArray: true }) sections: ContentSection[];
}

export class CaseVersionListDto {
  items: CaseVersionDto[];
  nextCursor: string | null;
}

export class DifferencesDto {
  from: number;
  to: number;
  differences: DifferenceDto[];
}

export class DifferencesQueryDto {
  /** Compare with this version; the one before when left out. */
  @IsOptional()
  @Type(() => Number)
  @IsInt()
  @Min(1)
  since?: number;
}

export class IdentifierFindingDto {
  @ApiProperty({ enum: CONTENT_SECTIONS }) section: ContentSection;
  path: string;
  label: string;
  kind: string;
  start: number;
  end: number;
  text: string;
  @ApiProperty({ enum: ['certain', 'likely', 'possible'] }) strength: 'certain' | 'likely' | 'possible';
}

export class IdentifierFindingsDto {
  items: IdentifierFindingDto[];
}
