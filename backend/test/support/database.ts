import { randomBytes } from 'node:crypto';
import { Client } from 'pg';

/** A database of its own for one spec file, on the throw-away server that the test command started. */
export async function createTestDatabase(): Promise<{ url: string; drop: () => Promise<void> }> {
  const server = process.env['MANTLET_TEST_DATABASE_URL'];
  if (!server) throw new Error('MANTLET_TEST_DATABASE_URL is not set: run the tests through `npm test`, or point it at a throw-away PostgreSQL.');
  const name = `test_${randomBytes(6).toString('hex')}`;
  await administer(server, `CREATE DATABASE ${name}`);
  const url = new URL(server);
  url.pathname = `/${name}`;
  return { url: url.toString(), drop: () => administer(server, `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`) };
}

async function administer(server: string, statement: string): Promise<void> {
  const client = new Client({ connectionString: server });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}
