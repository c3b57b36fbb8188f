import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class EventStreamService {
  open(..._: unknown[]): any {
    throw new Error('EventStreamService.open is not written yet');
  }
}
