import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { DataSource } from 'typeorm';
import { AppModule } from '../../app.module.js';
import { Settings } from '../../config/settings.js';
import { Person } from '../../people/entities/person.entity.js';
import { drawDemoImages } from './demo-images.js';
import { DemoStory } from './demo-story.js';

// Fills an empty database with the invented demo; a database with anybody in it is left alone.
process.env['KERFSIDE_JOBS'] = 'false';
const app = await NestFactory.createApplicationContext(AppModule, { logger: ['error', 'warn'] });
try {
  if (await app.get(DataSource).manager.count(Person)) {
    console.log('The database holds people already: the demo was not put in.');
  } else {
    const accounts = JSON.parse(readFileSync(new URL('./demo-accounts.json', import.meta.url), 'utf8')) as { password: string };
    const projectFolder = join(import.meta.dirname, '../../../..');
    const images = await drawDemoImages(projectFolder, join(app.get(Settings).dataFolder, 'demo-images'));
    const { people, cases } = await new DemoStory(app, images, accounts.password).tell();
    console.log(`The demo is in: ${people} people, ${cases} cases, ${images.length} pictures.`);
  }
} finally {
  await app.close();
}
