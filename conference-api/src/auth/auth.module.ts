import { Module } from '@nestjs/common';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { AccessTokensService } from './access-tokens.service.js';
import { AccountsService } from './accounts.service.js';
import { AttemptsService } from './attempts.service.js';
import { AuthController } from './auth.controller.js';
import { AuthService } from './auth.service.js';
import { ExpiredSecretsService } from './expired-secrets.service.js';
import { InvitationsService } from './invitations.service.js';
import { JwtStrategy } from './jwt.strategy.js';
import { OneTimeTokensService } from './one-time-tokens.service.js';
import { PasswordHasher } from './password-hasher.js';
import { PasswordsService } from './passwords.service.js';
import { RefreshCookie } from './refresh-cookie.js';
import { SessionsService } from './sessions.service.js';

@Module({
  imports: [PassportModule, JwtModule.register({})],
  controllers: [AuthController],
  providers: [
    JwtStrategy,
    AuthService,
    AccessTokensService,
    AccountsService,
    AttemptsService,
    ExpiredSecretsService,
    InvitationsService,
    OneTimeTokensService,
    PasswordHasher,
    PasswordsService,
    RefreshCookie,
    SessionsService,
  ],
  exports: [AccessTokensService, AuthService, InvitationsService, JwtStrategy, OneTimeTokensService, PasswordHasher, PasswordsService, SessionsService],
})
export class AuthModule {}
