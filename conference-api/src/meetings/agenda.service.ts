import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class AgendaService {
  findListable(..._: unknown[]): any {
    throw new Error('AgendaService.findListable is not written yet');
  }
  set(..._: unknown[]): any {
    throw new Error('AgendaService.set is not written yet');
  }
  send(..._: unknown[]): any {
    throw new Error('AgendaService.send is not written yet');
  }
}
