/** npm run dev: compiles, restarts and reloads as files change, on the demo's database. */
import path from 'node:path';
import { compileServer } from './lib/build.mjs';
import { Problem, runCommand, say } from './lib/house.mjs';
import { checkNode, ensureDebian, ensurePackages } from './lib/install.mjs';
import { at, built, root, stateDir, tool } from './lib/paths.mjs';
import { startServer } from './lib/postgres.mjs';
import { postgresPackage } from './lib/postgres-programs.mjs';
import { holderOf, isFree, portFrom } from './lib/ports.mjs';
import { identity, startProcess } from './lib/processes.mjs';
import { accountLines, demoAccounts, mustStay, prepareDatabase, serverEnvironment, startMailFake, untilAnswering } from './lib/server.mjs';
import { claimInstallation, databaseFolder, secrets } from './lib/state.mjs';

const clientPort = 4710;

async function checkPort(port) {
  if (await isFree(port)) return;
  throw new Problem(`Port ${port} is in use${await holderOf(port)}. Stop that program first${port === clientPort ? '' : ', or choose another port: PORT=4800 npm run dev'}.`);
}

await runCommand(
  async () => {
    checkNode();
    const port = portFrom('PORT', 4700);
    const clientUrl = `http://127.0.0.1:${clientPort}`;
    const running = await claimInstallation({ what: 'npm run dev', url: clientUrl });
    await checkPort(port);
    await checkPort(clientPort);
    await ensurePackages();
    await ensureDebian([postgresPackage]);
    say('Compiling the server …');
    await compileServer();

    const { sessionSecret, passwords } = secrets();
    const server = await startServer({ dataDir: await databaseFolder(), port: portFrom('MANTLET_DATABASE_PORT', 4701), mayMove: !process.env.MANTLET_DATABASE_PORT, passwords });
    const ownState = path.join(stateDir, 'demo');
    const databaseUrl = await prepareDatabase(server, { name: 'mantlet', demo: true, stateDir: ownState });
    const mail = await startMailFake(ownState, { demo: true });
    // links in mail open the client that reloads
    const env = serverEnvironment({ mail: { MANTLET_PUBLIC_URL: clientUrl, ...mail }, databaseUrl, host: '127.0.0.1', port, sessionSecret, clientDir: built.client, stateDir: ownState });

    const compiler = startProcess(process.execPath, [tool.tsc, '-b', 'common', 'backend', '--watch', '--preserveWatchOutput'], { name: 'the compiler', cwd: root });
    const api = startProcess(process.execPath, ['--watch', '--watch-preserve-output', '--enable-source-maps', built.server], { name: 'the server', env });
    const worker = startProcess(process.execPath, ['--watch', '--watch-preserve-output', '--enable-source-maps', built.worker], { name: 'the worker', env });
    const client = startProcess(process.execPath, [tool.vite, '--host', '127.0.0.1', '--strictPort', '--clearScreen', 'false'], {
      name: 'the client',
      cwd: at('frontend'),
      env: { ...process.env, MANTLET_API: `http://127.0.0.1:${port}` },
    });
    running.add({ children: [compiler, api, worker, client].map((one) => identity(one.child.pid)) });
    await untilAnswering(client, clientPort, 'The client');
    say(`\nClient, reloading as you save: ${clientUrl}\nAPI, restarting as it is compiled: http://127.0.0.1:${port}/api`);
    for (const line of accountLines(demoAccounts())) say(line);
    say('A new migration runs at the next npm run dev. Ctrl-C stops everything.');
    await Promise.race([mustStay(compiler, 'The compiler'), mustStay(api, 'The server'), mustStay(worker, 'The worker'), mustStay(client, 'The client')]);
    return undefined;
  },
  { codeOnInterrupt: 0 },
);
