import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class HealthService {
  ready(..._: unknown[]): any {
    throw new Error('HealthService.ready is not written yet');
  }
}
