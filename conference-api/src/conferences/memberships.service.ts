import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class MembershipsService {
  findOfConference(..._: unknown[]): any {
    throw new Error('MembershipsService.findOfConference is not written yet');
  }
  set(..._: unknown[]): any {
    throw new Error('MembershipsService.set is not written yet');
  }
  remove(..._: unknown[]): any {
    throw new Error('MembershipsService.remove is not written yet');
  }
}
