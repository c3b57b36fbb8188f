import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { OutcomeDto, OutcomeListDto, WriteOutcomeDto } from './dto/outcome.dto.js';
import { OutcomesService } from './outcomes.service.js';

@ApiTags('outcomes')
@Controller('cases/:caseId/outcomes')
export class OutcomesController {
  constructor(private readonly outcomes: OutcomesService) {}

  /** All versions, newest first. */
  @Get()
  @RequirePermission(Permission.CaseRead)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<OutcomeListDto> {
    return this.outcomes.findOfCase(actor, caseId);
  }

  /** final → reported; later ones are amendments with a reason. */
  @Post()
  @RequirePermission(Permission.OutcomeWrite)
  write(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Body() body: WriteOutcomeDto): Promise<OutcomeDto> {
    return this.outcomes.write(actor, caseId, body);
  }
}
