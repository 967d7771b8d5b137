import 'reflect-metadata';
import { Logger } from '@nestjs/common';
import { NestFactory } from '@nestjs/core';
import { AppModule } from '../app.module.js';
import { databaseUrl } from '../shared/environment.js';
import { startWorker } from './worker.js';

/** Works off the queue until it is asked to stop; any number of these may run beside any number of servers. */
const app = await NestFactory.createApplicationContext(AppModule.forDatabase(databaseUrl()), { logger: ['warn', 'error', 'fatal'] });
const worker = await startWorker(app, databaseUrl());
let stopping = false;
for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP'] as const) {
  process.on(signal, () => {
    if (stopping) return;
    stopping = true;
    worker.stop().then(() => app.close()).then(() => process.exit(0), (error: unknown) => {
      new Logger('Worker').error(String(error));
      process.exit(1);
    });
  });
}
