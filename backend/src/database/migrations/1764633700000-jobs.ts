import type { MigrationInterface, QueryRunner } from 'typeorm';

const build = [
  `CREATE TABLE "jobs" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "kind" text NOT NULL, "state" text NOT NULL DEFAULT 'waiting', "total" integer NOT NULL DEFAULT '0', "done" integer NOT NULL DEFAULT '0', "reason" jsonb, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "started_at" TIMESTAMP WITH TIME ZONE, "finished_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "jobs_state" CHECK (state IN ('waiting', 'running', 'failed', 'done')), CONSTRAINT "PK_cf0a6c42b72fcc7f7c237def345" PRIMARY KEY ("id"))`,
  `CREATE INDEX "jobs_by_project" ON "jobs"  ("project_id", "created_at")`,
  `CREATE UNIQUE INDEX "jobs_one_unfinished" ON "jobs"  ("project_id", "kind") WHERE state <> 'done'`,
  `ALTER TABLE "jobs" ADD CONSTRAINT "FK_570051510a95166a699cd7dafd5" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  // whoever listens on behalf of somebody looks anew at what they may see
  `CREATE FUNCTION announce_access() RETURNS trigger LANGUAGE plpgsql AS $$
   BEGIN PERFORM pg_notify('mantlet_access', ''); RETURN NULL; END $$`,
  `CREATE TRIGGER session_announces AFTER DELETE ON "session" FOR EACH STATEMENT EXECUTE FUNCTION announce_access()`,
  `CREATE TRIGGER memberships_announce AFTER UPDATE OR DELETE ON memberships FOR EACH STATEMENT EXECUTE FUNCTION announce_access()`,
  `CREATE TRIGGER users_announce AFTER UPDATE OF disabled ON users FOR EACH STATEMENT EXECUTE FUNCTION announce_access()`,
];

const undo = [
  `DROP TABLE jobs`,
  `DROP TRIGGER users_announce ON users`,
  `DROP TRIGGER memberships_announce ON memberships`,
  `DROP TRIGGER session_announces ON "session"`,
  `DROP FUNCTION announce_access`,
];

export class Jobs1764633700000 implements MigrationInterface {
  async up(queryRunner: QueryRunner): Promise<void> {
    for (const statement of build) await queryRunner.query(statement);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    for (const statement of undo) await queryRunner.query(statement);
  }
}
