import { Module } from '@nestjs/common';
import { AgendaDueService } from './agenda-due.service.js';
import { AgendaMailsService } from './agenda-mails.service.js';
import { AgendaService } from './agenda.service.js';
import { ListableCasesService } from './listable-cases.service.js';
import { MeetingAccessService } from './meeting-access.service.js';
import { MeetingRunService } from './meeting-run.service.js';
import { MeetingViewService } from './meeting-view.service.js';
import { MeetingsController } from './meetings.controller.js';
import { MeetingsService } from './meetings.service.js';
import { SlotMeetingsService } from './slot-meetings.service.js';

@Module({
  controllers: [MeetingsController],
  providers: [
    MeetingsService,
    AgendaService,
    MeetingRunService,
    MeetingAccessService,
    MeetingViewService,
    AgendaMailsService,
    AgendaDueService,
    ListableCasesService,
    SlotMeetingsService,
  ],
  exports: [MeetingsService, AgendaService, MeetingRunService, AgendaDueService, SlotMeetingsService],
})
export class MeetingsModule {}
