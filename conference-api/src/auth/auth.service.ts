import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class AuthService {
  signIn(..._: unknown[]): any {
    throw new Error('AuthService.signIn is not written yet');
  }
  refresh(..._: unknown[]): any {
    throw new Error('AuthService.refresh is not written yet');
  }
  signOut(..._: unknown[]): any {
    throw new Error('AuthService.signOut is not written yet');
  }
  me(..._: unknown[]): any {
    throw new Error('AuthService.me is not written yet');
  }
}
