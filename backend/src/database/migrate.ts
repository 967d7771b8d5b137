import 'reflect-metadata';
import { DataSource } from 'typeorm';
import { databaseUrl } from '../shared/environment.js';
import { dataSourceOptions } from './data-source-options.js';
import { seedCatalogue } from './seed-catalogue.js';

/** Brings the database up to date: schema, then the section catalogue. Safe to run at every start. */
const dataSource = await new DataSource(dataSourceOptions(databaseUrl())).initialize();
try {
  const done = await dataSource.runMigrations({ transaction: 'all' });
  const sections = await seedCatalogue(dataSource);
  console.log(`Database is current: ${done.length} migration(s) run, ${sections} catalogue section(s) added or changed.`);
} finally {
  await dataSource.destroy();
}
