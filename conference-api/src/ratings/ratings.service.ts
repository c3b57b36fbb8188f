import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class RatingsService {
  findOfCase(..._: unknown[]): any {
    throw new Error('RatingsService.findOfCase is not written yet');
  }
  give(..._: unknown[]): any {
    throw new Error('RatingsService.give is not written yet');
  }
}
