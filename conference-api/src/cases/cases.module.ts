import { Module } from '@nestjs/common';
import { CasesController } from './cases.controller.js';
import { CasesService } from './cases.service.js';
import { CaseListService } from './case-list.service.js';
import { CaseStageService } from './case-stage.service.js';
import { CaseHistoryService } from './case-history.service.js';

@Module({
  controllers: [CasesController],
  providers: [CasesService, CaseListService, CaseStageService, CaseHistoryService],
  exports: [CasesService, CaseListService, CaseStageService, CaseHistoryService],
})
export class CasesModule {}
