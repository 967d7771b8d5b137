/** The steps of npm test, in order: quick checks first, the browser last. */
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { buildServer, clientForTests } from './build.mjs';
import { countReportFile, countTap, failure, single } from './counts.mjs';
import { at, root, tool } from './paths.mjs';
import { freePort } from './ports.mjs';
import { show } from './processes.mjs';
import { prepareDatabase, startApplication, startMailFake, startWorker } from './server.mjs';

/**
 * @typedef {object} Run what a step is given
 * @property {string} folder temporary, of this run
 * @property {NodeJS.ProcessEnv} env without anything of an installation in use
 * @property {() => Promise<any>} database starts the throw-away server at the first call
 * @property {string[]} filters paths or parts of them, to run some files only
 */
/** @typedef {{ name: string, title: string, needs?: string[], run: (run: Run) => Promise<import('./counts.mjs').Count> }} Step */

const check = async ({ env }, args, cwd = root) => single((await show(process.execPath, args, { cwd, env })) === 0);

async function jest({ folder, env, database, filters }) {
  const server = await database();
  const report = path.join(folder, 'backend.json');
  // in-process settings of TypeORM and argon2 are heavy: two workers are what two cores carry
  const args = [tool.jest, '--json', `--outputFile=${report}`, '--maxWorkers=2', '--forceExit', ...filters];
  const code = await show(process.execPath, args, { cwd: at('backend'), env: { ...env, MANTLET_TEST_DATABASE_URL: server.url('postgres') } });
  return countReportFile(report, code);
}

const vitest = (name, cwd, extra = []) => async ({ folder, env, filters }, moreEnv = {}) => {
  const report = path.join(folder, `${name}.json`);
  const args = [tool.vitest, 'run', ...extra, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...filters];
  return countReportFile(report, await show(process.execPath, args, { cwd, env: { ...env, ...moreEnv } }));
};

async function scripts({ folder, env, filters }) {
  const specs = readdirSync(at('backend/scripts'), { recursive: true })
    .map(String)
    .filter((name) => name.endsWith('.spec.mjs') && filters.every((filter) => name.includes(filter)))
    .map((name) => at('backend/scripts', name));
  if (specs.length === 0) return failure('There are no tests here.');
  const report = path.join(folder, 'scripts.tap');
  const args = ['--test', '--test-reporter=spec', '--test-reporter-destination=stdout', '--test-reporter=tap', `--test-reporter-destination=${report}`, ...specs];
  const code = await show(process.execPath, args, { cwd: root, env });
  return countTap(existsSync(report) ? readFileSync(report, 'utf8') : '', code);
}

/** A built server on a throw-away database. @returns {Promise<string>} its address */
async function serve({ folder, env, database }, clientDir, name, demo) {
  const server = await database();
  const stateDir = path.join(folder, name);
  const databaseUrl = await prepareDatabase(server, { name, demo, stateDir, env });
  const port = await freePort();
  // low, so that a whole building of the demo's size is already left to the worker
  const own = { ...env, MANTLET_RECALCULATE_IN_PLACE_MAX: '300' };
  const mail = await startMailFake(stateDir, { env });
  await startApplication({ mail, databaseUrl, host: '127.0.0.1', port, sessionSecret: 'only for this run, on this machine', clientDir, stateDir, env: own });
  startWorker({ databaseUrl, stateDir, env: own });
  return `http://127.0.0.1:${port}`;
}

async function journeys(run) {
  if (!existsSync(at('frontend/e2e'))) return failure('There are no browser journeys: frontend/e2e is missing.');
  await buildServer();
  const clientDir = await clientForTests(path.join(run.folder, 'client'));
  const demo = await serve(run, clientDir, 'mantlet_journeys', true);
  const empty = await serve(run, clientDir, 'mantlet_journeys_empty', false);
  const env = { MANTLET_E2E_URL: demo, MANTLET_E2E_EMPTY_URL: empty, CHROMIUM_PATH: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium' };
  return vitest('e2e', at('frontend'), ['--config', 'e2e/vitest.config.ts'])(run, env);
}

/** @type {Step[]} */
export const steps = [
  { name: 'lint', title: 'Lint', run: (run) => check(run, [tool.eslint, '.']) },
  {
    name: 'imports',
    title: 'Import rules',
    run: (run) => check(run, [tool.depcruise, '--config', '.dependency-cruiser.cjs', 'common/src', 'backend/src', 'frontend/src']),
  },
  { name: 'types', title: 'Types of the sources', run: (run) => check(run, [tool.tsc, '-b', 'common', 'backend', 'frontend']) },
  { name: 'types', title: 'Types of the server’s tests', run: (run) => check(run, [tool.tsc, '-p', 'backend/tsconfig.spec.json']) },
  { name: 'scripts', title: 'House commands', needs: ['postgresql'], run: scripts },
  { name: 'common', title: 'Shared contracts', run: vitest('common', at('common')) },
  { name: 'backend', title: 'Server: units and HTTP', needs: ['postgresql', 'poppler-utils', 'qpdf'], run: jest },
  { name: 'frontend', title: 'Client', run: vitest('frontend', at('frontend')) },
  { name: 'e2e', title: 'Browser journeys', needs: ['postgresql', 'chromium', 'poppler-utils'], run: journeys },
];
