import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Tables as the entities say; below them what entities cannot say: sessions, an append-only trail, revisions that stand once issued. */
export class InitialSchema1764547200000 implements MigrationInterface {
  name = 'InitialSchema1764547200000';

  async up(runner: QueryRunner): Promise<void> {
    for (const statement of [naturalOrder, ...tables, ...rules]) await runner.query(statement);
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const statement of undo) await runner.query(statement);
  }
}

/** B2 before B10, whatever the cluster's own language is (ICU, Unicode TR35: kn = numeric ordering). */
const naturalOrder = `CREATE COLLATION "natural" (provider = icu, locale = 'en-u-kn-true')`;

const tables = [
  `CREATE TABLE "projects" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "number" text NOT NULL, "name" text NOT NULL, "place" text NOT NULL DEFAULT '', "currency" text NOT NULL DEFAULT 'EUR', "note" text NOT NULL DEFAULT '', "settings" jsonb NOT NULL, "version" integer NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "UQ_b12e86de70ceaf88aa7fdfa365a" UNIQUE ("number"), CONSTRAINT "PK_6271df0a7aed1d6c0691ce6ac50" PRIMARY KEY ("id"))`,
  `CREATE TABLE "sections" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid, "family" text NOT NULL, "designation" text COLLATE "natural" NOT NULL, "designation_key" text NOT NULL, "other_names" text array NOT NULL DEFAULT '{}', "standard" text NOT NULL DEFAULT '', "shape" jsonb NOT NULL, "properties" jsonb NOT NULL, CONSTRAINT "PK_f9749dd3bffd880a497d007e450" PRIMARY KEY ("id"))`,
  `CREATE INDEX "IDX_a627c6ad00087651414e7c92b1" ON "sections"  ("family")`,
  `CREATE UNIQUE INDEX "sections_project_designation" ON "sections"  ("project_id", "designation_key") WHERE project_id IS NOT NULL`,
  `CREATE UNIQUE INDEX "sections_catalogue_designation" ON "sections"  ("designation_key") WHERE project_id IS NULL`,
  `CREATE TABLE "users" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "name" text NOT NULL, "email" text NOT NULL, "password_hash" text NOT NULL, "administrator" boolean NOT NULL DEFAULT false, "disabled" boolean NOT NULL DEFAULT false, "last_signed_in_at" TIMESTAMP WITH TIME ZONE, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "UQ_97672ac88f789774dd47f7c8be3" UNIQUE ("email"), CONSTRAINT "PK_a3ffb1c0c8416b9fc6f907b7433" PRIMARY KEY ("id"))`,
  `CREATE TABLE "levels" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "code" text COLLATE "natural" NOT NULL, "name" text NOT NULL, "elevation_m" double precision NOT NULL, "height_m" double precision NOT NULL, "version" integer NOT NULL, CONSTRAINT "levels_code" UNIQUE ("project_id", "code"), CONSTRAINT "levels_height" CHECK (height_m > 0), CONSTRAINT "PK_05f8dd8f715793c64d49e3f1901" PRIMARY KEY ("id"))`,
  `CREATE TABLE "products" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid, "name" text NOT NULL, "maker" text NOT NULL, "kind" text NOT NULL, "invented" boolean NOT NULL DEFAULT false, "evidence_reference" text NOT NULL, "evidence_edition" text NOT NULL, "evidence_expires_on" date NOT NULL, "evidence_standard" text NOT NULL, "curves" text array NOT NULL, "environments" text array NOT NULL DEFAULT '{}', "evidence" jsonb NOT NULL, "supply" jsonb NOT NULL, "note" text NOT NULL DEFAULT '', "evidence_file_name" text, "evidence_file_sha256" text, "evidence_file_bytes" integer, "evidence_file" bytea, "version" integer NOT NULL, CONSTRAINT "PK_0806c755e0aca124e67c0cf6d7d" PRIMARY KEY ("id"))`,
  `CREATE UNIQUE INDEX "products_project_name" ON "products"  ("project_id", "name", "evidence_edition") WHERE project_id IS NOT NULL`,
  `CREATE UNIQUE INDEX "products_shared_name" ON "products"  ("name", "evidence_edition") WHERE project_id IS NULL`,
  `CREATE TABLE "zone_systems" ("zone_id" uuid NOT NULL, "member_type" text NOT NULL, "product_id" uuid NOT NULL, CONSTRAINT "PK_529e33a5faeceb20dab8d5fb449" PRIMARY KEY ("zone_id", "member_type"))`,
  `CREATE INDEX "IDX_d8bf3f3362ec27cf412746cd9c" ON "zone_systems"  ("product_id")`,
  `CREATE TABLE "zones" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "level_id" uuid NOT NULL, "code" text COLLATE "natural" NOT NULL, "name" text NOT NULL, "period_min" integer NOT NULL, "curve" jsonb NOT NULL, "reference" text NOT NULL DEFAULT '', "environment" text NOT NULL DEFAULT 'C1', "target_policy" jsonb NOT NULL DEFAULT '{"policy":"own"}', "version" integer NOT NULL, CONSTRAINT "zones_code" UNIQUE ("project_id", "code"), CONSTRAINT "zones_period" CHECK (period_min > 0), CONSTRAINT "PK_880484a43ca311707b05895bd4a" PRIMARY KEY ("id"))`,
  `CREATE INDEX "IDX_86d97f774595278bf9465fa57d" ON "zones"  ("level_id")`,
  `CREATE TABLE "member_acceptances" ("member_id" uuid NOT NULL, "kind" text NOT NULL, "value_c" double precision, "reason" text NOT NULL, "accepted_by_id" uuid NOT NULL, "accepted_at" TIMESTAMP WITH TIME ZONE NOT NULL, CONSTRAINT "PK_e043c1f46dd408616e5c7ef2230" PRIMARY KEY ("member_id", "kind"))`,
  `CREATE TABLE "members" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "zone_id" uuid NOT NULL, "mark" text COLLATE "natural" NOT NULL, "member_type" text NOT NULL, "section_id" uuid NOT NULL, "grade" text NOT NULL, "length_mm" double precision NOT NULL, "quantity" integer NOT NULL, "exposure" jsonb NOT NULL, "protection_form" text NOT NULL, "coat_back_connections" integer NOT NULL DEFAULT '0', "coat_back_girth_mm" double precision NOT NULL DEFAULT '0', "deduction_m2" double precision NOT NULL DEFAULT '0', "on_site" boolean NOT NULL DEFAULT true, "note" text NOT NULL DEFAULT '', "basis" jsonb NOT NULL DEFAULT '{"way":"none"}', "basis_set_by_id" uuid, "basis_set_at" TIMESTAMP WITH TIME ZONE, "version" integer NOT NULL, CONSTRAINT "members_mark" UNIQUE ("project_id", "mark"), CONSTRAINT "members_quantity" CHECK (quantity > 0), CONSTRAINT "members_length" CHECK (length_mm > 0), CONSTRAINT "PK_28b53062261b996d9c99fa12404" PRIMARY KEY ("id"))`,
  `CREATE INDEX "IDX_70fbda9092c6f436c38fd44d1d" ON "members"  ("zone_id")`,
  `CREATE INDEX "IDX_c681b95c9639d372536a2e1972" ON "members"  ("section_id")`,
  `CREATE TABLE "member_results" ("member_id" uuid NOT NULL, "inputs_hash" text NOT NULL, "assessed_at" TIMESTAMP WITH TIME ZONE NOT NULL, "verdict" text NOT NULL, "reason" jsonb, "heated_perimeter_mm" double precision, "section_factor_per_m" double precision, "coated_girth_mm" double precision, "critical_temperature_c" double precision, "bare_critical_temperature_c" double precision, "way" text NOT NULL, "method" text, "governing" text, "utilisation" double precision, "assumed" boolean NOT NULL DEFAULT false, "bare_minutes" double precision, "bare_temperature_c" double precision, "required_thickness" double precision, "applied_thickness" double precision, "thickness_unit" text, "layers" double precision array, "product_id" uuid, "evidence_reading" text, "area_m2" double precision, "open" boolean NOT NULL DEFAULT false, CONSTRAINT "PK_f9d430cb666203c6f43817fec90" PRIMARY KEY ("member_id"))`,
  `CREATE INDEX "IDX_c214b572bc98928a3e2ad30e94" ON "member_results"  ("verdict")`,
  `CREATE INDEX "IDX_2e54c5ff6c25be936446b6b6e4" ON "member_results"  ("product_id")`,
  `CREATE INDEX "IDX_913206ffc9c0df9037d9fa77b6" ON "member_results"  ("open")`,
  `CREATE TABLE "zone_results" ("zone_id" uuid NOT NULL, "inputs_hash" text NOT NULL, "assessed_at" TIMESTAMP WITH TIME ZONE NOT NULL, "members" integer NOT NULL, "settled" integer NOT NULL, "open" integer NOT NULL, "protected_area_m2" double precision NOT NULL, "targets" jsonb NOT NULL, CONSTRAINT "PK_8640f95444e5b738f5163638ada" PRIMARY KEY ("zone_id"))`,
  `CREATE TABLE "audit_entries" ("id" bigint GENERATED BY DEFAULT AS IDENTITY NOT NULL, "at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), "project_id" uuid, "user_id" uuid, "user_name" text NOT NULL, "action" text NOT NULL, "entity" text NOT NULL, "entity_id" uuid, "label" text NOT NULL, "changes" jsonb NOT NULL DEFAULT '[]', "why" text, CONSTRAINT "PK_6b1623bcad4d04530b76548d619" PRIMARY KEY ("id"))`,
  `CREATE INDEX "audit_entries_by_project" ON "audit_entries"  ("project_id", "at")`,
  `CREATE INDEX "audit_entries_by_entity" ON "audit_entries"  ("entity", "entity_id")`,
  `CREATE TABLE "member_imports" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "user_id" uuid NOT NULL, "file_name" text NOT NULL, "state" text NOT NULL DEFAULT 'mapping', "cells" jsonb, "mapping" jsonb NOT NULL, "preview_digest" text, "notes" jsonb NOT NULL DEFAULT '[]', "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_0fc226684d340a5ac722441535e" PRIMARY KEY ("id"))`,
  `CREATE INDEX "IDX_9b01c15e19cf57d89488462766" ON "member_imports"  ("project_id")`,
  `CREATE TABLE "memberships" ("project_id" uuid NOT NULL, "user_id" uuid NOT NULL, "roles" text array NOT NULL, CONSTRAINT "memberships_has_a_role" CHECK (cardinality(roles) > 0), CONSTRAINT "PK_246faae84ffe34c04db7c91ae50" PRIMARY KEY ("project_id", "user_id"))`,
  `CREATE TABLE "revisions" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "project_id" uuid NOT NULL, "code" text COLLATE "natural" NOT NULL, "purpose" text NOT NULL DEFAULT '', "state" text NOT NULL DEFAULT 'draft', "prepared_by_id" uuid, "prepared_at" TIMESTAMP WITH TIME ZONE, "checked_by_id" uuid, "checked_at" TIMESTAMP WITH TIME ZONE, "issued_by_id" uuid, "issued_at" TIMESTAMP WITH TIME ZONE, "returned_comment" text, "snapshot" text, "snapshot_sha256" text, "pdf" bytea, "pdf_sha256" text, "pdf_bytes" integer, "members" integer, "protected_area_m2" double precision, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "revisions_code" UNIQUE ("project_id", "code"), CONSTRAINT "revisions_issued_whole" CHECK (state NOT IN ('issued', 'superseded') OR (snapshot_sha256 IS NOT NULL AND pdf_sha256 IS NOT NULL AND issued_at IS NOT NULL)), CONSTRAINT "revisions_second_pair_of_eyes" CHECK (checked_by_id IS NULL OR checked_by_id <> prepared_by_id), CONSTRAINT "revisions_state" CHECK (state IN ('draft', 'prepared', 'checked', 'issued', 'superseded')), CONSTRAINT "PK_4aa9ee2c71c50508c3c501573c9" PRIMARY KEY ("id"))`,
  `CREATE UNIQUE INDEX "revisions_one_issued" ON "revisions"  ("project_id") WHERE state = 'issued'`,
  `CREATE UNIQUE INDEX "revisions_one_open" ON "revisions"  ("project_id") WHERE state IN ('draft', 'prepared', 'checked')`,
  `ALTER TABLE "sections" ADD CONSTRAINT "FK_46832696ad10cd7b64cd6563b60" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "levels" ADD CONSTRAINT "FK_f7b7b6a27f53a23f5cac5348902" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "products" ADD CONSTRAINT "FK_e319358957a50b1f27ea87a5733" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "zone_systems" ADD CONSTRAINT "FK_c47f99ed4118c5441f650b68a0d" FOREIGN KEY ("zone_id") REFERENCES "zones"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "zone_systems" ADD CONSTRAINT "FK_d8bf3f3362ec27cf412746cd9c6" FOREIGN KEY ("product_id") REFERENCES "products"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "zones" ADD CONSTRAINT "FK_66dd1848e0eda171dbf929ddfec" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "zones" ADD CONSTRAINT "FK_86d97f774595278bf9465fa57d2" FOREIGN KEY ("level_id") REFERENCES "levels"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "member_acceptances" ADD CONSTRAINT "FK_a9032dc2ecff89d4e1a6cb4164f" FOREIGN KEY ("member_id") REFERENCES "members"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "member_acceptances" ADD CONSTRAINT "FK_043d0a280ca688aa1b82bbd8597" FOREIGN KEY ("accepted_by_id") REFERENCES "users"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "members" ADD CONSTRAINT "FK_6b404f0e6c44a892e2ff5598f24" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "members" ADD CONSTRAINT "FK_70fbda9092c6f436c38fd44d1d8" FOREIGN KEY ("zone_id") REFERENCES "zones"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "members" ADD CONSTRAINT "FK_c681b95c9639d372536a2e19729" FOREIGN KEY ("section_id") REFERENCES "sections"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "members" ADD CONSTRAINT "FK_d0b42b666fbc096ca13bd5e4b94" FOREIGN KEY ("basis_set_by_id") REFERENCES "users"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "member_results" ADD CONSTRAINT "FK_f9d430cb666203c6f43817fec90" FOREIGN KEY ("member_id") REFERENCES "members"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "member_results" ADD CONSTRAINT "FK_2e54c5ff6c25be936446b6b6e46" FOREIGN KEY ("product_id") REFERENCES "products"("id") ON DELETE SET NULL ON UPDATE NO ACTION`,
  `ALTER TABLE "zone_results" ADD CONSTRAINT "FK_8640f95444e5b738f5163638ada" FOREIGN KEY ("zone_id") REFERENCES "zones"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "member_imports" ADD CONSTRAINT "FK_9b01c15e19cf57d894884627660" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "member_imports" ADD CONSTRAINT "FK_0cb688107dd3998b09648abbfda" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "memberships" ADD CONSTRAINT "FK_6ab5ba6eb101e826e5a86561083" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
  `ALTER TABLE "memberships" ADD CONSTRAINT "FK_7c1e2fdfed4f6838e0c05ae5051" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "revisions" ADD CONSTRAINT "FK_31b28f8928df5462f3620749cc1" FOREIGN KEY ("project_id") REFERENCES "projects"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "revisions" ADD CONSTRAINT "FK_9c8aa3004938d30423132663346" FOREIGN KEY ("prepared_by_id") REFERENCES "users"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "revisions" ADD CONSTRAINT "FK_0809d5aa5e9436b018dba13779c" FOREIGN KEY ("checked_by_id") REFERENCES "users"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
  `ALTER TABLE "revisions" ADD CONSTRAINT "FK_3d82caed30318f103f9fd6591ec" FOREIGN KEY ("issued_by_id") REFERENCES "users"("id") ON DELETE RESTRICT ON UPDATE NO ACTION`,
];

