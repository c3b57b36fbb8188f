import { ApiProperty } from '@nestjs/swagger';
import { IsBoolean, IsIn, IsInt, IsObject, IsOptional, IsUUID, Matches, Min } from 'class-validator';
import { ANCHOR_KINDS, type AnchorKind, type RichText, THREAD_KINDS, type ThreadKind } from '../../calc/vocabulary/discussions.js';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { OptionalFlag } from '../../common/validation/fields.js';

const RICH_TEXT = { type: 'object' as const, additionalProperties: true, description: 'TipTap JSON of the editor’s schema' };

export class CreateThreadDto {
  @IsIn(ANCHOR_KINDS)
  @ApiProperty({ enum: ANCHOR_KINDS })
  anchorKind: AnchorKind;

  /** Section name, plan step id or image id; empty for the whole case. */
  @IsOptional()
  @Matches(/^[A-Za-z0-9_-]{0,64}$/)
  anchorRef?: string;

  @IsIn(THREAD_KINDS)
  @ApiProperty({ enum: THREAD_KINDS })
  kind: ThreadKind;

  @IsObject()
  @ApiProperty(RICH_TEXT)
  content: RichText;
}

export class CreateRemarkDto {
  @IsObject()
  @ApiProperty(RICH_TEXT)
  content: RichText;

  @IsOptional()
  @IsUUID()
  replyToId?: string;

  /** The presenter's answer to the thread's question. */
  @OptionalFlag()
  answers?: boolean;
}

export class UpdateRemarkDto {
  @IsInt()
  @Min(1)
  baseVersion: number;

  @IsObject()
  @ApiProperty(RICH_TEXT)
  content: RichText;
}

export class AnswerThreadDto {
  @IsBoolean()
  answered: boolean;
}

export class RemarkDto {
  id: string;
  threadId: string;
  author: PersonRefDto;
  replyToId: string | null;
  /** Null where the author deleted it: the mark stays. */
  @ApiProperty({ ...RICH_TEXT, nullable: true }) content: RichText | null;
  version: number;
  createdAt: string;
  editedAt: string | null;
  deletedAt: string | null;
  isMine: boolean;
  isNew: boolean;
}

export class ThreadDto {
  id: string;
  @ApiProperty({ enum: ANCHOR_KINDS }) anchorKind: AnchorKind;
  anchorRef: string;
  @ApiProperty({ enum: THREAD_KINDS }) kind: ThreadKind;
  answeredAt: string | null;
  createdAt: string;
  remarks: RemarkDto[];
}

export class ThreadListDto {
  items: ThreadDto[];
  unread: number;
}

export class RemarkVersionDto {
  version: number;
  at: string;
  @ApiProperty(RICH_TEXT) content: RichText;
}

export class RemarkVersionListDto {
  items: RemarkVersionDto[];
}

export class UnreadDto {
  caseId: string;
  count: number;
}

export class UnreadListDto {
  items: UnreadDto[];
  total: number;
}
