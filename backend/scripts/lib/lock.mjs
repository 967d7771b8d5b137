/** Locks as files that name a living process; one left by a dead process is cleared away. */
import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Problem, onClose } from './house.mjs';
import { identity, isAlive } from './processes.mjs';

/** @returns {Record<string, any> | null} what is written there; null when absent or half-written */
export function readNote(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}

/** Writes a file that must not exist yet; it appears whole, so that nobody reads half a note. */
function writeNew(file, text) {
  const draft = `${file}.${process.pid}`;
  writeFileSync(draft, text, { mode: 0o644 });
  try {
    linkSync(draft, file);
  } finally {
    rmSync(draft, { force: true });
  }
}

/**
 * Takes a lock for as long as this command runs.
 * @param {string} file @param {Record<string, unknown>} about further facts for whoever finds it
 * @returns {{ heldBy: Record<string, any> | null, left: Record<string, any> | null, add: (facts: object) => void, release: () => Promise<void> }}
 *   heldBy: the living holder, when it was not ours to take; left: the note of a dead one, now cleared
 */
export function takeLock(file, about = {}) {
  mkdirSync(path.dirname(file), { recursive: true });
  let note = { ...identity(process.pid), ...about };
  let left = null;
  for (let attempt = 0; attempt < 5; attempt += 1) {
    try {
      writeNew(file, JSON.stringify(note));
      const release = onClose(`the lock ${file}`, () => rmSync(file, { force: true }));
      const add = (facts) => writeFileSync(file, JSON.stringify((note = { ...note, ...facts })));
      return { heldBy: null, left, add, release };
    } catch (error) {
      if (error.code !== 'EEXIST') throw new Problem(`Cannot write ${file}: ${error.message}. Check who owns the folder.`);
    }
    const found = readNote(file);
    if (isAlive(found)) return { heldBy: found, left: null, add: () => {}, release: async () => {} };
    left = found ?? {};
    rmSync(file, { force: true });
  }
  throw new Problem(`The lock ${file} is taken and released again and again; wait for the other command to finish.`);
}

/** Takes a lock, waiting for a living holder. @param {string} file @param {() => void} onWait told once */
export async function waitForLock(file, onWait) {
  for (let told = false; ; told = true) {
    const lock = takeLock(file);
    if (!lock.heldBy) return lock;
    if (!told) onWait();
    await new Promise((resolve) => setTimeout(resolve, 500));
  }
}
