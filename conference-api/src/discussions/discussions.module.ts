import { Module } from '@nestjs/common';
import { DiscussionsController } from './discussions.controller.js';
import { DiscussionsService } from './discussions.service.js';
import { RemarksService } from './remarks.service.js';
import { ReadingService } from './reading.service.js';

@Module({
  controllers: [DiscussionsController],
  providers: [DiscussionsService, RemarksService, ReadingService],
  exports: [DiscussionsService, RemarksService, ReadingService],
})
export class DiscussionsModule {}
