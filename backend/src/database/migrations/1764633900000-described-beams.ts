import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * Members calculated before beams could be described and bent about both axes get what the contract now holds, with the values that
 * mean what was calculated then: no moment about z, held as it was, a uniform moment.
 */
export class DescribedBeams1764633900000 implements MigrationInterface {
  name = 'DescribedBeams1764633900000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design}', $1::jsonb || (basis->'design')) WHERE basis->>'way' = 'calculated'`, [JSON.stringify(design)]);
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design,actions,effect}', '{"momentZKnm":0}'::jsonb || (basis #> '{design,actions,effect}')) WHERE basis #>> '{design,actions,given}' = 'fire-effect'`);
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design,actions,permanent}', '{"momentZKnm":0}'::jsonb || (basis #> '{design,actions,permanent}')) WHERE basis #>> '{design,actions,given}' = 'characteristic'`);
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design,actions,leading}', '{"momentZKnm":0}'::jsonb || (basis #> '{design,actions,leading}')) WHERE jsonb_typeof(basis #> '{design,actions,leading}') = 'object'`);
    await runner.query(`UPDATE members SET basis = jsonb_set(basis, '{design,actions,accompanying}', (SELECT coalesce(jsonb_agg('{"momentZKnm":0}'::jsonb || one ORDER BY place), '[]') FROM jsonb_array_elements(basis #> '{design,actions,accompanying}') WITH ORDINALITY AS each(one, place))) WHERE jsonb_typeof(basis #> '{design,actions,accompanying}') = 'array'`);
  }

  /** Nothing to take back: readers of before leave what they do not know alone. */
  async down(): Promise<void> {}
}

const design = { lateralSpacingMm: null, momentShapeY: { kind: 'end-moments', ratio: 1 }, momentShapeZ: { kind: 'end-moments', ratio: 1 }, loadHeight: 'top-flange' };
