import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class RoundsService {
  open(..._: unknown[]): any {
    throw new Error('RoundsService.open is not written yet');
  }
  close(..._: unknown[]): any {
    throw new Error('RoundsService.close is not written yet');
  }
}
