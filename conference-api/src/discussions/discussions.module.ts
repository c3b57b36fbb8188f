import { Module } from '@nestjs/common';
import { DiscussionAccess } from './discussion-access.service.js';
import { DiscussionsController } from './discussions.controller.js';
import { DiscussionsService } from './discussions.service.js';
import { ReadingService } from './reading.service.js';
import { RemarkContentService } from './remark-content.service.js';
import { RemarkMailsService } from './remark-mails.service.js';
import { RemarkWriterService } from './remark-writer.service.js';
import { RemarksService } from './remarks.service.js';

@Module({
  controllers: [DiscussionsController],
  providers: [DiscussionsService, RemarksService, ReadingService, DiscussionAccess, RemarkContentService, RemarkMailsService, RemarkWriterService],
  exports: [DiscussionsService, RemarksService, ReadingService],
})
export class DiscussionsModule {}
