import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class PeopleService {
  find(..._: unknown[]): any {
    throw new Error('PeopleService.find is not written yet');
  }
  invite(..._: unknown[]): any {
    throw new Error('PeopleService.invite is not written yet');
  }
  findOne(..._: unknown[]): any {
    throw new Error('PeopleService.findOne is not written yet');
  }
  update(..._: unknown[]): any {
    throw new Error('PeopleService.update is not written yet');
  }
  inviteAgain(..._: unknown[]): any {
    throw new Error('PeopleService.inviteAgain is not written yet');
  }
}
