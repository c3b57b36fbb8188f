import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class ConferencesService {
  findForActor(..._: unknown[]): any {
    throw new Error('ConferencesService.findForActor is not written yet');
  }
  create(..._: unknown[]): any {
    throw new Error('ConferencesService.create is not written yet');
  }
  findOne(..._: unknown[]): any {
    throw new Error('ConferencesService.findOne is not written yet');
  }
  update(..._: unknown[]): any {
    throw new Error('ConferencesService.update is not written yet');
  }
}
