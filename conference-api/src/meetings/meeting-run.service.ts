import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class MeetingRunService {
  start(..._: unknown[]): any {
    throw new Error('MeetingRunService.start is not written yet');
  }
  close(..._: unknown[]): any {
    throw new Error('MeetingRunService.close is not written yet');
  }
  setAttendance(..._: unknown[]): any {
    throw new Error('MeetingRunService.setAttendance is not written yet');
  }
  defer(..._: unknown[]): any {
    throw new Error('MeetingRunService.defer is not written yet');
  }
}
