import { criticalTemperatureBasisSchema } from '@mantlet/common';
import { DataSource } from 'typeorm';
import { createTestDatabase } from '../../test/support/database.js';
import { dataSourceOptions } from './data-source-options.js';
import { DescribedBeams1764633900000 } from './migrations/1764633900000-described-beams.js';
import { migrations } from './migrations/index.js';

/** TypeORM reads the standing schema with queries that overlap on one connection, which the driver is about to give up: in turn, then. */
function readInTurn(dataSource: DataSource): void {
  const create = dataSource.createQueryRunner.bind(dataSource);
  dataSource.createQueryRunner = (mode) => {
    const runner = create(mode);
    const query = runner.query.bind(runner) as (...given: unknown[]) => Promise<unknown>;
    let last: Promise<unknown> = Promise.resolve();
    runner.query = ((...given: unknown[]) => (last = last.catch(() => undefined).then(() => query(...given)))) as typeof runner.query;
    return runner;
  };
}

describe('migrations', () => {
  it('leave the schema as the entities describe it, and can be undone', async () => {
    const database = await createTestDatabase();
    const dataSource = await new DataSource(dataSourceOptions(database.url)).initialize();
    try {
      await dataSource.runMigrations();
      readInTurn(dataSource);
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

  it('give members calculated before beams could be described what the contract now holds', async () => {
    const database = await createTestDatabase();
    const dataSource = await new DataSource(dataSourceOptions(database.url)).initialize();
    try {
      await dataSource.runMigrations();
      // back to before described beams, whatever came since
      for (const _ of migrations.slice(migrations.indexOf(DescribedBeams1764633900000))) await dataSource.undoLastMigration();
      const design = { bucklingLengthYMm: 3000, bucklingLengthZMm: null, bucklingRule: 'given', lateralRestraint: 'continuous', continuousBeam: true, composite: false, webOpenings: false };
      const effects = { axialKn: 1, momentYKnm: 2, shearZKn: 3 };
      const bases = [
        { way: 'calculated', reference: 'r', design: { ...design, actions: { given: 'fire-effect', effect: effects } } },
        { way: 'calculated', reference: 'r', design: { ...design, actions: { given: 'characteristic', permanent: effects, leading: { ...effects, category: 'B' }, accompanying: [{ ...effects, category: 'wind' }] } } },
        { way: 'calculated', reference: 'r', design: { ...design, actions: { given: 'characteristic', permanent: effects, leading: null, accompanying: [] } } },
        { way: 'declared', temperatureC: 560, reference: 'r' },
      ];
      const column = bases[0]!;
      // only the members matter here: what they would point at is left out
      const keys: { name: string }[] = await dataSource.query(`SELECT conname AS name FROM pg_constraint WHERE conrelid = 'members'::regclass AND contype = 'f'`);
      for (const { name } of keys) await dataSource.query(`ALTER TABLE members DROP CONSTRAINT "${name}"`);
      for (const [i, basis] of [...bases, column].entries()) {
        await dataSource.query(
          `INSERT INTO members (project_id, zone_id, mark, member_type, section_id, grade, length_mm, quantity, exposure, protection_form, basis, version)
           VALUES (gen_random_uuid(), gen_random_uuid(), $1, $3, gen_random_uuid(), 'S355', 6000, 1, '{}', 'profile', $2, 1)`, [`M${i}`, JSON.stringify(basis), i < bases.length ? 'beam' : 'column']);
      }
      await dataSource.runMigrations();
      const stored: { basis: unknown }[] = await dataSource.query('SELECT basis FROM members ORDER BY mark');
      // that a beam is held along its length was asked; of a column it was not
      const asked = { ...column, design: { ...design, lateralRestraint: null, actions: { given: 'fire-effect', effect: effects } } };
      expect(stored.map(({ basis }) => basis)).toEqual([...bases, asked].map((basis) => criticalTemperatureBasisSchema.parse(basis)));
    } finally {
      await dataSource.destroy();
      await database.drop();
    }
  });
});
