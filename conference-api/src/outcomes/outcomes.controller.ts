import { Body, Controller, Get, Param, ParseUUIDPipe, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { OutcomeDto, OutcomeListDto, WriteOutcomeDto } from './dto/outcome.dto.js';
import { OutcomesService } from './outcomes.service.js';

@ApiTags('outcomes')
@Controller('cases/:caseId/outcomes')
export class OutcomesController {
  constructor(private readonly outcomes: OutcomesService) {}

  /** All versions, newest first. */
  @Get()
  @RequirePermission(Permission.CaseRead)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', ParseUUIDPipe) caseId: string): Promise<OutcomeListDto> {
    return this.outcomes.findOfCase(actor, caseId);
  }

  /** final → reported; later ones are amendments with a reason. */
  @Post()
  @RequirePermission(Permission.OutcomeWrite)
  write(@CurrentActor() actor: Actor, @Param('caseId', ParseUUIDPipe) caseId: string, @Body() body: WriteOutcomeDto): Promise<OutcomeDto> {
    return this.outcomes.write(actor, caseId, body);
  }
}
