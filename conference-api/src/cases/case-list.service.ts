import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class CaseListService {
  findVisible(..._: unknown[]): any {
    throw new Error('CaseListService.findVisible is not written yet');
  }
}
