import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class InvitationsService {
  findOpen(..._: unknown[]): any {
    throw new Error('InvitationsService.findOpen is not written yet');
  }
  accept(..._: unknown[]): any {
    throw new Error('InvitationsService.accept is not written yet');
  }
}
