import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission, SignedIn } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { InvitePersonDto, ListPeopleDto, PersonDto, PersonListDto, UnitDto, UnitListDto, UpdatePersonDto, WriteUnitDto } from './dto/people.dto.js';
import { PeopleInvitationsService } from './people-invitations.service.js';
import { PeopleService } from './people.service.js';
import { UnitsService } from './units.service.js';

@ApiTags('people')
@Controller()
export class PeopleController {
  constructor(
    private readonly people: PeopleService,
    private readonly invitations: PeopleInvitationsService,
    private readonly units: UnitsService,
  ) {}

  @Get('people')
  @RequirePermission(Permission.PeopleManage)
  find(@CurrentActor() actor: Actor, @Query() query: ListPeopleDto): Promise<PersonListDto> {
    return this.people.find(actor, query);
  }

  /** Makes the person and mails the invitation. */
  @Post('people/invitations')
  @RequirePermission(Permission.PeopleManage)
  invite(@CurrentActor() actor: Actor, @Body() body: InvitePersonDto): Promise<PersonDto> {
    return this.invitations.invite(actor, body);
  }

  @Get('people/:id')
  @RequirePermission(Permission.PeopleManage)
  findOne(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<PersonDto> {
    return this.people.findOne(actor, id);
  }

  @Patch('people/:id')
  @RequirePermission(Permission.PeopleManage)
  update(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: UpdatePersonDto): Promise<PersonDto> {
    return this.people.update(actor, id, body);
  }

  /** Mails a new invitation; the one before no longer works. */
  @Post('people/:id/invitation')
  @HttpCode(204)
  @RequirePermission(Permission.PeopleManage)
  inviteAgain(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<void> {
    return this.invitations.inviteAgain(actor, id);
  }

  @Get('units')
  @SignedIn()
  findUnits(): Promise<UnitListDto> {
    return this.units.findAll();
  }

  @Post('units')
  @RequirePermission(Permission.UnitsManage)
  createUnit(@CurrentActor() actor: Actor, @Body() body: WriteUnitDto): Promise<UnitDto> {
    return this.units.create(actor, body);
  }

  @Patch('units/:id')
  @RequirePermission(Permission.UnitsManage)
  updateUnit(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: WriteUnitDto): Promise<UnitDto> {
    return this.units.update(actor, id, body);
  }
}
