import { Global, Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { Settings } from '../config/settings.js';
import { dataSourceOptions } from './data-source.js';
import { UnitOfWork } from './unit-of-work.js';

@Global()
@Module({
  imports: [
    TypeOrmModule.forRootAsync({
      inject: [Settings],
      useFactory: (settings: Settings) => ({ ...dataSourceOptions(settings.databaseUrl), retryAttempts: 30, retryDelay: 1000 }),
    }),
  ],
  providers: [UnitOfWork],
  exports: [UnitOfWork],
})
export class DatabaseModule {}
