import { Body, Controller, Delete, Get, HttpCode, Param, Post, Req, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Request, Response } from 'express';
import type { Actor } from '../access/actor.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { Public, SignedIn } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { AuthService } from './auth.service.js';
import {
  AcceptInvitationDto,
  AccessTokenDto,
  ChangePasswordDto,
  InvitationDto,
  MeDto,
  RequestPasswordResetDto,
  SessionListDto,
  SetPasswordDto,
  SignInDto,
} from './dto/auth.dto.js';
import { InvitationsService } from './invitations.service.js';
import { PasswordsService } from './passwords.service.js';
import { SessionsService } from './sessions.service.js';

@ApiTags('auth')
@Controller('auth')
export class AuthController {
  constructor(
    private readonly auth: AuthService,
    private readonly sessions: SessionsService,
    private readonly passwords: PasswordsService,
    private readonly invitations: InvitationsService,
  ) {}

  @Post('sign-in')
  @HttpCode(200)
  @Public()
  signIn(@Body() body: SignInDto, @Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<AccessTokenDto> {
    return this.auth.signIn(body, request, response);
  }

  /** A new access token for the refresh cookie, which is renewed too; an old cookie ends the session. */
  @Post('refresh')
  @HttpCode(200)
  @Public()
  refresh(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<AccessTokenDto> {
    return this.auth.refresh(request, response);
  }

  @Post('sign-out')
  @HttpCode(204)
  @Public()
  signOut(@Req() request: Request, @Res({ passthrough: true }) response: Response): Promise<void> {
    return this.auth.signOut(request, response);
  }

  /** Answers the same whether the address is known or not. */
  @Post('password-reset')
  @HttpCode(202)
  @Public()
  requestReset(@Body() body: RequestPasswordResetDto, @Req() request: Request): Promise<void> {
    return this.passwords.requestReset(body, request);
  }

  @Post('password-reset/confirm')
  @HttpCode(204)
  @Public()
  confirmReset(@Body() body: SetPasswordDto, @Req() request: Request): Promise<void> {
    return this.passwords.confirmReset(body, request);
  }

  @Get('invitations/:token')
  @Public()
  invitation(@Param('token') token: string): Promise<InvitationDto> {
    return this.invitations.findOpen(token);
  }

  @Post('invitations/:token/accept')
  @HttpCode(200)
  @Public()
  acceptInvitation(
    @Param('token') token: string,
    @Body() body: AcceptInvitationDto,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<AccessTokenDto> {
    return this.invitations.accept(token, body, request, response);
  }

  @Get('me')
  @SignedIn()
  me(@CurrentActor() actor: Actor): Promise<MeDto> {
    return this.auth.me(actor);
  }

  @Post('password')
  @HttpCode(204)
  @SignedIn()
  changePassword(@CurrentActor() actor: Actor, @Body() body: ChangePasswordDto): Promise<void> {
    return this.passwords.change(actor, body);
  }

  @Get('sessions')
  @SignedIn()
  listSessions(@CurrentActor() actor: Actor): Promise<SessionListDto> {
    return this.sessions.findOwn(actor);
  }

  /** Ends all sessions but this one. */
  @Delete('sessions')
  @HttpCode(204)
  @SignedIn()
  endOthers(@CurrentActor() actor: Actor): Promise<void> {
    return this.sessions.endOthers(actor);
  }

  @Delete('sessions/:id')
  @HttpCode(204)
  @SignedIn()
  end(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<void> {
    return this.sessions.endOwn(actor, id);
  }
}
