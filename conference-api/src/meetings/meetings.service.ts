import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class MeetingsService {
  findForMember(..._: unknown[]): any {
    throw new Error('MeetingsService.findForMember is not written yet');
  }
  findOfConference(..._: unknown[]): any {
    throw new Error('MeetingsService.findOfConference is not written yet');
  }
  create(..._: unknown[]): any {
    throw new Error('MeetingsService.create is not written yet');
  }
  findOne(..._: unknown[]): any {
    throw new Error('MeetingsService.findOne is not written yet');
  }
  move(..._: unknown[]): any {
    throw new Error('MeetingsService.move is not written yet');
  }
  cancel(..._: unknown[]): any {
    throw new Error('MeetingsService.cancel is not written yet');
  }
}
