import { Module } from '@nestjs/common';
import { DecisionsController } from './decisions.controller.js';
import { DecisionsService } from './decisions.service.js';
import { SigningService } from './signing.service.js';
import { FinalDecisionsService } from './final-decisions.service.js';

@Module({
  controllers: [DecisionsController],
  providers: [DecisionsService, SigningService, FinalDecisionsService],
  exports: [DecisionsService, SigningService, FinalDecisionsService],
})
export class DecisionsModule {}
