/** Where things are in the checkout. Everything below runs from here, whatever the caller's folder. */
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '');

/** @param {...string} parts path inside the checkout @returns absolute path */
export const at = (...parts) => path.join(root, ...parts);

/** Git-ignored: the database, uploads, caught mail, secrets and locks of this checkout. */
export const stateDir = at('.mantlet');

/** Entry file of a package's command, so that it can be run with this very Node. */
export const tool = {
  tsc: at('node_modules/typescript/bin/tsc'),
  eslint: at('node_modules/eslint/bin/eslint.js'),
  depcruise: at('node_modules/dependency-cruiser/bin/dependency-cruise.mjs'),
  jest: at('node_modules/jest/bin/jest.js'),
  vite: at('node_modules/vite/bin/vite.js'),
  vitest: at('node_modules/vitest/vitest.mjs'),
};

/** What the build leaves behind; the server's own commands. */
export const built = {
  server: at('backend/dist/main.js'),
  worker: at('backend/dist/worker/main.js'),
  migrate: at('backend/dist/database/migrate.js'),
  seedDemo: at('backend/dist/database/seed-demo.js'),
  smtpFake: at('backend/dist/smtp-fake/smtp-fake.js'),
  bench: at('backend/dist/bench/bench.js'),
  client: at('frontend/dist/app'),
};
