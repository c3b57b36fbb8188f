import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { writeFileSync } from 'node:fs';
import { AppModule } from './app.module.js';
import { openApiDocument } from './openapi-document.js';

// Writes openapi.json without starting anything: `preview` builds the routes but no provider.
const app = await NestFactory.create(AppModule, { preview: true, logger: false });
app.setGlobalPrefix('api');
const target = process.argv[2] ?? 'openapi.json';
writeFileSync(target, `${JSON.stringify(openApiDocument(app), null, 2)}\n`);
process.exit(0);
