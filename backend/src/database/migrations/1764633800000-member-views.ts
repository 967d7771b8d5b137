import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Lists of members that people keep for themselves. */
export class MemberViews1764633800000 implements MigrationInterface {
  name = 'MemberViews1764633800000';

  async up(runner: QueryRunner): Promise<void> {
    for (const statement of tables) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE member_views');
  }
}

const tables = [
  `CREATE TABLE "member_views" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "user_id" uuid NOT NULL, "name" text COLLATE "natural" NOT NULL, "query" text NOT NULL, CONSTRAINT "member_views_name" UNIQUE ("project_id", "user_id", "name"), CONSTRAINT "PK_b3a7fbedb751066488e2b7cc1bd" PRIMARY KEY ("id"))`,
  `ALTER TABLE "member_views" ADD CONSTRAINT "FK_1f1aa34d8b991f90389f14d75e8" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "member_views" ADD CONSTRAINT "FK_17fd1bad491a3ec5b27dd58a6d5" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
];
