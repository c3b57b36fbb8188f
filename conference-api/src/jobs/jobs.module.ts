import { Module } from '@nestjs/common';
import { EventsModule } from '../events/events.module.js';
import { ImagesModule } from '../images/images.module.js';
import { MailModule } from '../mail/mail.module.js';
import { MeetingsModule } from '../meetings/meetings.module.js';
import { JobsService } from './jobs.service.js';

@Module({
  imports: [MailModule, MeetingsModule, EventsModule, ImagesModule],
  providers: [JobsService],
})
export class JobsModule {}
