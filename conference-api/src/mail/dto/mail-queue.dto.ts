import { ApiProperty } from '@nestjs/swagger';
import { IsIn, IsOptional } from 'class-validator';
import { OUTBOX_STATES, type OutboxState } from '../../calc/vocabulary/mail.js';
import { PageQueryDto } from '../../common/paging/page-query.dto.js';
import { RequiredText } from '../../common/validation/fields.js';

export class ListMailDto extends PageQueryDto {
  @IsOptional()
  @IsIn(OUTBOX_STATES)
  state?: OutboxState;
}

export class DropMailDto {
  @RequiredText(300)
  reason: string;
}

export class QueuedMailDto {
  id: string;
  purpose: string;
  recipient: string;
  template: string;
  @ApiProperty({ enum: OUTBOX_STATES }) state: OutboxState;
  attempts: number;
  nextAttemptAt: string;
  createdAt: string;
  sentAt: string | null;
  lastError: string | null;
}

export class MailQueueDto {
  items: QueuedMailDto[];
  nextCursor: string | null;
  waiting: number;
  /** Seconds since the oldest unsent one was written; null where none waits. */
  oldestUnsentSeconds: number | null;
}
