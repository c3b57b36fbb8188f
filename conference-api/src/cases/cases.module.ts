import { Module } from '@nestjs/common';
import { DiscussionsModule } from '../discussions/discussions.module.js';
import { ImagesModule } from '../images/images.module.js';
import { RatingsModule } from '../ratings/ratings.module.js';
import { CaseFiguresService } from './case-figures.service.js';
import { CaseHistoryService } from './case-history.service.js';
import { CaseListService } from './case-list.service.js';
import { CaseMailsService } from './case-mails.service.js';
import { CaseSavingService } from './case-saving.service.js';
import { CaseStageService } from './case-stage.service.js';
import { CaseViewService } from './case-view.service.js';
import { CasesController } from './cases.controller.js';
import { CasesService } from './cases.service.js';

@Module({
  imports: [DiscussionsModule, ImagesModule, RatingsModule],
  controllers: [CasesController],
  providers: [
    CasesService,
    CaseSavingService,
    CaseListService,
    CaseFiguresService,
    CaseStageService,
    CaseMailsService,
    CaseHistoryService,
    CaseViewService,
  ],
  exports: [CasesService, CaseListService, CaseStageService, CaseHistoryService],
})
export class CasesModule {}
