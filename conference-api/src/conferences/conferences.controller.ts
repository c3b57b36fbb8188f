import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission, SignedIn } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { ConferencesService } from './conferences.service.js';
import { ConferenceDto, ConferenceListDto, CreateConferenceDto, MemberListDto, SetMembershipDto, UpdateConferenceDto } from './dto/conference.dto.js';
import { MembershipsService } from './memberships.service.js';

@ApiTags('conferences')
@Controller('conferences')
export class ConferencesController {
  constructor(
    private readonly conferences: ConferencesService,
    private readonly memberships: MembershipsService,
  ) {}

  /** Those one belongs to; all for an administrator. */
  @Get()
  @SignedIn()
  find(@CurrentActor() actor: Actor): Promise<ConferenceListDto> {
    return this.conferences.findForActor(actor);
  }

  @Post()
  @RequirePermission(Permission.ConferencesManage)
  create(@CurrentActor() actor: Actor, @Body() body: CreateConferenceDto): Promise<ConferenceDto> {
    return this.conferences.create(actor, body);
  }

  /** A member, or an administrator. */
  @Get(':id')
  @SignedIn()
  findOne(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<ConferenceDto> {
    return this.conferences.findOne(actor, id);
  }

  /** Slot and rules: the chair or an administrator. The name: an administrator. */
  @Patch(':id')
  @SignedIn()
  update(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: UpdateConferenceDto): Promise<ConferenceDto> {
    return this.conferences.update(actor, id, body);
  }

  /** A member, or an administrator. */
  @Get(':id/members')
  @SignedIn()
  members(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<MemberListDto> {
    return this.memberships.findOfConference(actor, id);
  }

  @Put(':id/members/:personId')
  @HttpCode(204)
  @RequirePermission(Permission.ConferencesManage)
  setMember(
    @CurrentActor() actor: Actor,
    @Param('id', IdPipe) id: string,
    @Param('personId', IdPipe) personId: string,
    @Body() body: SetMembershipDto,
  ): Promise<void> {
    return this.memberships.set(actor, id, personId, body.role);
  }

  @Delete(':id/members/:personId')
  @HttpCode(204)
  @RequirePermission(Permission.ConferencesManage)
  removeMember(
    @CurrentActor() actor: Actor,
    @Param('id', IdPipe) id: string,
    @Param('personId', IdPipe) personId: string,
  ): Promise<void> {
    return this.memberships.remove(actor, id, personId);
  }
}
