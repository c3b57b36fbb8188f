import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class CasesService {
  create(..._: unknown[]): any {
    throw new Error('CasesService.create is not written yet');
  }
  findOne(..._: unknown[]): any {
    throw new Error('CasesService.findOne is not written yet');
  }
  save(..._: unknown[]): any {
    throw new Error('CasesService.save is not written yet');
  }
  readiness(..._: unknown[]): any {
    throw new Error('CasesService.readiness is not written yet');
  }
  identifiers(..._: unknown[]): any {
    throw new Error('CasesService.identifiers is not written yet');
  }
}
