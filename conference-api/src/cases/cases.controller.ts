import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { PageQueryDto } from '../common/paging/page-query.dto.js';
import { IdPipe, NumberPipe } from '../common/pipes/path-pipes.js';
import { CaseHistoryService } from './case-history.service.js';
import { CaseListService } from './case-list.service.js';
import { CaseStageService } from './case-stage.service.js';
import { CasesService } from './cases.service.js';
import {
  CaseDto,
  CaseListDto,
  CaseVersionListDto,
  CreateCaseDto,
  DifferencesDto,
  DifferencesQueryDto,
  IdentifierFindingsDto,
  PostCaseDto,
  ReadinessDto,
  ReleaseCaseDto,
  ReturnCaseDto,
  SaveCaseDto,
  SavedCaseDto,
  WithdrawCaseDto,
} from './dto/case.dto.js';
import { ListCasesDto } from './dto/list-cases.dto.js';

@ApiTags('cases')
@Controller('cases')
export class CasesController {
  constructor(
    private readonly cases: CasesService,
    private readonly list: CaseListService,
    private readonly stages: CaseStageService,
    private readonly history: CaseHistoryService,
  ) {}

  /** The cases that one may see, filtered, sorted and paged. */
  @Get()
  @RequirePermission(Permission.CaseRead)
  findVisible(@CurrentActor() actor: Actor, @Query() query: ListCasesDto): Promise<CaseListDto> {
    return this.list.findVisible(actor, query);
  }

  /** Begins a draft. */
  @Post()
  @RequirePermission(Permission.CaseCreate)
  create(@CurrentActor() actor: Actor, @Body() body: CreateCaseDto): Promise<CaseDto> {
    return this.cases.create(actor, body);
  }

  @Get(':id')
  @RequirePermission(Permission.CaseRead)
  findOne(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<CaseDto> {
    return this.cases.findOne(actor, id);
  }

  /** Saves sections as they are typed; refused with what changed where the base version is an older one. */
  @Patch(':id')
  @RequirePermission(Permission.CaseWrite)
  save(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: SaveCaseDto): Promise<SavedCaseDto> {
    return this.cases.save(actor, id, body);
  }

  /** What is there, what is missing, what blocks. */
  @Get(':id/readiness')
  @RequirePermission(Permission.CaseRead)
  readiness(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<ReadinessDto> {
    return this.cases.readiness(actor, id);
  }

  /** What looks like an identifier in the text. */
  @Get(':id/identifiers')
  @RequirePermission(Permission.CaseRead)
  identifiers(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<IdentifierFindingsDto> {
    return this.cases.identifiers(actor, id);
  }

  /** draft → checking */
  @Post(':id/post')
  @HttpCode(200)
  @RequirePermission(Permission.CaseWrite)
  post(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: PostCaseDto): Promise<CaseDto> {
    return this.stages.post(actor, id, body);
  }

  /** checking → open: a second person found no identifiers. */
  @Post(':id/release')
  @HttpCode(200)
  @RequirePermission(Permission.CaseCheck)
  release(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: ReleaseCaseDto): Promise<CaseDto> {
    return this.stages.release(actor, id, body);
  }

  /** checking → draft, with what to mend. */
  @Post(':id/return')
  @HttpCode(200)
  @RequirePermission(Permission.CaseCheck)
  return(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: ReturnCaseDto): Promise<{ returned: boolean }> {
    return this.stages.return(actor, id, body);
  }

  /** Any stage before decided → withdrawn. */
  @Post(':id/withdraw')
  @HttpCode(200)
  @RequirePermission(Permission.CaseWithdraw)
  withdraw(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: WithdrawCaseDto): Promise<CaseDto> {
    return this.stages.withdraw(actor, id, body);
  }

  @Get(':id/versions')
  @RequirePermission(Permission.CaseRead)
  versions(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Query() query: PageQueryDto): Promise<CaseVersionListDto> {
    return this.history.versions(actor, id, query);
  }

  /** What a version changed, against the one before or against `since`. */
  @Get(':id/versions/:version/differences')
  @RequirePermission(Permission.CaseRead)
  differences(
    @CurrentActor() actor: Actor,
    @Param('id', IdPipe) id: string,
    @Param('version', NumberPipe) version: number,
    @Query() query: DifferencesQueryDto,
  ): Promise<DifferencesDto> {
    return this.history.differences(actor, id, version, query.since);
  }
}
