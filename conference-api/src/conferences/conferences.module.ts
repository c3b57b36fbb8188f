import { Module } from '@nestjs/common';
import { ConferenceAccessService } from './conference-access.service.js';
import { ConferencesController } from './conferences.controller.js';
import { ConferencesService } from './conferences.service.js';
import { MembershipsService } from './memberships.service.js';

@Module({
  controllers: [ConferencesController],
  providers: [ConferenceAccessService, ConferencesService, MembershipsService],
  exports: [ConferencesService, MembershipsService],
})
export class ConferencesModule {}
