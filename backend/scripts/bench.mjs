/** npm run bench: measures on a database server of its own, which waits for the disk as a real one does. */
import path from 'node:path';
import { buildServer } from './lib/build.mjs';
import { Problem, runCommand } from './lib/house.mjs';
import { checkNode, ensureDebian, ensurePackages } from './lib/install.mjs';
import { built } from './lib/paths.mjs';
import { postgresPackage } from './lib/postgres-programs.mjs';
import { node } from './lib/processes.mjs';
import { prepareDatabase } from './lib/server.mjs';
import { cleanEnvironment, startThrowAway, temporaryFolder } from './lib/throw-away.mjs';
import { existsSync } from 'node:fs';

await runCommand(async () => {
  checkNode();
  await ensurePackages();
  await ensureDebian([postgresPackage]);
  await buildServer();
  if (!existsSync(built.bench)) throw new Problem('There is no measurement: backend/src/bench/bench.ts is missing.');
  const folder = await temporaryFolder();
  const server = await startThrowAway(folder, { fast: false });
  const stateDir = path.join(folder, 'state');
  const env = cleanEnvironment();
  const url = await prepareDatabase(server, { name: 'mantlet_bench', demo: false, stateDir, env });
  await node('The measurement', [built.bench, ...process.argv.slice(2)], { env: { ...env, MANTLET_DATABASE_URL: url, MANTLET_STATE_DIR: stateDir } });
  return 0;
});
