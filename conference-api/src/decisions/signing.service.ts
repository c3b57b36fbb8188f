import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class SigningService {
  sign(..._: unknown[]): any {
    throw new Error('SigningService.sign is not written yet');
  }
  check(..._: unknown[]): any {
    throw new Error('SigningService.check is not written yet');
  }
}
