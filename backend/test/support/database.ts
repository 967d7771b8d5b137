import { createHash, randomBytes } from 'node:crypto';
import { readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { Client } from 'pg';
import { DataSource } from 'typeorm';
import { dataSourceOptions } from '../../src/database/data-source-options.js';
import { migrateQueue } from '../../src/database/migrate-queue.js';
import { seedCatalogue } from '../../src/database/seed-catalogue.js';

export interface TestDatabase {
  url: string;
  drop: () => Promise<void>;
}
/** empty: nothing at all · migrated: the schema · catalogue: the schema and the section catalogue */
export type Filling = 'empty' | 'migrated' | 'catalogue';

function serverUrl(): string {
  const server = process.env['MANTLET_TEST_DATABASE_URL'];
  if (!server) throw new Error('MANTLET_TEST_DATABASE_URL is not set: run the tests through `npm test`, or point it at a throw-away PostgreSQL.');
  return server;
}
function urlOf(name: string): string {
  const url = new URL(serverUrl());
  url.pathname = `/${name}`;
  return url.toString();
}

/** A database of its own for one spec file, on the throw-away server that the test command started. */
export async function createTestDatabase(filling: Filling = 'empty'): Promise<TestDatabase> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  await administer(async (client) => {
    const template = filling === 'empty' ? null : await ensureTemplate(client, filling);
    await client.query(`CREATE DATABASE ${name}${template ? ` TEMPLATE ${template}` : ''}`);
  });
  return { url: urlOf(name), drop: () => administer((client) => drop(client, name)) };
}

/** The server's own vacuum may be at work in it, which nobody but a superuser may interrupt: wait for it. */
async function drop(client: Client, name: string, attempts = 50): Promise<void> {
  try {
    await client.query(`DROP DATABASE IF EXISTS ${name} WITH (FORCE)`);
  } catch (error) {
    const busy = ['42501', '55006'].includes((error as { code?: string }).code ?? '');
    if (!busy || attempts <= 1) throw error;
    await new Promise((resolve) => setTimeout(resolve, 200));
    await drop(client, name, attempts - 1);
  }
}

/** Filled once per state of the migrations and seeds, then copied: a copy takes a tenth of a second, filling takes several. */
async function ensureTemplate(client: Client, filling: Exclude<Filling, 'empty'>): Promise<string> {
  const name = `filled_${filling}_${fingerprint()}`;
  await client.query('SELECT pg_advisory_lock(4711)');
  try {
    const known = await client.query('SELECT 1 FROM pg_database WHERE datname = $1', [name]);
    if (known.rowCount) return name;
    const making = `${name}_making`;
    await drop(client, making);
    await client.query(`CREATE DATABASE ${making}`);
    const source = await new DataSource(dataSourceOptions(urlOf(making))).initialize();
    try {
      await source.runMigrations();
      await migrateQueue(urlOf(making));
      if (filling === 'catalogue') await seedCatalogue(source);
    } finally {
      await source.destroy();
    }
    await client.query(`ALTER DATABASE ${making} RENAME TO ${name}`);
    return name;
  } finally {
    await client.query('SELECT pg_advisory_unlock(4711)');
  }
}

let known: string | null = null;
function fingerprint(): string {
  if (known) return known;
  const backend = join(__dirname, '..', '..');
  const folders = [join(backend, 'src/database'), join(backend, 'src/database/migrations'), join(backend, 'src/calc/sections'), join(backend, '../seeds/sections')];
  const files = folders.flatMap((folder) => readdirSync(folder).map((file) => join(folder, file)));
  const digest = createHash('sha256');
  for (const file of files) digest.update(`${file} ${statSync(file).mtimeMs}\n`);
  known = digest.digest('hex').slice(0, 12);
  return known;
}

async function administer(work: (client: Client) => Promise<void>): Promise<void> {
  const client = new Client({ connectionString: serverUrl() });
  await client.connect();
  try {
    await work(client);
  } finally {
    await client.end();
  }
}
