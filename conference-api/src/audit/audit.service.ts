import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class AuditService {
  find(..._: unknown[]): any {
    throw new Error('AuditService.find is not written yet');
  }
  findOfCase(..._: unknown[]): any {
    throw new Error('AuditService.findOfCase is not written yet');
  }
}
