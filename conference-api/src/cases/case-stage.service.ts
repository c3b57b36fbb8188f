import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class CaseStageService {
  post(..._: unknown[]): any {
    throw new Error('CaseStageService.post is not written yet');
  }
  release(..._: unknown[]): any {
    throw new Error('CaseStageService.release is not written yet');
  }
  return(..._: unknown[]): any {
    throw new Error('CaseStageService.return is not written yet');
  }
  withdraw(..._: unknown[]): any {
    throw new Error('CaseStageService.withdraw is not written yet');
  }
}
