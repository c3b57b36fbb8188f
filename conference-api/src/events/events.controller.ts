import { Controller, Get, Headers, Req, Res } from '@nestjs/common';
import { ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Request, Response } from 'express';
import type { Actor } from '../access/actor.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { SignedIn } from '../common/decorators/route-access.decorator.js';
import { EventStreamService } from './event-stream.service.js';

@ApiTags('events')
@Controller('events')
export class EventsController {
  constructor(private readonly streams: EventStreamService) {}

  /** Server-sent events: what changed, by id; resumable with Last-Event-ID. */
  @Get()
  @SignedIn()
  @ApiProduces('text/event-stream')
  open(@CurrentActor() actor: Actor, @Headers('last-event-id') lastEventId: string | undefined, @Req() request: Request, @Res() response: Response): Promise<void> {
    return this.streams.open(actor, lastEventId, request, response);
  }
}
