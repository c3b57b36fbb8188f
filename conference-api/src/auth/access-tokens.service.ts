import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { randomUUID } from 'node:crypto';
import { Settings } from '../config/settings.js';
import type { AccessTokenDto } from './dto/auth.dto.js';

export const TOKEN_ISSUER = 'kerfside';
export const TOKEN_AUDIENCE = 'kerfside-web';

/** Access tokens: short-lived, and good only while their session lives. */
@Injectable()
export class AccessTokensService {
  constructor(
    private readonly jwt: JwtService,
    private readonly settings: Settings,
  ) {}

  async issue(personId: string, sessionId: string): Promise<AccessTokenDto> {
    const expiresIn = this.settings.accessTokenSeconds;
    const accessToken = await this.jwt.signAsync(
      { sid: sessionId },
      {
        secret: this.settings.tokenSecret,
        algorithm: 'HS256',
        subject: personId,
        issuer: TOKEN_ISSUER,
        audience: TOKEN_AUDIENCE,
        jwtid: randomUUID(),
        expiresIn,
      },
    );
    return { accessToken, expiresIn };
  }
}
