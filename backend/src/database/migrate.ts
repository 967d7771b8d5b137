import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { databaseUrl } from '../shared/environment.js';
import { dataSourceOptions } from './data-source-options.js';
import { migrateQueue } from './migrate-queue.js';
import { seedCatalogue } from './seed-catalogue.js';

/** Brings the database up to date: schema, the queue's tables, the section catalogue. Safe to run at every start. */
const dataSource = await new DataSource(dataSourceOptions(databaseUrl())).initialize();
try {
  const done = await dataSource.runMigrations({ transaction: 'all' });
  await migrateQueue(databaseUrl());
  const sections = await seedCatalogue(dataSource);
  console.log(`Database is current: ${done.length} migration(s) run, ${sections} catalogue section(s) added or changed.`);
} finally {
  await dataSource.destroy();
}
