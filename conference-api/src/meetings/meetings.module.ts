import { Module } from '@nestjs/common';
import { MeetingsController } from './meetings.controller.js';
import { MeetingsService } from './meetings.service.js';
import { AgendaService } from './agenda.service.js';
import { MeetingRunService } from './meeting-run.service.js';

@Module({
  controllers: [MeetingsController],
  providers: [MeetingsService, AgendaService, MeetingRunService],
  exports: [MeetingsService, AgendaService, MeetingRunService],
})
export class MeetingsModule {}
