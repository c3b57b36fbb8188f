import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class RemarksService {
  reply(..._: unknown[]): any {
    throw new Error('RemarksService.reply is not written yet');
  }
  edit(..._: unknown[]): any {
    throw new Error('RemarksService.edit is not written yet');
  }
  remove(..._: unknown[]): any {
    throw new Error('RemarksService.remove is not written yet');
  }
  versions(..._: unknown[]): any {
    throw new Error('RemarksService.versions is not written yet');
  }
}
