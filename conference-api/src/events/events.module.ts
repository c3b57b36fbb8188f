import { Module } from '@nestjs/common';
import { EventsController } from './events.controller.js';
import { EventStreamService } from './event-stream.service.js';
import { LiveEventFeed } from './live-event-feed.service.js';

@Module({
  controllers: [EventsController],
  providers: [EventStreamService, LiveEventFeed],
  exports: [LiveEventFeed],
})
export class EventsModule {}
