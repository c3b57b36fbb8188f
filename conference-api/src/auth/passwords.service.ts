import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class PasswordsService {
  requestReset(..._: unknown[]): any {
    throw new Error('PasswordsService.requestReset is not written yet');
  }
  confirmReset(..._: unknown[]): any {
    throw new Error('PasswordsService.confirmReset is not written yet');
  }
  change(..._: unknown[]): any {
    throw new Error('PasswordsService.change is not written yet');
  }
}
