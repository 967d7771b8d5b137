import { DataSource } from 'typeorm';
import { createTestDatabase } from '../../test/support/database.js';
import { dataSourceOptions } from './data-source-options.js';
import { migrations } from './migrations/index.js';

describe('migrations', () => {
  it('leave the schema as the entities describe it, and can be undone', async () => {
    const database = await createTestDatabase();
    const dataSource = await new DataSource(dataSourceOptions(database.url)).initialize();
    try {
      await dataSource.runMigrations();
      const drift = await dataSource.driver.createSchemaBuilder().log();
      expect(drift.upQueries.map((q) => q.query)).toEqual([]);
      for (const _ of migrations) await dataSource.undoLastMigration();
      const tables: { n: string }[] = await dataSource.query(
        `SELECT count(*) AS n FROM information_schema.tables WHERE table_schema = 'public' AND table_name NOT IN ('migrations', 'typeorm_metadata')`,
      );
      expect(tables[0]?.n).toBe('0');
    } finally {
      await dataSource.destroy();
      await database.drop();
    }
  });
});
