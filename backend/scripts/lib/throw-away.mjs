/** A database server for one run, in a temporary folder, gone with it. */
import { chmodSync, existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { randomBytes } from 'node:crypto';
import os from 'node:os';
import path from 'node:path';
import { onClose } from './house.mjs';
import { readNote } from './lock.mjs';
import { freePort } from './ports.mjs';
import { stopServer } from './postgres-folder.mjs';
import { startServer } from './postgres.mjs';
import { identity, isAlive } from './processes.mjs';

const prefix = 'mantlet-throw-away-';

/** Runs that were killed could not tidy up; their servers would hold memory for good. */
async function sweep() {
  for (const name of readdirSync(os.tmpdir()).filter((entry) => entry.startsWith(prefix))) {
    const folder = path.join(os.tmpdir(), name);
    const owner = readNote(path.join(folder, 'owner.json'));
    if (owner === null || isAlive(owner)) continue; // being made just now, or in use
    const dataDir = path.join(folder, 'postgres');
    try {
      if (existsSync(dataDir)) await stopServer(dataDir);
      rmSync(folder, { recursive: true, force: true });
    } catch {
      // another user's: theirs to clear
    }
  }
}

/** @returns {Promise<string>} a temporary folder of this run, which the database's user can reach */
export async function temporaryFolder() {
  await sweep();
  const folder = mkdtempSync(path.join(os.tmpdir(), prefix));
  chmodSync(folder, 0o755);
  writeFileSync(path.join(folder, 'owner.json'), JSON.stringify(identity(process.pid)));
  onClose(folder, () => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

const password = () => randomBytes(18).toString('base64url');

/**
 * @param {string} folder from temporaryFolder()
 * @param {{ fast?: boolean }} options fast (the usual): does not wait for the disk; a measurement wants it to
 */
export const startThrowAway = async (folder, { fast = true } = {}) =>
  startServer({
    dataDir: path.join(folder, 'postgres'),
    port: await freePort(),
    passwords: { superuser: password(), application: password() },
    throwAway: true,
    fast,
  });

/** The environment without anything that points at an installation in use. */
export const cleanEnvironment = (extra = {}) => ({
  ...Object.fromEntries(Object.entries(process.env).filter(([name]) => !/^(MANTLET_|PG|PORT$|HOST$|DATABASE_URL$)/.test(name))),
  ...extra,
});
