import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class DiscussionsService {
  findOfCase(..._: unknown[]): any {
    throw new Error('DiscussionsService.findOfCase is not written yet');
  }
  create(..._: unknown[]): any {
    throw new Error('DiscussionsService.create is not written yet');
  }
  setAnswered(..._: unknown[]): any {
    throw new Error('DiscussionsService.setAnswered is not written yet');
  }
}
