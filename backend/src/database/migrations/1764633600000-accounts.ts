import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Accounts begin by invitation and have no password until it is accepted; what is mailed leaves a trace, links are kept as digests. */
const make = [
  `ALTER TABLE "users" ALTER COLUMN "password_hash" DROP NOT NULL`,
  `CREATE TABLE "account_links" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "user_id" uuid NOT NULL, "purpose" text NOT NULL, "token_hash" text NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "expires_at" TIMESTAMP WITH TIME ZONE NOT NULL, "used_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "account_links_token" UNIQUE ("token_hash"), CONSTRAINT "account_links_purpose" CHECK (purpose IN ('invitation', 'password-reset')), CONSTRAINT "account_links_id" PRIMARY KEY ("id"))`,
  `CREATE INDEX "account_links_by_user" ON "account_links" ("user_id")`,
  `ALTER TABLE "account_links" ADD CONSTRAINT "account_links_user" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `CREATE TABLE "mails" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "user_id" uuid, "to_address" text NOT NULL, "template" text NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "attempts" integer NOT NULL DEFAULT 0, "sent_at" TIMESTAMP WITH TIME ZONE, "failure" text, CONSTRAINT "mails_id" PRIMARY KEY ("id"))`,
  `CREATE INDEX "mails_by_user" ON "mails" ("user_id", "created_at")`,
  `ALTER TABLE "mails" ADD CONSTRAINT "mails_user" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `CREATE INDEX "session_by_user" ON "session" (((sess->'passport'->>'user')))`,
];
const undo = [
  `DROP INDEX "session_by_user"`,
  `DROP TABLE "mails"`,
  `DROP TABLE "account_links"`,
  `DELETE FROM "users" WHERE "password_hash" IS NULL`,
  `ALTER TABLE "users" ALTER COLUMN "password_hash" SET NOT NULL`,
];

export class Accounts1764633600000 implements MigrationInterface {
  name = 'Accounts1764633600000';

  async up(runner: QueryRunner): Promise<void> {
    for (const statement of make) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const statement of undo) await runner.query(statement);
  }
}
