import type { PostgresDataSourceOptions } from 'typeorm/driver/postgres/PostgresDataSourceOptions.js';
import { entities } from './entities.js';
import { migrations } from './migrations/index.js';
import { SnakeNamingStrategy } from './naming-strategy.js';

/** The one description of the connection; the schema only ever changes by migration. */
export function dataSourceOptions(url: string): PostgresDataSourceOptions {
  return {
    type: 'postgres',
    url,
    entities,
    migrations,
    namingStrategy: new SnakeNamingStrategy(),
    synchronize: false,
    migrationsRun: false,
    migrationsTransactionMode: 'all',
    uuidExtension: 'pgcrypto',
    installExtensions: false,
    extra: { max: 10, statement_timeout: 120_000 },
  };
}
