import { Injectable } from '@nestjs/common';
import type { CookieOptions, Request, Response } from 'express';
import { Settings } from '../config/settings.js';

const NAME = 'kerfside_refresh';

/** The cookie that keeps a browser signed in; no script can read it, and only the auth routes get it. */
@Injectable()
export class RefreshCookie {
  private readonly options: CookieOptions;

  constructor(settings: Settings) {
    this.options = { httpOnly: true, sameSite: 'strict', path: '/api/auth', secure: settings.secureCookies };
  }

  read(request: Request): string | null {
    // the parser turns a cookie that begins with j: into an object
    const value: unknown = request.cookies?.[NAME];
    return typeof value === 'string' && value !== '' ? value : null;
  }

  set(response: Response, token: string, expires: Date): void {
    response.cookie(NAME, token, { ...this.options, expires }).set('Cache-Control', 'no-store');
  }

  clear(response: Response): void {
    response.clearCookie(NAME, this.options).set('Cache-Control', 'no-store');
  }
}
