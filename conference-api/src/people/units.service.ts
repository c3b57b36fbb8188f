import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class UnitsService {
  findAll(..._: unknown[]): any {
    throw new Error('UnitsService.findAll is not written yet');
  }
  create(..._: unknown[]): any {
    throw new Error('UnitsService.create is not written yet');
  }
  update(..._: unknown[]): any {
    throw new Error('UnitsService.update is not written yet');
  }
}
