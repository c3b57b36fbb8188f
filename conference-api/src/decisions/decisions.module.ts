import { Module } from '@nestjs/common';
import { AuthModule } from '../auth/auth.module.js';
import { CircumstancesService } from './circumstances.service.js';
import { DecisionsController } from './decisions.controller.js';
import { DecisionsService } from './decisions.service.js';
import { FinalDecisionsService } from './final-decisions.service.js';
import { SigningService } from './signing.service.js';

@Module({
  imports: [AuthModule],
  controllers: [DecisionsController],
  providers: [DecisionsService, SigningService, FinalDecisionsService, CircumstancesService],
  exports: [DecisionsService, SigningService, FinalDecisionsService],
})
export class DecisionsModule {}
