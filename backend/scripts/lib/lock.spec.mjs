import assert from 'node:assert/strict';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { after, before, describe, it } from 'node:test';
import { takeLock } from './lock.mjs';
import { capture, identity, isAlive, startProcess, startedAt } from './processes.mjs';
import { answers, freePort, isFree, portFrom } from './ports.mjs';

describe('locks, processes and ports', () => {
  let folder;
  before(() => (folder = mkdtempSync(path.join(os.tmpdir(), 'mantlet-spec-'))));
  after(() => rmSync(folder, { recursive: true }));

  it('refuses a second taker and names the first', async () => {
    const file = path.join(folder, 'one.json');
    const first = takeLock(file, { what: 'npm start' });
    const second = takeLock(file);
    assert.equal(second.heldBy.what, 'npm start');
    assert.equal(second.heldBy.pid, process.pid);
    await first.release();
    assert.equal(existsSync(file), false);
  });

  it('clears a lock whose number now belongs to another process', async () => {
    const file = path.join(folder, 'two.json');
    writeFileSync(file, JSON.stringify({ pid: process.pid, startedAt: '1', children: [] }));
    const lock = takeLock(file);
    assert.equal(lock.heldBy, null);
    assert.equal(lock.left.startedAt, '1');
    await lock.release();
  });

  it('clears a lock that was half written', async () => {
    const file = path.join(folder, 'three.json');
    writeFileSync(file, '{"pid":');
    const lock = takeLock(file);
    assert.equal(lock.heldBy, null);
    await lock.release();
  });

  it('stops a process together with what it started', async () => {
    const running = startProcess('sh', ['-c', 'sleep 60 & echo $!; wait'], { stdio: ['ignore', 'pipe', 'ignore'] });
    const grandchild = Number(await new Promise((resolve) => running.child.stdout.once('data', (data) => resolve(String(data)))));
    assert.ok(isAlive(identity(grandchild)));
    await running.stop();
    assert.equal(startedAt(grandchild), null);
  });

  it('keeps what a program said and how it ended', async () => {
    assert.deepEqual(await capture('sh', ['-c', 'echo out; echo err >&2; exit 3']), { code: 3, out: 'out\n', err: 'err\n' });
    await assert.rejects(capture('no-such-program', []), /no-such-program is not installed/);
  });

  it('tells a free port from a taken one', async () => {
    const net = await import('node:net');
    const port = await freePort();
    assert.equal(await isFree(port), true);
    const server = net.createServer().listen(port, '127.0.0.1');
    await new Promise((resolve) => server.once('listening', resolve));
    assert.equal(await isFree(port), false);
    assert.equal(await answers(port), true);
    await new Promise((resolve) => server.close(resolve));
    assert.equal(await answers(port), false);
  });

  it('says what is wrong with a port that is no number', () => {
    process.env.MANTLET_SPEC_PORT = '47OO';
    assert.throws(() => portFrom('MANTLET_SPEC_PORT', 4700), /MANTLET_SPEC_PORT is “47OO”.*MANTLET_SPEC_PORT=4700/);
    delete process.env.MANTLET_SPEC_PORT;
    assert.equal(portFrom('MANTLET_SPEC_PORT', 4700), 4700);
  });
});
