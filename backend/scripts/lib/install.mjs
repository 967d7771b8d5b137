/** What must be on the machine: Node, the npm packages of the lock file, programs from Debian. */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Problem, onClose, say } from './house.mjs';
import { at, root } from './paths.mjs';
import { show } from './processes.mjs';

export const isRoot = () => process.getuid?.() === 0;

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  throw new Problem(`Mantlet needs Node 20.19 or later; this is Node ${process.versions.node}.`);
}

/**
 * Compares the lock file with what npm noted of its last finished install. By content, not by date: a checkout
 * gives every file today's date, and an install that was interrupted leaves no note.
 * @param {string} lockFile package-lock.json @param {string} noteFile node_modules/.package-lock.json
 * @returns {string | null} why packages must be installed, or null
 */
export function packagesMissing(lockFile, noteFile) {
  const wanted = JSON.parse(readFileSync(lockFile, 'utf8')).packages;
  if (!existsSync(noteFile)) return 'they are not installed yet';
  const have = JSON.parse(readFileSync(noteFile, 'utf8')).packages;
  for (const [name, entry] of Object.entries(wanted)) {
    if (!name.includes('node_modules/')) continue;
    const found = have[name];
    if (!found && !entry.optional && !entry.peer && !entry.devOptional) return `${name} is missing`;
    if (found && found.version !== entry.version) return `${name} is ${found.version}, the lock file says ${entry.version}`;
  }
  return null;
}

export async function ensurePackages() {
  const digest = createHash('sha256').update(readFileSync(at('package-lock.json'))).digest('hex');
  // what npm ci chose to leave out of this very lock file is not missing, so its own finish is noted as well
  const noteOfDigest = at('node_modules/.mantlet-installed');
  if (existsSync(noteOfDigest) && readFileSync(noteOfDigest, 'utf8') === digest) return;
  const why = packagesMissing(at('package-lock.json'), at('node_modules/.package-lock.json'));
  if (why === null) return;
  say(`Installing the npm packages (${why}); this takes a minute or two …`);
  // development packages too, whatever NODE_ENV says: the build needs the compiler
  const code = await show('npm', ['ci', '--no-audit', '--no-fund', '--include=dev'], { cwd: root });
  if (code !== 0) throw new Problem('npm ci failed; the lines above say why. Settle that and run the command again.');
  writeFileSync(noteOfDigest, digest);
}

/**
 * Keeps Debian's PostgreSQL package from making and starting a cluster of its own: only its programs are wanted.
 * @returns {() => void} takes the setting back, so that later installs by others behave as usual
 */
function withoutDefaultCluster() {
  const file = '/etc/postgresql-common/createcluster.d/mantlet-install.conf';
  mkdirSync(path.dirname(file), { recursive: true });
  writeFileSync(file, 'create_main_cluster = false\n');
  return onClose(file, () => rmSync(file, { force: true }));
}

/**
 * Installs Debian packages whose programs are missing: when root; otherwise says the exact command and stops.
 * @param {{ name: string, isThere: () => boolean }[]} packages
 */
export async function ensureDebian(packages) {
  const missing = packages.filter((one) => !one.isThere()).map((one) => one.name);
  if (missing.length === 0) return;
  const list = missing.join(' ');
  const command = `apt-get update && apt-get install -y --no-install-recommends ${list}`;
  if (!existsSync('/usr/bin/apt-get')) {
    throw new Problem(`Needed and not found: ${list} (Debian's names). There is no apt-get here to install them with; install them your system's way and run the command again.`);
  }
  if (!isRoot()) {
    throw new Problem(`Needed and not found: ${list}. Install with\n\n  sudo sh -c '${command}'\n\nand run the command again.`);
  }
  say(`Installing from Debian: ${list} …`);
  const takeBack = missing.includes('postgresql') ? withoutDefaultCluster() : async () => {};
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const code = await show('sh', ['-c', command], { env });
  await takeBack();
  const still = packages.filter((one) => !one.isThere()).map((one) => one.name);
  if (code !== 0 || still.length > 0) {
    throw new Problem(`Installing ${list} failed; the lines above say why. The command was\n\n  ${command}`);
  }
}

/** @param {string} name Debian package @param {string[]} programs any of these absolute paths will do */
export const debian = (name, ...programs) => ({ name, isThere: () => programs.some((file) => existsSync(file)) });
