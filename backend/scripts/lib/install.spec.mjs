import assert from 'node:assert/strict';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { after, before, describe, it } from 'node:test';
import { packagesMissing } from './install.mjs';

describe('telling whether the npm packages must be installed', () => {
  let folder;
  before(() => (folder = mkdtempSync(path.join(os.tmpdir(), 'mantlet-spec-'))));
  after(() => rmSync(folder, { recursive: true }));

  const write = (name, packages) => {
    const file = path.join(folder, name);
    writeFileSync(file, JSON.stringify({ packages }));
    return file;
  };
  const wanted = { '': {}, backend: {}, 'node_modules/a': { version: '1.0.0' }, 'node_modules/b': { version: '2.0.0', optional: true } };

  it('is content with what the lock file says, optional packages aside', () => {
    assert.equal(packagesMissing(write('lock', wanted), write('note', { 'node_modules/a': { version: '1.0.0' } })), null);
  });

  it('notices a first start, a missing package and another version', () => {
    const lock = write('lock', wanted);
    assert.match(packagesMissing(lock, path.join(folder, 'absent')), /not installed yet/);
    assert.match(packagesMissing(lock, write('note', {})), /node_modules\/a is missing/);
    assert.match(packagesMissing(lock, write('note', { 'node_modules/a': { version: '0.9.0' } })), /is 0\.9\.0, the lock file says 1\.0\.0/);
  });
});
