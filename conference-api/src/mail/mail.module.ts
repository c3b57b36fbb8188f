import { Module } from '@nestjs/common';
import { MailQueueController } from './mail-queue.controller.js';
import { MailQueueService } from './mail-queue.service.js';
import { OutboxSender } from './outbox-sender.service.js';
import { OutboxService } from './outbox.service.js';
import { MailTransport } from './transport.js';

@Module({
  controllers: [MailQueueController],
  providers: [MailQueueService, OutboxService, OutboxSender, MailTransport],
  exports: [MailQueueService, OutboxSender, MailTransport],
})
export class MailModule {}
