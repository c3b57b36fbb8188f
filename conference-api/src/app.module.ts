import { Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD } from '@nestjs/core';
import { ScheduleModule } from '@nestjs/schedule';
import { AccessModule } from './access/access.module.js';
import { AuditModule } from './audit/audit.module.js';
import { AuthModule } from './auth/auth.module.js';
import { CalculatorsModule } from './calculators/calculators.module.js';
import { CasesModule } from './cases/cases.module.js';
import { AccessGuard } from './common/guards/access.guard.js';
import { ProblemFilter } from './common/problems/problem.filter.js';
import { ConferencesModule } from './conferences/conferences.module.js';
import { ConfigModule } from './config/config.module.js';
import { DatabaseModule } from './database/database.module.js';
import { DecisionsModule } from './decisions/decisions.module.js';
import { DiscussionsModule } from './discussions/discussions.module.js';
import { EventsModule } from './events/events.module.js';
import { HealthModule } from './health/health.module.js';
import { ImagesModule } from './images/images.module.js';
import { JobsModule } from './jobs/jobs.module.js';
import { MailModule } from './mail/mail.module.js';
import { MeetingsModule } from './meetings/meetings.module.js';
import { OutcomesModule } from './outcomes/outcomes.module.js';
import { PeopleModule } from './people/people.module.js';
import { RatingsModule } from './ratings/ratings.module.js';
import { StorageModule } from './storage/storage.module.js';

@Module({
  imports: [
    ConfigModule,
    DatabaseModule,
    ScheduleModule.forRoot(),
    AccessModule,
    StorageModule,
    MailModule,
    EventsModule,
    AuditModule,
    AuthModule,
    PeopleModule,
    ConferencesModule,
    CasesModule,
    ImagesModule,
    DiscussionsModule,
    RatingsModule,
    MeetingsModule,
    DecisionsModule,
    OutcomesModule,
    CalculatorsModule,
    JobsModule,
    HealthModule,
  ],
  providers: [
    { provide: APP_GUARD, useClass: AccessGuard },
    { provide: APP_FILTER, useClass: ProblemFilter },
  ],
})
export class AppModule {}
