import { Module } from '@nestjs/common';
import { RatingsController } from './ratings.controller.js';
import { RatingsService } from './ratings.service.js';
import { RoundsService } from './rounds.service.js';

@Module({
  controllers: [RatingsController],
  providers: [RatingsService, RoundsService],
  exports: [RatingsService, RoundsService],
})
export class RatingsModule {}
