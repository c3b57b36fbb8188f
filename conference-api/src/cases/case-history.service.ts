import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class CaseHistoryService {
  versions(..._: unknown[]): any {
    throw new Error('CaseHistoryService.versions is not written yet');
  }
  differences(..._: unknown[]): any {
    throw new Error('CaseHistoryService.differences is not written yet');
  }
}
