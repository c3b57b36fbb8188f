import { Global, Module } from '@nestjs/common';
import { ConfigModule as NestConfigModule, ConfigService } from '@nestjs/config';
import { readSettings, Settings, withEnvFile } from './settings.js';

/** Gives the validated `Settings` to everyone. */
@Global()
@Module({
  imports: [
    NestConfigModule.forRoot({
      ignoreEnvFile: true,
      load: [() => ({ settings: readSettings(withEnvFile(process.env, '.env')) })],
    }),
  ],
  providers: [{ provide: Settings, inject: [ConfigService], useFactory: (config: ConfigService) => config.getOrThrow('settings') }],
  exports: [Settings],
})
export class ConfigModule {}
