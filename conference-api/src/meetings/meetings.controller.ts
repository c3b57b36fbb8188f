import { Body, Controller, Get, HttpCode, Param, Patch, Post, Put, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission, SignedIn } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { AgendaService } from './agenda.service.js';
import {
  AgendaSentDto,
  CancelMeetingDto,
  CreateMeetingDto,
  DeferItemDto,
  ListableCasesDto,
  ListMeetingsDto,
  MeetingDto,
  MeetingListDto,
  SendAgendaDto,
  SetAgendaDto,
  SetAttendanceDto,
  UpdateMeetingDto,
} from './dto/meeting.dto.js';
import { ListableCasesService } from './listable-cases.service.js';
import { MeetingRunService } from './meeting-run.service.js';
import { MeetingsService } from './meetings.service.js';

@ApiTags('meetings')
@Controller()
export class MeetingsController {
  constructor(
    private readonly meetings: MeetingsService,
    private readonly agenda: AgendaService,
    private readonly run: MeetingRunService,
    private readonly listableCases: ListableCasesService,
  ) {}

  /** Meetings of all conferences one belongs to. */
  @Get('meetings')
  @SignedIn()
  findForMember(@CurrentActor() actor: Actor, @Query() query: ListMeetingsDto): Promise<MeetingListDto> {
    return this.meetings.findForMember(actor, query);
  }

  @Get('conferences/:conferenceId/meetings')
  @RequirePermission(Permission.AgendaRead)
  findOfConference(
    @CurrentActor() actor: Actor,
    @Param('conferenceId', IdPipe) conferenceId: string,
    @Query() query: ListMeetingsDto,
  ): Promise<MeetingListDto> {
    return this.meetings.findOfConference(actor, conferenceId, query);
  }

  /** A meeting outside the slot. */
  @Post('conferences/:conferenceId/meetings')
  @RequirePermission(Permission.AgendaWrite)
  create(
    @CurrentActor() actor: Actor,
    @Param('conferenceId', IdPipe) conferenceId: string,
    @Body() body: CreateMeetingDto,
  ): Promise<MeetingDto> {
    return this.meetings.create(actor, conferenceId, body);
  }

  @Get('meetings/:id')
  @RequirePermission(Permission.AgendaRead)
  findOne(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<MeetingDto> {
    return this.meetings.findOne(actor, id);
  }

  /** Moves a meeting that has not begun. */
  @Patch('meetings/:id')
  @RequirePermission(Permission.AgendaWrite)
  move(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: UpdateMeetingDto): Promise<MeetingDto> {
    return this.meetings.move(actor, id, body);
  }

  @Post('meetings/:id/cancel')
  @HttpCode(200)
  @RequirePermission(Permission.AgendaWrite)
  cancel(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: CancelMeetingDto): Promise<MeetingDto> {
    return this.meetings.cancel(actor, id, body);
  }

  /** Open cases that could be listed, with what is missing. */
  @Get('meetings/:id/listable-cases')
  @RequirePermission(Permission.AgendaWrite)
  listable(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<ListableCasesDto> {
    return this.listableCases.find(actor, id);
  }

  /** The whole agenda at once: cases, minutes, order. */
  @Put('meetings/:id/agenda')
  @RequirePermission(Permission.AgendaWrite)
  setAgenda(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: SetAgendaDto): Promise<MeetingDto> {
    return this.agenda.set(actor, id, body);
  }

  /** Sends it to all members; an unchanged one is not sent twice. */
  @Post('meetings/:id/agenda/send')
  @HttpCode(200)
  @RequirePermission(Permission.AgendaWrite)
  sendAgenda(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: SendAgendaDto): Promise<AgendaSentDto> {
    return this.agenda.send(actor, id, body);
  }

  @Post('meetings/:id/start')
  @HttpCode(200)
  @RequirePermission(Permission.MeetingRun)
  start(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<MeetingDto> {
    return this.run.start(actor, id);
  }

  @Post('meetings/:id/close')
  @HttpCode(200)
  @RequirePermission(Permission.MeetingRun)
  close(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<MeetingDto> {
    return this.run.close(actor, id);
  }

  @Put('meetings/:id/attendance/:personId')
  @RequirePermission(Permission.AttendanceWrite)
  setAttendance(
    @CurrentActor() actor: Actor,
    @Param('id', IdPipe) id: string,
    @Param('personId', IdPipe) personId: string,
    @Body() body: SetAttendanceDto,
  ): Promise<MeetingDto> {
    return this.run.setAttendance(actor, id, personId, body.state);
  }

  /** The case goes back to open, for a later meeting. */
  @Post('meetings/:id/items/:itemId/defer')
  @HttpCode(200)
  @RequirePermission(Permission.MeetingRun)
  defer(
    @CurrentActor() actor: Actor,
    @Param('id', IdPipe) id: string,
    @Param('itemId', IdPipe) itemId: string,
    @Body() body: DeferItemDto,
  ): Promise<MeetingDto> {
    return this.run.defer(actor, id, itemId, body);
  }
}
