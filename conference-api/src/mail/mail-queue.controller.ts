import { Body, Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { NumberPipe } from '../common/pipes/path-pipes.js';
import { DropMailDto, ListMailDto, MailQueueDto, QueuedMailDto } from './dto/mail-queue.dto.js';
import { MailQueueService } from './mail-queue.service.js';

@ApiTags('mail')
@Controller('mail')
export class MailQueueController {
  constructor(private readonly queue: MailQueueService) {}

  @Get()
  @RequirePermission(Permission.MailQueue)
  find(@CurrentActor() actor: Actor, @Query() query: ListMailDto): Promise<MailQueueDto> {
    return this.queue.find(actor, query);
  }

  /** Sends a failed or uncertain one again. */
  @Post(':id/retry')
  @HttpCode(200)
  @RequirePermission(Permission.MailQueue)
  retry(@CurrentActor() actor: Actor, @Param('id', NumberPipe) id: number): Promise<QueuedMailDto> {
    return this.queue.retry(actor, String(id));
  }

  @Post(':id/drop')
  @HttpCode(200)
  @RequirePermission(Permission.MailQueue)
  drop(@CurrentActor() actor: Actor, @Param('id', NumberPipe) id: number, @Body() body: DropMailDto): Promise<QueuedMailDto> {
    return this.queue.drop(actor, String(id), body.reason);
  }
}
