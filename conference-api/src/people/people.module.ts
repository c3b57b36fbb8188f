import { Module } from '@nestjs/common';
import { AuthModule } from '../auth/auth.module.js';
import { PeopleController } from './people.controller.js';
import { PeopleInvitationsService } from './people-invitations.service.js';
import { PeopleService } from './people.service.js';
import { UnitsService } from './units.service.js';

@Module({
  imports: [AuthModule],
  controllers: [PeopleController],
  providers: [PeopleService, PeopleInvitationsService, UnitsService],
  exports: [PeopleService, UnitsService],
})
export class PeopleModule {}