const rules = [
  // the layout that connect-pg-simple asks for
  `CREATE TABLE "session" ("sid" varchar NOT NULL PRIMARY KEY, "sess" json NOT NULL, "expire" timestamp(6) NOT NULL)`,
  `CREATE INDEX "session_expire" ON "session" ("expire")`,
  `CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
   BEGIN RAISE EXCEPTION '% is append-only', TG_TABLE_NAME USING ERRCODE = 'restrict_violation'; END $$`,
  `CREATE TRIGGER audit_entries_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON audit_entries
   FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
  `CREATE FUNCTION keep_issued_revision() RETURNS trigger LANGUAGE plpgsql AS $$
   BEGIN
     IF OLD.state NOT IN ('issued', 'superseded') THEN
       RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
     END IF;
     IF TG_OP = 'UPDATE' AND OLD.state = 'issued' AND NEW.state = 'superseded'
        AND (to_jsonb(NEW) - 'state') = (to_jsonb(OLD) - 'state') THEN
       RETURN NEW;
     END IF;
     RAISE EXCEPTION 'revision % is issued and cannot be changed', OLD.code USING ERRCODE = 'restrict_violation';
   END $$`,
  `CREATE TRIGGER revisions_keep_issued BEFORE UPDATE OR DELETE ON revisions
   FOR EACH ROW EXECUTE FUNCTION keep_issued_revision()`,
  `CREATE TRIGGER revisions_no_truncate BEFORE TRUNCATE ON revisions
   FOR EACH STATEMENT EXECUTE FUNCTION refuse_change()`,
];

const undo = [
  `DROP TABLE audit_entries, member_imports, member_acceptances, member_results, members, zone_results, zone_systems, zones, levels,
   products, sections, revisions, memberships, projects, users, "session" CASCADE`,
  `DROP FUNCTION refuse_change, keep_issued_revision`,
  `DROP COLLATION "natural"`,
];
