import { Module } from '@nestjs/common';
import { AuthController } from './auth.controller.js';
import { AuthService } from './auth.service.js';
import { SessionsService } from './sessions.service.js';
import { PasswordsService } from './passwords.service.js';
import { InvitationsService } from './invitations.service.js';

@Module({
  controllers: [AuthController],
  providers: [AuthService, SessionsService, PasswordsService, InvitationsService],
  exports: [AuthService, SessionsService, PasswordsService, InvitationsService],
})
export class AuthModule {}
