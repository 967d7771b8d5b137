/** What a checkout keeps between starts: secrets, the database's folder, who is running. */
import { createHash, randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Problem, say } from './house.mjs';
import { isRoot } from './install.mjs';
import { takeLock } from './lock.mjs';
import { root, stateDir } from './paths.mjs';
import { ownerReaches } from './postgres-programs.mjs';
import { isAlive, stopGroup } from './processes.mjs';

const secret = () => randomBytes(32).toString('base64url');

/**
 * Reads a JSON file of secrets, making it the first time.
 * @template T @param {string} file @param {() => T} make @returns {T}
 */
export function keptSecrets(file, make) {
  if (!existsSync(file)) {
    mkdirSync(path.dirname(file), { recursive: true });
    writeFileSync(file, JSON.stringify(make()), { flag: 'wx', mode: 0o600 });
  }
  try {
    chmodSync(file, 0o600);
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    throw new Problem(`Cannot read ${file}: ${error.message}. It holds the passwords of the local database and the key of the sessions; put back a copy of it, or move the whole folder ${path.dirname(file)} away to begin anew.`);
  }
}

/** @returns {{ sessionSecret: string, passwords: { superuser: string, application: string } }} made once, readable by the owner only */
export const secrets = () =>
  keptSecrets(path.join(stateDir, 'secrets.json'), () => ({ sessionSecret: secret(), passwords: { superuser: secret(), application: secret() } }));

/**
 * Where the database's files are: in the checkout, unless we are root and the user “postgres” cannot reach in there
 * (a checkout under /root); then under /var/lib, in a folder named after the checkout's path.
 * @returns {Promise<string>} the data folder, made or still to be made
 */
export async function databaseFolder() {
  mkdirSync(stateDir, { recursive: true });
  const inside = path.join(stateDir, 'postgres');
  if (!isRoot()) return inside;
  chmodSync(stateDir, 0o755); // what is in it guards itself
  if (await ownerReaches(stateDir)) return inside;
  const outside = path.join('/var/lib/mantlet', createHash('sha256').update(root).digest('hex').slice(0, 12));
  mkdirSync(outside, { recursive: true, mode: 0o755 });
  say(`The user “postgres” cannot reach into ${root}; the database's files are in ${outside} instead.`);
  return path.join(outside, 'postgres');
}

/**
 * Claims this checkout's installation for one running command.
 * @param {{ what: string, url?: string }} about for the sentence another start would print
 * @returns {Promise<{ add: (facts: object) => void }>}
 */
export async function claimInstallation(about) {
  const lock = takeLock(path.join(stateDir, 'running.json'), about);
  if (lock.heldBy) {
    const { what, url, pid } = lock.heldBy;
    throw new Problem(`Mantlet is already running from this folder: ${what}, process ${pid}${url ? `, at ${url}` : ''}. Use that one, or stop it with Ctrl-C in its terminal first.`);
  }
  if (lock.left) {
    const orphans = (lock.left.children ?? []).filter(isAlive);
    if (orphans.length > 0) say('An earlier start was killed and left its server running; stopping that first.');
    for (const { pid } of orphans) await stopGroup(pid);
  }
  return lock;
}
