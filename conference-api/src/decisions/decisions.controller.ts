import { Body, Controller, Get, HttpCode, Param, Post, Put, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { PageQueryDto } from '../common/paging/page-query.dto.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { DecisionsService } from './decisions.service.js';
import {
  AmendDecisionDto,
  DecisionCheckDto,
  DecisionDto,
  DecisionListDto,
  DecisionSummaryListDto,
  FinalDecisionDto,
  FinalDecisionListDto,
  SignDecisionDto,
  WriteDecisionDto,
  WriteFinalDecisionDto,
} from './dto/decision.dto.js';
import { FinalDecisionsService } from './final-decisions.service.js';
import { SigningService } from './signing.service.js';

@ApiTags('decisions')
@Controller()
export class DecisionsController {
  constructor(
    private readonly decisions: DecisionsService,
    private readonly signing: SigningService,
    private readonly finals: FinalDecisionsService,
  ) {}

  /** All versions, newest first. */
  @Get('cases/:caseId/decisions')
  @RequirePermission(Permission.DecisionRead)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<DecisionListDto> {
    return this.decisions.findOfCase(actor, caseId);
  }

  /** Saves the draft; begins one from the rounds where there is none. */
  @Put('cases/:caseId/decision')
  @RequirePermission(Permission.DecisionWrite)
  write(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Body() body: WriteDecisionDto): Promise<DecisionDto> {
    return this.decisions.write(actor, caseId, body);
  }

  /** Signs the draft by giving the password again; from then on it can't be changed. */
  @Post('cases/:caseId/decision/sign')
  @HttpCode(200)
  @RequirePermission(Permission.DecisionWrite)
  sign(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Body() body: SignDecisionDto): Promise<DecisionDto> {
    return this.signing.sign(actor, caseId, body);
  }

  /** Begins a new version that will replace the signed one. */
  @Post('decisions/:id/amend')
  @RequirePermission(Permission.DecisionWrite)
  amend(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: AmendDecisionDto): Promise<DecisionDto> {
    return this.decisions.amend(actor, id, body);
  }

  @Get('decisions/:id')
  @RequirePermission(Permission.DecisionRead)
  findOne(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<DecisionDto> {
    return this.decisions.findOne(actor, id);
  }

  /** Computes the fingerprints of the conference's chain again. */
  @Get('decisions/:id/check')
  @RequirePermission(Permission.DecisionRead)
  check(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<DecisionCheckDto> {
    return this.signing.check(actor, id);
  }

  @Get('conferences/:conferenceId/decisions')
  @RequirePermission(Permission.DecisionRead)
  findOfConference(
    @CurrentActor() actor: Actor,
    @Param('conferenceId', IdPipe) conferenceId: string,
    @Query() query: PageQueryDto,
  ): Promise<DecisionSummaryListDto> {
    return this.decisions.findOfConference(actor, conferenceId, query);
  }

  @Get('cases/:caseId/final-decisions')
  @RequirePermission(Permission.DecisionRead)
  finalsOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<FinalDecisionListDto> {
    return this.finals.findOfCase(actor, caseId);
  }

  /** decided → final; later ones are new versions. */
  @Post('cases/:caseId/final-decisions')
  @RequirePermission(Permission.FinalDecisionWrite)
  writeFinal(
    @CurrentActor() actor: Actor,
    @Param('caseId', IdPipe) caseId: string,
    @Body() body: WriteFinalDecisionDto,
  ): Promise<FinalDecisionDto> {
    return this.finals.write(actor, caseId, body);
  }
}
