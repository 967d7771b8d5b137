/** npm start: everything from an empty machine to a running Mantlet. */
import path from 'node:path';
import { buildClient, buildServer } from './lib/build.mjs';
import { Problem, runCommand, say } from './lib/house.mjs';
import { checkNode, ensureDebian, ensurePackages } from './lib/install.mjs';
import { built, stateDir } from './lib/paths.mjs';
import { startServer } from './lib/postgres.mjs';
import { postgresPackage } from './lib/postgres-programs.mjs';
import { holderOf, isFree, portFrom } from './lib/ports.mjs';
import { identity } from './lib/processes.mjs';
import { accountLines, demoAccounts, mustStay, prepareDatabase, startApplication, startMailFake, startWorker } from './lib/server.mjs';
import { claimInstallation, databaseFolder, secrets } from './lib/state.mjs';

const help = `npm start                 the demo scenario, its data kept between starts
npm start -- --empty      an empty installation beside it; its first visitor makes the administrator
npm start -- --help       this

Environment:
  PORT                    where to serve client and API (4700)
  HOST                    address to listen on (127.0.0.1: this machine only)
  MANTLET_DATABASE_PORT   port of the local database (4701)

Everything it keeps is in .mantlet/. Ctrl-C stops all that it started.`;

function readArguments(args) {
  const unknown = args.find((one) => !['--empty', '--help', '-h'].includes(one));
  if (unknown) throw new Problem(`npm start does not know “${unknown}”. It can be told:\n\n${help}`);
  return { empty: args.includes('--empty'), help: args.includes('--help') || args.includes('-h') };
}

async function checkPort(port, host) {
  if (await isFree(port, host)) return;
  throw new Problem(`Port ${port} on ${host} is in use${await holderOf(port)} or not ours to use. Stop that program, or choose another port: PORT=${port + 100} npm start`);
}

function announce({ url, host, empty, caught }) {
  say(`\nMantlet is ready: ${url}\n`);
  if (empty) {
    say('This installation is empty. Whoever opens it first makes the administrator’s account.');
  } else {
    say('Demo accounts (e-mail, password, name, role):');
    for (const line of accountLines(demoAccounts())) say(line);
    if (!['127.0.0.1', 'localhost', '::1'].includes(host)) {
      say(`\nCaution: the demo passwords are public and the server listens on ${host}. Use --empty for anything but a demonstration.`);
    }
  }
  if (caught) say(`\nMail does not leave this machine: invitations and the like can be read at ${url}/caught-mail${empty ? ', on this machine only. Name a mail server (MANTLET_SMTP_URL) for real work.' : ''}`);
  say('\nResults support, and do not replace, design by licensed engineers; local codes govern.');
  say('Ctrl-C stops the server and its database; the data stays.');
}

await runCommand(
  async () => {
    const wish = readArguments(process.argv.slice(2));
    if (wish.help) {
      say(help);
      return 0;
    }
    checkNode();
    const host = process.env.HOST || '127.0.0.1';
    const port = portFrom('PORT', 4700);
    const url = `http://${host === '0.0.0.0' || host === '::' ? 'localhost' : host}:${port}`;
    const running = await claimInstallation({ what: 'npm start', url });
    await checkPort(port, host);
    await ensurePackages();
    await ensureDebian([postgresPackage]);
    await buildServer();
    await buildClient();

    const { sessionSecret, passwords } = secrets();
    const server = await startServer({
      dataDir: await databaseFolder(),
      port: portFrom('MANTLET_DATABASE_PORT', 4701),
      mayMove: !process.env.MANTLET_DATABASE_PORT,
      passwords,
    });
    const kind = wish.empty ? 'empty' : 'demo';
    const ownState = path.join(stateDir, kind);
    const databaseUrl = await prepareDatabase(server, { name: wish.empty ? 'mantlet_empty' : 'mantlet', demo: !wish.empty, stateDir: ownState });
    const mail = await startMailFake(ownState, { demo: !wish.empty });
    const application = await startApplication({ mail, databaseUrl, host, port, sessionSecret, clientDir: built.client, stateDir: ownState });
    const worker = startWorker({ databaseUrl, stateDir: ownState });
    running.add({ children: [application, worker].map((one) => identity(one.child.pid)) });
    announce({ url, host, empty: wish.empty, caught: 'MANTLET_CAUGHT_MAIL_DIR' in mail });
    await Promise.race([mustStay(application, 'The server'), mustStay(worker, 'The worker')]);
    return undefined;
  },
  { codeOnInterrupt: 0 },
);
