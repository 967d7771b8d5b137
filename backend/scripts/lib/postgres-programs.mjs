/** PostgreSQL's own programs, and how to run them: it refuses to run as root. */
import { chownSync, existsSync, mkdirSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { Problem } from './house.mjs';
import { isRoot } from './install.mjs';
import { capture } from './processes.mjs';

const debianHome = '/usr/lib/postgresql';
const leastMajor = 14;

function installedMajors() {
  if (!existsSync(debianHome)) return [];
  return readdirSync(debianHome)
    .filter((name) => /^\d+$/.test(name) && existsSync(path.join(debianHome, name, 'bin/initdb')))
    .map(Number)
    .filter((major) => major >= leastMajor)
    .sort((a, b) => b - a);
}

const onPath = () => (process.env.PATH ?? '').split(':').find((folder) => folder !== '' && existsSync(path.join(folder, 'initdb')));

/** Debian's package with the server and its tools. */
export const postgresPackage = { name: 'postgresql', isThere: () => installedMajors().length > 0 || onPath() !== undefined };

/**
 * @param {string} [dataDir] a data folder is only readable by the version that made it
 * @returns {string} folder of the programs
 */
export function programsFor(dataDir) {
  const versionFile = dataDir ? path.join(dataDir, 'PG_VERSION') : '';
  const made = versionFile && existsSync(versionFile) ? Number(readFileSync(versionFile, 'utf8')) : undefined;
  const majors = installedMajors();
  const major = made ?? majors[0];
  if (major !== undefined && majors.includes(major)) return path.join(debianHome, String(major), 'bin');
  const other = onPath();
  if (other && majors.length === 0) return other;
  throw new Problem(
    made === undefined
      ? 'PostgreSQL is not installed.'
      : `The data folder ${dataDir} was made by PostgreSQL ${made}, which is not installed (found: ${majors.join(', ') || 'none'}). Install postgresql-${made}, or move the folder away to begin with an empty one.`,
  );
}

const asDatabaseUser = (command, args) => (isRoot() ? ['runuser', ['-u', 'postgres', '--', command, ...args]] : [command, args]);

/** Runs a program as the user who owns the data: postgres when we are root, ourselves otherwise. */
export function captureAsOwner(command, args, options = {}) {
  const [program, list] = asDatabaseUser(command, args);
  return capture(program, list, { cwd: '/', ...options });
}

/** Gives a file or folder to the user the database runs as. */
export async function giveToOwner(file) {
  if (!isRoot()) return;
  const [uid, gid] = await Promise.all(['-u', '-g'].map(async (flag) => Number((await capture('id', [flag, 'postgres'])).out)));
  if (!uid || !gid) throw new Problem('There is no user “postgres” on this machine; the Debian package postgresql makes it.');
  chownSync(file, uid, gid);
}

/** Makes a folder that only the database's user may read. */
export async function makeOwnedFolder(folder) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  await giveToOwner(folder);
}

/** @returns {Promise<boolean>} whether the database's user can reach into the folder */
export const ownerReaches = async (folder) => (await captureAsOwner('test', ['-x', folder])).code === 0;
