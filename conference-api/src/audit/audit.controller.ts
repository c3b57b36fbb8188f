import { Controller, Get, Param, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { PageQueryDto } from '../common/paging/page-query.dto.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { AuditService } from './audit.service.js';
import { AuditListDto, ListAuditDto } from './dto/audit.dto.js';

@ApiTags('audit')
@Controller()
export class AuditController {
  constructor(private readonly audit: AuditService) {}

  @Get('audit')
  @RequirePermission(Permission.AuditRead)
  find(@CurrentActor() actor: Actor, @Query() query: ListAuditDto): Promise<AuditListDto> {
    return this.audit.find(actor, query);
  }

  @Get('cases/:caseId/audit')
  @RequirePermission(Permission.CaseAudit)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Query() query: PageQueryDto): Promise<AuditListDto> {
    return this.audit.findOfCase(actor, caseId, query);
  }
}
