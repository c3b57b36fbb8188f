import { type LogLevel } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import { SwaggerModule } from '@nestjs/swagger';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { AppModule } from './app.module.js';
import { setUp } from './app.setup.js';
import { Settings } from './config/settings.js';
import { openApiDocument } from './openapi-document.js';

const LEVELS: Record<string, LogLevel[]> = {
  debug: ['fatal', 'error', 'warn', 'log', 'debug'],
  info: ['fatal', 'error', 'warn', 'log'],
  warn: ['fatal', 'error', 'warn'],
};

const app = await NestFactory.create<NestExpressApplication>(AppModule, {
  bodyParser: false,
  logger: LEVELS[process.env['KERFSIDE_LOG'] ?? 'info'] ?? LEVELS['info'],
});
setUp(app);
SwaggerModule.setup('api/docs', app, () => openApiDocument(app), { ui: false, raw: ['json'], jsonDocumentUrl: 'api/openapi.json' });
const settings = app.get(Settings);
await app.listen(settings.port, settings.host);
console.log(`conference-api listens on ${settings.host}:${settings.port}`);
