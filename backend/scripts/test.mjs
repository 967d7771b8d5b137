/** npm test: every check of the house, on a database of its own, closing with “N passed, N failed”. */
import { failure, sum } from './lib/counts.mjs';
import { Problem, isClosing, runCommand, say } from './lib/house.mjs';
import { checkNode, debian, ensureDebian, ensurePackages } from './lib/install.mjs';
import { postgresPackage } from './lib/postgres-programs.mjs';
import { steps } from './lib/steps.mjs';
import { cleanEnvironment, startThrowAway, temporaryFolder } from './lib/throw-away.mjs';

const names = [...new Set(steps.map((step) => step.name))];
const help = `npm test                              every step
npm test -- ${names.slice(0, 2).join(' ')}                 some steps: ${names.join(', ')}
npm test -- backend members.spec      one step, only files whose path contains this`;

const packages = {
  postgresql: postgresPackage,
  chromium: debian('chromium', ...[process.env.CHROMIUM_PATH, '/usr/bin/chromium'].filter(Boolean)),
  'poppler-utils': debian('poppler-utils', '/usr/bin/pdftotext'),
  qpdf: debian('qpdf', '/usr/bin/qpdf'),
};

function readArguments(args) {
  if (args.some((one) => one === '--help' || one === '-h')) return null;
  const wanted = args.filter((one) => names.includes(one));
  const filters = args.filter((one) => !names.includes(one));
  if (filters.length > 0 && wanted.length !== 1) {
    throw new Problem(`“${filters[0]}” is not the name of a step. A part of a path can follow the name of one step.\n\n${help}`);
  }
  return { chosen: steps.filter((step) => wanted.length === 0 || wanted.includes(step.name)), filters };
}

/** Runs one step; what breaks it is its failure, and the others still run. */
async function runStep(step, run) {
  say(`\n── ${step.title}`);
  const began = process.hrtime.bigint();
  let count;
  try {
    count = await step.run(run);
  } catch (error) {
    if (isClosing()) throw error;
    count = failure(error instanceof Problem ? error.message : String(error.stack));
  }
  const seconds = Number((process.hrtime.bigint() - began) / 1_000_000n) / 1000;
  for (const remark of count.remarks) say(`   ${remark}`);
  return { title: step.title, seconds, ...count };
}

function summary(results) {
  say('\n── Summary');
  for (const { title, passed, failed, seconds } of results) {
    say(`${title.padEnd(30)}${String(passed).padStart(6)} passed ${String(failed).padStart(5)} failed ${seconds.toFixed(1).padStart(8)} s`);
  }
  const { passed, failed } = sum(results);
  say(`\n${passed} passed, ${failed} failed`);
  return failed === 0 ? 0 : 1;
}

await runCommand(async () => {
  const wish = readArguments(process.argv.slice(2));
  if (!wish) {
    say(help);
    return 0;
  }
  checkNode();
  await ensurePackages();
  const needed = new Set(wish.chosen.flatMap((step) => step.needs ?? []));
  await ensureDebian([...needed].map((name) => packages[name]));
  const folder = await temporaryFolder();
  let server;
  const database = () => (server ??= startThrowAway(folder));
  const run = { folder, env: cleanEnvironment(), database, filters: wish.filters };
  const results = [];
  for (const step of wish.chosen) results.push(await runStep(step, run));
  return summary(results);
});
