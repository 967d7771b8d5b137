import assert from 'node:assert/strict';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { after, before, describe, it } from 'node:test';
import { capture } from './processes.mjs';
import { freePort, isFree } from './ports.mjs';
import { serverOf, stopServer } from './postgres-folder.mjs';
import { programsFor } from './postgres-programs.mjs';
import { applicationRole, ensureDatabase, remarkOn, setRemark, startServer } from './postgres.mjs';
import { temporaryFolder } from './throw-away.mjs';

const passwords = { superuser: 'spec superuser', application: 'spec application' };

describe('the local database server', () => {
  let folder;
  let dataDir;
  let port;
  const start = (more = {}) => startServer({ dataDir, port, passwords, throwAway: true, ...more });

  before(async () => {
    folder = await temporaryFolder();
    dataDir = path.join(folder, 'postgres');
    port = await freePort();
  });
  after(async () => {
    await stopServer(dataDir);
    rmSync(folder, { recursive: true, force: true });
  });

  it('starts, keeps its data over a second start, and listens on the loopback address alone', async () => {
    const first = await start();
    assert.equal(first.port, port);
    assert.equal(await ensureDatabase(first, 'kept'), true);
    await setRemark(first, 'kept', "it's kept");
    assert.equal(await first.sql('postgres', 'show listen_addresses'), '127.0.0.1');
    assert.equal(await first.sql('postgres', 'show unix_socket_directories'), '');
    await first.stop();
    assert.equal(await isFree(port), true);

    const second = await start();
    assert.equal(await ensureDatabase(second, 'kept'), false);
    assert.equal(await remarkOn(second, 'kept'), "it's kept");
    await second.stop();
  });

  it('lets the application in by password only, and not as superuser', async () => {
    const server = await start();
    const psql = path.join(programsFor(), 'psql');
    const ask = (url) => capture(psql, ['-X', '-A', '-t', '-w', url, '-c', 'select rolsuper from pg_roles where rolname = current_user']);
    assert.equal((await ask(server.url('kept'))).out.trim(), 'f');
    assert.notEqual((await ask(`postgres://${applicationRole}@127.0.0.1:${port}/kept`)).code, 0);
    await server.stop();
  });

  it('clears the lock of a server that died', async () => {
    const server = await start();
    const { pid } = serverOf(dataDir);
    process.kill(pid, 'SIGKILL');
    while (serverOf(dataDir).state === 'running') await new Promise((resolve) => setTimeout(resolve, 50));
    assert.equal(serverOf(dataDir).state, 'stale');
    await server.stop();
    const again = await start();
    assert.equal(serverOf(dataDir).state, 'running');
    assert.equal(await ensureDatabase(again, 'kept'), false);
    await again.stop();
  });

  it('is not misled by a lock whose number a stranger now has', async () => {
    writeFileSync(path.join(dataDir, 'postmaster.pid'), `${process.pid}\n${dataDir}\n1\n${port}\n\n127.0.0.1\n`);
    assert.equal(serverOf(dataDir).state, 'stale');
    const server = await start();
    assert.notEqual(serverOf(dataDir).pid, process.pid);
    await server.stop();
  });

  it('stops a server that an earlier run left behind', async () => {
    const left = await start();
    const { pid } = serverOf(dataDir);
    const next = await start();
    assert.notEqual(serverOf(dataDir).pid, pid);
    await next.stop();
    await left.stop();
  });

  it('moves off a taken port, unless the port was asked for', async () => {
    const stranger = net.createServer().listen(port, '127.0.0.1');
    await new Promise((resolve) => stranger.once('listening', resolve));
    await assert.rejects(start({ mayMove: false }), new RegExp(`database port ${port} is in use`));
    const server = await start();
    assert.notEqual(server.port, port);
    await server.stop();
    await new Promise((resolve) => stranger.close(resolve));
  });

  it('sets a half-made data folder aside and makes a whole one', async () => {
    dataDir = path.join(folder, 'half');
    mkdirSync(path.join(dataDir, 'base'), { recursive: true });
    writeFileSync(path.join(dataDir, 'PG_VERSION'), '15\n');
    mkdirSync(`${dataDir}.making/global`, { recursive: true });
    const server = await start();
    assert.equal(await server.sql('postgres', 'select 1'), '1');
    await server.stop();
    const aside = readdirSync(folder).find((name) => name.startsWith('half.half-made-'));
    assert.equal(readFileSync(path.join(folder, aside, 'PG_VERSION'), 'utf8'), '15\n');
    assert.equal(existsSync(`${dataDir}.making`), false);
  });

  it('says that the passwords and the data do not belong together', async () => {
    await assert.rejects(start({ passwords: { superuser: 'another', application: 'another' } }), /does not know the password/);
  });

  it('names the version a data folder needs when that is not installed', async () => {
    const note = path.join(dataDir, 'PG_VERSION');
    const made = readFileSync(note, 'utf8');
    writeFileSync(note, '9\n');
    assert.throws(() => programsFor(dataDir), /made by PostgreSQL 9, which is not installed/);
    writeFileSync(note, made);
  });
});
