/** The Mantlet server as a child of a command, on a database that is migrated and, for the demo, filled. */
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { Problem, isClosing, onClose, say } from './house.mjs';
import { at, built } from './paths.mjs';
import { ensureDatabase, remarkOn, setRemark } from './postgres.mjs';
import { answers } from './ports.mjs';
import { node, startProcess } from './processes.mjs';

const demoMark = 'Mantlet: demo scenario loaded';

/**
 * Makes the database if need be, migrates it and loads the demo scenario the first time.
 * @param {Awaited<ReturnType<import('./postgres.mjs').startServer>>} server
 * @param {{ name: string, demo: boolean, stateDir: string, env?: NodeJS.ProcessEnv }} database
 * @returns {Promise<string>} its connection URL
 */
export async function prepareDatabase(server, { name, demo, stateDir, env: base = process.env }) {
  mkdirSync(stateDir, { recursive: true, mode: 0o700 });
  const isNew = await ensureDatabase(server, name);
  const url = server.url(name);
  const env = { ...base, MANTLET_DATABASE_URL: url, MANTLET_STATE_DIR: stateDir };
  if (isNew) say(`Setting up the database ${name} …`);
  await node('Migrating the database', [built.migrate], { env });
  if (demo && (await remarkOn(server, name)) !== demoMark) {
    say('Loading the demo scenario …');
    await node('Loading the demo scenario', [built.seedDemo], { env });
    await setRemark(server, name, demoMark);
  }
  return url;
}

/**
 * A mail server of this command's own, which keeps every mail in the state folder and passes none on; the application shows them.
 * Not where a real one is named, nor behind TLS, where strangers may come.
 * In a demonstration everybody may read it, as everybody may sign in; elsewhere whoever sits at this machine, since it opens every account.
 * @param {string} stateDir @param {{ demo?: boolean, env?: NodeJS.ProcessEnv }} [wish]
 * @returns {Promise<NodeJS.ProcessEnv>} what the server needs to know of it
 */
export async function startMailFake(stateDir, { demo = false, env = process.env } = {}) {
  if (env.MANTLET_SMTP_URL || env.MANTLET_SECURE_COOKIES === '1') return {};
  const { startSmtpFake } = await import(pathToFileURL(built.smtpFake).href);
  const folder = path.join(stateDir, 'mail');
  const fake = await startSmtpFake(folder);
  onClose('the mail fake', fake.close);
  return { MANTLET_SMTP_URL: fake.url, MANTLET_CAUGHT_MAIL_DIR: folder, ...(demo ? { MANTLET_CAUGHT_MAIL_FOR_EVERYBODY: '1' } : {}) };
}

/**
 * @param {{ databaseUrl: string, host: string, port: number, sessionSecret: string, clientDir: string, stateDir: string, mail?: NodeJS.ProcessEnv, env?: NodeJS.ProcessEnv }} wish
 * @returns {NodeJS.ProcessEnv} what backend/dist/main.js reads
 */
export const serverEnvironment = ({ databaseUrl, host, port, sessionSecret, clientDir, stateDir, mail = {}, env = process.env }) => ({
  ...env,
  MANTLET_DATABASE_URL: databaseUrl,
  HOST: host,
  PORT: String(port),
  MANTLET_SESSION_SECRET: sessionSecret,
  MANTLET_CLIENT_DIR: clientDir,
  MANTLET_STATE_DIR: stateDir,
  ...mail,
});

/** Waits until the port answers. @throws {Problem} when the process ends first or a minute passes */
export async function untilAnswering(running, port, what, host = '127.0.0.1') {
  const reachable = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
  let exit = null;
  running.ended.then((code) => (exit = code), (error) => (exit = error.message));
  for (let waited = 0; waited < 60_000; waited += 100) {
    if (exit !== null) throw new Problem(`${what} ended while starting (exit code ${exit}); the lines above say why.`);
    if (await answers(port, reachable)) return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Problem(`${what} did not answer on port ${port} within a minute.`);
}

/** Starts the built server and waits for it. @returns {Promise<ReturnType<typeof startProcess>>} */
export async function startApplication(wish) {
  mkdirSync(wish.stateDir, { recursive: true, mode: 0o700 });
  const running = startProcess(process.execPath, [built.server], { name: 'the server', env: serverEnvironment(wish) });
  await untilAnswering(running, wish.port, 'The server', wish.host);
  return running;
}

/** Starts the worker, which does what is too much to do within a request. @returns {ReturnType<typeof startProcess>} */
export const startWorker = ({ databaseUrl, stateDir, env = process.env }) =>
  startProcess(process.execPath, [built.worker], { name: 'the worker', env: { ...env, MANTLET_DATABASE_URL: databaseUrl, MANTLET_STATE_DIR: stateDir } });

/** Fails the command when a process that should stay ends. */
export async function mustStay(running, what) {
  const code = await running.ended;
  if (!isClosing()) throw new Problem(`${what} ended by itself (exit code ${code}); the lines above say why.`);
}

/** @returns {{ name: string, email: string, password: string, role: string }[]} */
export function demoAccounts() {
  const file = at('seeds/demo/accounts.json');
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : [];
}

/** @param {ReturnType<typeof demoAccounts>} accounts @returns {string[]} a line each, in columns */
export function accountLines(accounts) {
  const width = (key) => Math.max(...accounts.map((one) => one[key].length));
  const [name, email, password] = ['name', 'email', 'password'].map(width);
  return accounts.map((one) => `  ${one.email.padEnd(email)}  ${one.password.padEnd(password)}  ${one.name.padEnd(name)}  ${one.role}`);
}
