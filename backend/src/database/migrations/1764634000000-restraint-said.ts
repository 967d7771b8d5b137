import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * Columns, bracing and ties bore "held along its length" only because it was the default that nobody was asked about. Now it decides
 * whether they may buckle sideways when bent, so that it counts as not said until somebody says it.
 */
export class RestraintSaid1764634000000 implements MigrationInterface {
  name = 'RestraintSaid1764634000000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design,lateralRestraint}', 'null') WHERE basis->>'way' = 'calculated' AND member_type NOT IN ('beam', 'secondary-beam') AND basis #>> '{design,lateralRestraint}' = 'continuous'`);
  }

  /** Readers of before know no restraint that is not said. */
  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design,lateralRestraint}', '"continuous"') WHERE basis->>'way' = 'calculated' AND basis #> '{design,lateralRestraint}' = 'null'`);
  }
}
