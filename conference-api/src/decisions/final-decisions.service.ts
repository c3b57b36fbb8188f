import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class FinalDecisionsService {
  findOfCase(..._: unknown[]): any {
    throw new Error('FinalDecisionsService.findOfCase is not written yet');
  }
  write(..._: unknown[]): any {
    throw new Error('FinalDecisionsService.write is not written yet');
  }
}
