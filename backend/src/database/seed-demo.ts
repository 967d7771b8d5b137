import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { AppModule } from '../app.module.js';
import { databaseUrl } from '../shared/environment.js';
import { loadDemo } from './demo/load-demo.js';

/** Loads the invented demo scenario into a migrated database; safe to run again, also after a load that was cut off. */
const app = await NestFactory.createApplicationContext(AppModule.forDatabase(databaseUrl()), { logger: ['warn', 'error', 'fatal'] });
try {
  console.log(await loadDemo(app));
} finally {
  await app.close();
}
