/** Child processes: each in a group of its own, so that a whole tree can be stopped by its number. */
import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { Problem, isClosing, onClose } from './house.mjs';

/**
 * When a process began, in the kernel's ticks. With its number it names one process for good: numbers are
 * used again, soonest of all in a restarted container.
 * @param {number} pid @returns {string | null} null when there is no such process
 */
export function startedAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? null : (fields[19] ?? null);
  } catch {
    return null;
  }
}

/** @param {number} pid @returns {{ pid: number, startedAt: string | null }} */
export const identity = (pid) => ({ pid, startedAt: startedAt(pid) });

/** @param {{ pid?: number, startedAt?: string | null } | null | undefined} who as written by identity() */
export const isAlive = (who) => who?.pid !== undefined && who.startedAt != null && startedAt(who.pid) === who.startedAt;

const wait = (milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds));

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
    return true;
  } catch {
    return false; // nobody left in the group
  }
}

/**
 * Stops a process and all it started: asks first, insists after the grace.
 * @param {number} pid leader of the group @param {number} graceMs
 */
export async function stopGroup(pid, graceMs = 10_000) {
  if (!signalGroup(pid, 'SIGTERM')) return;
  for (let waited = 0; waited < graceMs; waited += 50) {
    if (startedAt(pid) === null && !signalGroup(pid, 0)) return;
    await wait(50);
  }
  signalGroup(pid, 'SIGKILL');
}

/**
 * Starts a process that stays. It is stopped when the command closes.
 * @param {string} command @param {string[]} args
 * @param {{ name?: string, env?: NodeJS.ProcessEnv, cwd?: string, stdio?: import('node:child_process').StdioOptions }} options
 * @returns {{ child: import('node:child_process').ChildProcess, ended: Promise<number>, stop: () => Promise<void> }} ended: exit code, 128 and over for a signal
 */
export function startProcess(command, args, options = {}) {
  if (isClosing()) throw new Problem('Stopped.');
  return track(command, args, options);
}

function track(command, args, { name = command, env = process.env, cwd, stdio = ['ignore', 'inherit', 'inherit'] }) {
  const child = spawn(command, args, { env, cwd, stdio, detached: true });
  const ended = new Promise((resolve, reject) => {
    child.once('error', (error) => reject(error.code === 'ENOENT' ? new Problem(`The program ${command} is not installed.`) : error));
    child.once('close', (code, signal) => resolve(code ?? (signal ? 128 : 1)));
  });
  ended.catch(() => {});
  const forget = onClose(name, () => (child.pid === undefined ? undefined : stopGroup(child.pid)));
  ended.then(() => forget(), () => forget());
  return { child, ended, stop: forget };
}

/**
 * Runs a program to its end and keeps what it said. Also while closing: stopping a server takes a program.
 * @returns {Promise<{ code: number, out: string, err: string }>}
 */
export async function capture(command, args, options = {}) {
  const { child, ended } = track(command, args, { ...options, stdio: ['ignore', 'pipe', 'pipe'] });
  let out = '';
  let err = '';
  child.stdout?.setEncoding('utf8').on('data', (text) => (out += text));
  child.stderr?.setEncoding('utf8').on('data', (text) => (err += text));
  return { code: await ended, out, err };
}

/** Runs a program to its end in sight of the person. @returns {Promise<number>} exit code */
export const show = (command, args, options = {}) => startProcess(command, args, options).ended;

/** Runs one of our Node entry files in sight; a failure is a Problem that starts with `what`. */
export async function node(what, args, options = {}) {
  const code = await show(process.execPath, args, options);
  if (code !== 0 && !isClosing()) throw new Problem(`${what} failed (exit code ${code}); the lines above say why.`);
}
