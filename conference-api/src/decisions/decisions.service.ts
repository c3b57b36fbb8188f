import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class DecisionsService {
  findOfCase(..._: unknown[]): any {
    throw new Error('DecisionsService.findOfCase is not written yet');
  }
  write(..._: unknown[]): any {
    throw new Error('DecisionsService.write is not written yet');
  }
  amend(..._: unknown[]): any {
    throw new Error('DecisionsService.amend is not written yet');
  }
  findOne(..._: unknown[]): any {
    throw new Error('DecisionsService.findOne is not written yet');
  }
  findOfConference(..._: unknown[]): any {
    throw new Error('DecisionsService.findOfConference is not written yet');
  }
}
