/** The build, done again only when a source has changed. */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Problem, say } from './house.mjs';
import { waitForLock } from './lock.mjs';
import { at, built, root, stateDir, tool } from './paths.mjs';
import { node } from './processes.mjs';

const isSpec = (name) => /\.spec\.tsx?$/.test(name);

/** @param {string} place file or folder @returns {string[]} absolute paths of the files, sorted; specs left out */
function filesUnder(place) {
  if (!existsSync(place)) return [];
  const entries = readdirSync(place, { recursive: true, withFileTypes: true });
  return entries
    .filter((entry) => entry.isFile() && !isSpec(entry.name))
    .map((entry) => path.join(entry.parentPath ?? entry.path, entry.name))
    .sort();
}

/**
 * @param {string[]} places folders and files of the checkout
 * @returns {string} changes when a name or a content does
 */
export function fingerprint(places) {
  const hash = createHash('sha256').update(process.version);
  for (const place of places) {
    const isFile = path.extname(place) !== '';
    for (const file of isFile ? [place].filter((one) => existsSync(one)) : filesUnder(place)) {
      hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
    }
  }
  return hash.digest('hex');
}

const shared = ['package-lock.json', 'tsconfig.base.json', 'common/tsconfig.json', 'common/package.json', 'common/src'];
const parts = {
  server: {
    sources: [...shared, 'backend/tsconfig.json', 'backend/package.json', 'backend/src'].map((one) => at(one)),
    output: built.server,
    note: at('backend/dist/.built-from'),
  },
  client: {
    sources: [...shared, 'frontend/tsconfig.json', 'frontend/package.json', 'frontend/vite.config.ts', 'frontend/index.html', 'frontend/public', 'frontend/src'].map((one) => at(one)),
    output: path.join(built.client, 'index.html'),
    note: at('frontend/dist/.built-from'),
  },
};

function stateOf({ sources, output, note }) {
  const now = fingerprint(sources);
  const isCurrent = existsSync(output) && existsSync(note) && readFileSync(note, 'utf8') === now;
  return { now, isCurrent };
}

/** Removes what the compiler wrote for sources that are gone: a deleted migration would still run. */
export function pruneOutput(sourceDir, outputDir) {
  for (const file of filesUnder(outputDir)) {
    const match = /^(.*)\.(?:d\.ts|js)(?:\.map)?$/.exec(path.relative(outputDir, file));
    if (match?.[1] === undefined) continue;
    const source = path.join(sourceDir, match[1]);
    if (!existsSync(`${source}.ts`) && !existsSync(`${source}.tsx`)) rmSync(file);
  }
}

/** Compiles common and backend, with nothing left over from before. */
export async function compileServer() {
  pruneOutput(at('common/src'), at('common/dist'));
  pruneOutput(at('backend/src'), at('backend/dist'));
  await node('Compiling the server', [tool.tsc, '-b', 'common', 'backend'], { cwd: root });
}

async function once(part, work) {
  const lock = await waitForLock(path.join(stateDir, 'build.lock'), () => say('Another command is building; waiting for it …'));
  const { now, isCurrent } = stateOf(part);
  if (!isCurrent) {
    rmSync(part.note, { force: true });
    await work();
    if (!existsSync(part.output)) throw new Problem(`The build ended without ${path.relative(root, part.output)}.`);
    writeFileSync(part.note, now);
  }
  await lock.release();
}

export const buildServer = () =>
  once(parts.server, async () => {
    say('Building the server …');
    await compileServer();
  });

const viteBuild = (outDir) => node('Building the client', [tool.vite, 'build', '--logLevel', 'warn', '--emptyOutDir', '--outDir', outDir], { cwd: at('frontend') });

export const buildClient = () =>
  once(parts.client, async () => {
    say('Building the client …');
    await viteBuild(built.client);
  });

/**
 * The client for a test run. A start beside it may be serving the usual folder, so a changed client is built elsewhere.
 * @param {string} elsewhere folder to build into @returns {Promise<string>} folder to serve
 */
export async function clientForTests(elsewhere) {
  if (stateOf(parts.client).isCurrent) return built.client;
  await viteBuild(elsewhere);
  return elsewhere;
}
