import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class SessionsService {
  findOwn(..._: unknown[]): any {
    throw new Error('SessionsService.findOwn is not written yet');
  }
  endOthers(..._: unknown[]): any {
    throw new Error('SessionsService.endOthers is not written yet');
  }
  endOwn(..._: unknown[]): any {
    throw new Error('SessionsService.endOwn is not written yet');
  }
}
