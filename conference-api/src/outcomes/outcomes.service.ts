import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class OutcomesService {
  findOfCase(..._: unknown[]): any {
    throw new Error('OutcomesService.findOfCase is not written yet');
  }
  write(..._: unknown[]): any {
    throw new Error('OutcomesService.write is not written yet');
  }
}
