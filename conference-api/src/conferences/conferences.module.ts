import { Module } from '@nestjs/common';
import { ConferencesController } from './conferences.controller.js';
import { ConferencesService } from './conferences.service.js';
import { MembershipsService } from './memberships.service.js';

@Module({
  controllers: [ConferencesController],
  providers: [ConferencesService, MembershipsService],
  exports: [ConferencesService, MembershipsService],
})
export class ConferencesModule {}
