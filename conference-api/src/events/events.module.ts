import { Module } from '@nestjs/common';
import { EventsController } from './events.controller.js';
import { EventStreamService } from './event-stream.service.js';

@Module({
  controllers: [EventsController],
  providers: [EventStreamService],
  exports: [EventStreamService],
})
export class EventsModule {}
