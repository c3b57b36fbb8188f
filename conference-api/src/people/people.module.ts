import { Module } from '@nestjs/common';
import { PeopleController } from './people.controller.js';
import { PeopleService } from './people.service.js';
import { UnitsService } from './units.service.js';

@Module({
  controllers: [PeopleController],
  providers: [PeopleService, UnitsService],
  exports: [PeopleService, UnitsService],
})
export class PeopleModule {}
