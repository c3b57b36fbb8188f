import { Module } from '@nestjs/common';
import { MailQueueController } from './mail-queue.controller.js';
import { MailQueueService } from './mail-queue.service.js';

@Module({
  controllers: [MailQueueController],
  providers: [MailQueueService],
  exports: [MailQueueService],
})
export class MailModule {}
