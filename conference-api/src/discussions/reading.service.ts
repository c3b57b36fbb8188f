import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class ReadingService {
  markRead(..._: unknown[]): any {
    throw new Error('ReadingService.markRead is not written yet');
  }
  unread(..._: unknown[]): any {
    throw new Error('ReadingService.unread is not written yet');
  }
}
