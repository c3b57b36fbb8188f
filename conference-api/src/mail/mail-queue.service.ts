import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class MailQueueService {
  find(..._: unknown[]): any {
    throw new Error('MailQueueService.find is not written yet');
  }
  retry(..._: unknown[]): any {
    throw new Error('MailQueueService.retry is not written yet');
  }
  drop(..._: unknown[]): any {
    throw new Error('MailQueueService.drop is not written yet');
  }
}
