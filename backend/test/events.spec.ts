import { randomUUID } from 'node:crypto';
import { message, roles, sentence } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import { createApp } from '../src/create-app.js';
import type { Project } from '../src/features/projects/project.entity.js';
import type { User } from '../src/features/users/user.entity.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { Listener, baseOf, cookieOf, until } from './support/listen.js';

describe('changes as they happen', () => {
  let app: TestApp;
  let base: string;
  let project: Project;
  let fire: { user: User; agent: Agent };
  const open: Listener[] = [];

  const join = async (...held: Role[]): Promise<{ user: User; agent: Agent }> => {
    const user = await app.makeUser(`A ${held[0] ?? 'nobody'}`);
    await app.join(project, user, ...held);
    return { user, agent: await app.signIn(user) };
  };
  const listen = async (user: User, at = base, cookie?: string): Promise<Listener> => {
    const listener = await Listener.open(at, project.id, cookie ?? (await cookieOf(app, user)));
    open.push(listener);
    return listener;
  };
  const addLevel = (code: string, agent = fire.agent) =>
    agent.post(`/api/projects/${project.id}/levels`).send({ code, name: 'Ground', elevationM: Number(code.slice(1)) * 4, heightM: 4 });

  beforeAll(async () => {
    app = await TestApp.start();
    base = await baseOf(app.app);
  });
  beforeEach(async () => {
    project = await app.makeProject();
    fire = await join('fire-engineer', 'specifier');
  });
  afterEach(() => { for (const listener of open.splice(0)) listener.stop(); });
  afterAll(() => app.stop());

  it('reach every open page of the project, say who did what, and no page of another', async () => {
    const [one, other] = [await listen(fire.user), await listen((await join('structural-engineer')).user)];
    const elsewhere = await app.makeProject();
    const stranger = await app.makeUser('Stranger');
    await app.join(elsewhere, stranger, 'fire-engineer');
    const foreign = await Listener.open(base, elsewhere.id, await cookieOf(app, stranger));
    open.push(foreign);
    const added = await addLevel('L1').expect(201);
    for (const listener of [one, other]) {
      const [change] = await until('the change is told', () => listener.changes.length > 0 && listener.changes);
      expect(change).toMatchObject({ topics: ['levels'], entityIds: [(added.body as { id: string }).id], by: { id: fire.user.id }, text: `${fire.user.name} added level L1 Ground` });
    }
    expect(one.headers.get('content-type')).toContain('text/event-stream');
    expect(one.headers.get('x-accel-buffering')).toBe('no');
    expect(foreign.changes).toEqual([]);
  });

  it('are told when they are committed, and not at all when they are undone', async () => {
    const listener = await listen(fire.user);
    await addLevel('L1').expect(201);
    await addLevel('L1').expect(409);
    await addLevel('L2').expect(201);
    await until('both are told', () => listener.changes.length >= 2);
    expect(listener.texts()).toEqual([`${fire.user.name} added level L1 Ground`, `${fire.user.name} added level L2 Ground`]);
  });

  it.each(roles)('tell the %s nothing that this role may not see', async (role) => {
    const watcher = await join(role);
    const listener = await listen(watcher.user);
    await addLevel('L1').expect(201);
    await fire.agent.post(`/api/projects/${project.id}/revisions`).send({ code: 'P1', purpose: 'For tender' }).expect(201);
    const joining = await app.makeUser('Newcomer');
    await fire.agent.post(`/api/projects/${project.id}/memberships`).send({ email: joining.email, roles: ['reader'] }).expect(201);
    await until('the last of the three is told', () => listener.texts().some((text) => text?.includes('Newcomer')));
    const designs = ['fire-engineer', 'structural-engineer', 'specifier'].includes(role);
    expect(listener.changes.map((change) => change.topics)).toEqual(designs ? [['levels'], ['revisions'], ['team']] : [['team']]);
    expect(listener.ready).toEqual({ missed: false });
  });

  it('make a page that was read just before read again, but not for what its reader may not see', async () => {
    await addLevel('L1').expect(201);
    expect((await listen(fire.user)).ready).toEqual({ missed: true });
    expect((await listen((await join('contractor')).user)).ready).toEqual({ missed: false });
  });

  it.each([
    ['leaves the team', (user: User) => fire.agent.delete(`/api/projects/${project.id}/memberships/${user.id}`).expect(204)],
    ['gets other roles', (user: User) => fire.agent.put(`/api/projects/${project.id}/memberships/${user.id}`).send({ roles: ['reader'] }).expect(200)],
    ['loses the account', async (user: User) => {
      const administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
      await administrator.patch(`/api/users/${user.id}`).send({ name: user.name, administrator: false, disabled: true }).expect(200);
    }],
  ])('end at once for somebody who %s', async (_, take) => {
    const leaving = await join('specifier');
    const [ends, stays] = [await listen(leaving.user), await listen(fire.user)];
    await take(leaving.user);
    await until('the stream ends', () => ends.ended);
    expect(ends.closed).toBe(true);
    expect(stays.ended).toBe(false);
  });

  it('end with the session, and only that of the browser that signed out', async () => {
    const cookie = await cookieOf(app, fire.user);
    const [ends, stays] = [await listen(fire.user, base, cookie), await listen(fire.user)];
    await fetch(`${base}/api/session`, { method: 'DELETE', headers: { cookie } });
    await until('the stream ends', () => ends.ended);
    expect(stays.ended).toBe(false);
  });

  it('do not renew an expired session by ending', async () => {
    const cookie = await cookieOf(app, fire.user);
    const listener = await listen(fire.user, base, cookie);
    await app.dataSource.query(`UPDATE "session" SET expire = now() - interval '1 minute' WHERE sess->'passport'->>'user' = $1`, [fire.user.id]);
    // any change of access has all streams looked at
    await app.dataSource.query('UPDATE memberships SET roles = roles WHERE user_id = $1', [fire.user.id]);
    await until('the stream ends', () => listener.ended);
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(await app.dataSource.query('SELECT 1 FROM "session" WHERE sess->\'passport\'->>\'user\' = $1 AND expire > now()', [fire.user.id])).toEqual([]);
  });

  it('are for five windows of a browser, and for others again when one is closed', async () => {
    const cookie = await cookieOf(app, fire.user);
    const five = [];
    for (let i = 0; i < 5; i += 1) five.push(await listen(fire.user, base, cookie));
    const sixth = await listen(fire.user, base, cookie);
    expect(sixth.status).toBe(429);
    expect(sixth.refusal?.message).toBe(sentence(message('live.too-many', { windows: 5 })));
    five[0]?.stop();
    await until('a place is free', async () => (await listen(fire.user, base, cookie)).status === 200);
  });

  it('are for five windows even where all are opened at once, and for thirty of one person', async () => {
    const cookies: string[] = [];
    for (let i = 0; i < 7; i += 1) cookies.push(await cookieOf(app, fire.user));
    const opened = await Promise.all(Array.from({ length: 8 }, () => listen(fire.user, base, cookies[0])));
    expect(opened.filter((one) => one.status === 200)).toHaveLength(5);
    for (const cookie of cookies.slice(1, 6)) await Promise.all(Array.from({ length: 5 }, () => listen(fire.user, base, cookie)));
    const beyond = await listen(fire.user, base, cookies[6]);
    expect(beyond.status).toBe(429);
    expect(beyond.refusal?.message).toBe(sentence(message('live.too-many-in-all', { windows: 30 })));
    // nobody else is kept out by it
    expect((await listen((await join('structural-engineer')).user)).status).toBe(200);
  });

  it('outlive an announcement that cannot be read', async () => {
    const listener = await listen(fire.user);
    for (const nonsense of ['', 'not JSON', '{"projectId":1}', JSON.stringify({ projectId: project.id, audience: 'everybody', topics: ['levels'], entityIds: [], by: null, at: 'yesterday', text: 'Boo' })]) {
      await app.dataSource.query(`SELECT pg_notify('mantlet_changes', $1)`, [nonsense]);
    }
    await addLevel('L3').expect(201);
    await until('the change is told', () => listener.changes.length > 0);
    expect(listener.texts()).toEqual([`${fire.user.name} added level L3 Ground`]);
  });

  it('tell of people’s longest words without losing the change', async () => {
    const listener = await listen(fire.user);
    const long = '🔥\u0001'.repeat(66) + '<b>"';
    await fire.agent.post(`/api/projects/${project.id}/levels`).send({ code: 'L4', name: long, elevationM: 16, heightM: 4 }).expect(201);
    await until('the change is told', () => listener.changes.length > 0);
  });

  it('are refused to whoever does not listen, with a sentence', async () => {
    const answer = await fire.agent.get(`/api/projects/${project.id}/events`).expect(406);
    expect((answer.body as { message: string }).message).toBe(sentence(message('live.not-a-stream', {})));
    expect((await Listener.open(base, randomUUID(), await cookieOf(app, fire.user))).status).toBe(404);
    expect((await Listener.open(base, project.id, '')).status).toBe(401);
  });

  it('break off when the database connection does, and are there again for who comes back', async () => {
    const listener = await listen(fire.user);
    await app.dataSource.query(`SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE application_name = 'mantlet events' AND datname = current_database()`);
    await until('the page is told that it hears nothing more', () => listener.ended);
    const again = await until('it may listen again', async () => {
      const one = await listen(fire.user);
      return one.status === 200 && one;
    });
    await addLevel('L9').expect(201);
    await until('the change is told', () => again.changes.length === 1);
  });

  // last: passport is one for the whole process, and the second application's accounts go with it
  it('reach the pages of every server process, which closes without waiting for them', async () => {
    const second = await createApp({ databaseUrl: String((app.dataSource.options as { url?: string }).url), sessionSecret: 'test secret', quiet: true });
    const here = await listen(fire.user);
    const there = await listen(fire.user, await baseOf(second));
    await addLevel('L1').expect(201);
    for (const listener of [here, there]) await until('the change is told', () => listener.changes.length === 1);
    const began = Date.now();
    await second.close();
    expect(Date.now() - began).toBeLessThan(3000);
    await until('its pages are told goodbye', () => there.closed && there.ended);
    expect(here.ended).toBe(false);
  });
});
