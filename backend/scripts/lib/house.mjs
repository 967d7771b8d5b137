/** The frame of every command: sentences for people, and everything that was started stopped again. */
import { readFileSync } from 'node:fs';

/** Something the person at the terminal can settle; shown as its sentence, without a stack. */
export class Problem extends Error {}

export const say = (line = '') => console.log(line);

const undo = [];
let closing = null;

/**
 * Registers what must be stopped or removed when the command ends, however it ends.
 * @param {string} name what it is, for the sentence if it fails
 * @param {() => unknown} action run once, last registered first
 * @returns {() => Promise<void>} does it now and forgets it
 */
export function onClose(name, action) {
  const entry = { name, action };
  undo.push(entry);
  return async () => {
    const index = undo.indexOf(entry);
    if (index < 0) return;
    undo.splice(index, 1);
    await action();
  };
}

/** True once the command has begun to close; a child that ends then is no surprise. */
export const isClosing = () => closing !== null;

/** @param {number} code exit code; the first call decides */
export function close(code) {
  closing ??= (async () => {
    let failed = false;
    while (undo.length > 0) {
      const { name, action } = undo.pop();
      try {
        await action();
      } catch (error) {
        failed = true;
        console.error(`Could not stop ${name}: ${error.message}`);
      }
    }
    process.exit(failed && code === 0 ? 1 : code);
  })();
  return closing;
}

/** npm runs us through a shell: the shell's parent tells whether npm still lives. */
function parents() {
  try {
    const [, name, , parent] = /^\d+ \((.*)\) (\S) (\d+)/.exec(readFileSync(`/proc/${process.ppid}/stat`, 'utf8')) ?? [];
    return name === 'sh' ? `${process.ppid} ${parent}` : String(process.ppid);
  } catch {
    return 'gone';
  }
}

/** npm may be killed without passing the signal on; its child would then hold the port and the database. */
function closeWithNpm() {
  if (!process.env.npm_lifecycle_event) return;
  const atStart = parents();
  setInterval(() => {
    if (parents() !== atStart) void close(1);
  }, 1000).unref();
}

/**
 * Runs a command to its end. A Problem is printed as its sentence; anything else with its stack.
 * @param {() => Promise<number | undefined>} body resolves with the exit code; undefined stays until a signal comes
 * @param {{ codeOnInterrupt?: number }} options
 */
export async function runCommand(body, { codeOnInterrupt = 130 } = {}) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      if (!isClosing() && signal === 'SIGINT') say('\nStopping …');
      void close(codeOnInterrupt);
    });
  }
  // a terminal that went away must not keep us from stopping the database
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {});
  closeWithNpm();
  try {
    const code = await body();
    if (code !== undefined) await close(code);
  } catch (error) {
    if (!isClosing()) console.error(error instanceof Problem ? `\n${error.message}` : error);
    await close(1);
  }
}
