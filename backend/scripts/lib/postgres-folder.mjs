/** A data folder: made whole or not at all, and put right where an earlier run ended badly. */
import { existsSync, readFileSync, readdirSync, readlinkSync, realpathSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Problem, say } from './house.mjs';
import { isRoot } from './install.mjs';
import { captureAsOwner, giveToOwner, makeOwnedFolder, programsFor } from './postgres-programs.mjs';
import { startedAt } from './processes.mjs';

export const superuser = 'postgres';

const isWhole = (dataDir) => ['PG_VERSION', 'global/pg_control', 'postgresql.conf'].every((file) => existsSync(path.join(dataDir, file)));

const stamp = () => new Date().toISOString().replace(/\D/g, '').slice(0, 14);

/** A folder that PostgreSQL never finished is kept under another name: it may hold something after all. */
function setAsideHalfMade(dataDir) {
  if (!existsSync(dataDir) || isWhole(dataDir)) return;
  if (readdirSync(dataDir).length === 0) {
    rmSync(dataDir, { recursive: true });
    return;
  }
  const aside = `${dataDir}.half-made-${stamp()}`;
  renameSync(dataDir, aside);
  say(`The data folder ${dataDir} was half made. It is now ${aside}, and a new one takes its place.`);
}

function checkOwner(dataDir) {
  if (isRoot() || !existsSync(dataDir) || statSync(dataDir).uid === process.getuid?.()) return;
  throw new Problem(
    `The data folder ${dataDir} belongs to another user, most likely because an earlier start ran as root. Run this command as root again, or move the folder away to begin with an empty one.`,
  );
}

/**
 * Makes the data folder if there is none.
 * @param {string} dataDir @param {{ password: string, throwAway?: boolean }} options the superuser's password; throwAway skips waiting for the disk
 */
export async function ensureDataFolder(dataDir, { password, throwAway = false }) {
  checkOwner(dataDir);
  setAsideHalfMade(dataDir);
  if (existsSync(dataDir)) return;
  const making = `${dataDir}.making`;
  const passwordFile = `${dataDir}.password`;
  rmSync(making, { recursive: true, force: true });
  await makeOwnedFolder(making);
  try {
    writeFileSync(passwordFile, `${password}\n`, { mode: 0o600 });
    await giveToOwner(passwordFile);
    // C.UTF-8: text sorts the same on every machine
    const args = ['-D', making, '-U', superuser, '-A', 'scram-sha-256', `--pwfile=${passwordFile}`, '-E', 'UTF8', '--locale=C.UTF-8'];
    const { code, out, err } = await captureAsOwner(path.join(programsFor(), 'initdb'), [...args, ...(throwAway ? ['--no-sync'] : [])]);
    if (code !== 0) throw new Problem(`PostgreSQL could not make its data folder ${dataDir}:\n${out}${err}`);
  } finally {
    rmSync(passwordFile, { force: true });
  }
  renameSync(making, dataDir);
}

function readServerNote(dataDir) {
  try {
    const lines = readFileSync(path.join(dataDir, 'postmaster.pid'), 'utf8').split('\n');
    return { pid: Number(lines[0]), port: Number(lines[3]) };
  } catch {
    return null;
  }
}

/** A server works in its data folder: that, and not the number alone, tells ours from a stranger with its old number. */
function worksIn(pid, dataDir) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`) === realpathSync(dataDir);
  } catch {
    return false;
  }
}

/**
 * @param {string} dataDir
 * @returns {{ state: 'none' } | { state: 'stale' | 'running', pid: number, port: number }} what postmaster.pid says, checked
 */
export function serverOf(dataDir) {
  const note = readServerNote(dataDir);
  if (!note) return { state: 'none' };
  const runs = Number.isInteger(note.pid) && note.pid > 0 && startedAt(note.pid) !== null && worksIn(note.pid, dataDir);
  return { state: runs ? 'running' : 'stale', ...note };
}

/** Stops a server that an earlier run left behind, and clears the note of one that is dead. */
export async function settleEarlierServer(dataDir) {
  const found = serverOf(dataDir);
  if (found.state === 'running') {
    say('A database server of an earlier start was left running; stopping it first.');
    await stopServer(dataDir);
  } else if (found.state === 'stale') {
    say(`An earlier database server ended without clearing its lock (process ${found.pid} is gone); clearing it.`);
    rmSync(path.join(dataDir, 'postmaster.pid'), { force: true });
  }
}

/** @param {string} dataDir stops the server there, if one runs, and waits for it */
export async function stopServer(dataDir) {
  if (serverOf(dataDir).state !== 'running') return;
  const args = ['stop', '-D', dataDir, '-m', 'fast', '-w', '-t', '30'];
  const { code, err } = await captureAsOwner(path.join(programsFor(dataDir), 'pg_ctl'), args);
  if (code !== 0 && serverOf(dataDir).state === 'running') throw new Problem(`The database server in ${dataDir} did not stop: ${err}`);
}
