import { TestApp } from './support/app.js';

describe('session', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());

  it('lets the first visitor of an empty installation make the administrator, and nobody after', async () => {
    const agent = app.anonymous();
    expect((await agent.get('/api/session').expect(200)).body).toEqual({ user: null, needsSetUp: true, caughtMail: true });
    const account = { name: 'Ada First', email: 'Ada@Example.test', password: 'a long enough password' };
    const made = await agent.post('/api/set-up').send(account).expect(201);
    expect(made.body.user).toMatchObject({ email: 'ada@example.test', administrator: true });
    expect((await agent.get('/api/users').expect(200)).body).toHaveLength(1);
    const second = await app.anonymous().post('/api/set-up').send({ ...account, email: 'b@example.test' }).expect(409);
    expect(second.body.code).toBe('account.set-up-already');
  });

  it('answers a wrong password and an unknown account alike', async () => {
    const user = await app.makeUser('Bo');
    const wrong = await app.anonymous().post('/api/session').send({ email: user.email, password: 'wrong' }).expect(401);
    const unknown = await app.anonymous().post('/api/session').send({ email: 'nobody@example.test', password: 'wrong' }).expect(401);
    expect(wrong.body).toEqual(unknown.body);
  });

  it('renews the session at sign-in and ends it at sign-out', async () => {
    const user = await app.makeUser('Cy');
    const agent = await app.signIn(user);
    const first = await agent.post('/api/session').send({ email: user.email, password: 'a long test password' }).expect(200);
    expect(first.headers['set-cookie']).toBeDefined();
    expect((await agent.get('/api/session')).body.user).toMatchObject({ name: 'Cy' });
    await agent.delete('/api/session').expect(204);
    expect((await agent.get('/api/session')).body.user).toBeNull();
    await agent.get('/api/users').expect(401);
  });

  it('takes no identifier that somebody else chose or held before', async () => {
    const user = await app.makeUser('Fix');
    const cookieOf = (answer: { headers: Record<string, unknown> }): string => /mantlet\.sid=[^;]+/.exec(String(answer.headers['set-cookie']))?.[0] ?? '';
    const signIn = (cookie: string) => app.anonymous().post('/api/session').set('Cookie', cookie).send({ email: user.email, password: 'a long test password' }).expect(200);
    const planted = 'mantlet.sid=s%3Aplanted.signature';
    const first = cookieOf(await signIn(planted));
    expect(first).not.toBe('');
    expect(first).not.toBe(planted);
    const second = cookieOf(await signIn(first));
    expect(second).not.toBe('');
    expect(second).not.toBe(first);
    // whoever kept the old one is not carried along
    await app.anonymous().get('/api/projects').set('Cookie', first).expect(401);
    await app.anonymous().get('/api/projects').set('Cookie', second).expect(200);
  });

  it('does not believe a proxy that nobody put there: another address in the header is no other address', async () => {
    const user = await app.makeUser('Spoofed');
    const statuses: number[] = [];
    for (let i = 0; i < 11; i += 1) statuses.push((await app.anonymous().post('/api/session').set('X-Forwarded-For', `203.0.113.${i}`).send({ email: user.email, password: 'wrong' })).status);
    expect(statuses.at(-1)).toBe(429);
  });

  it('throttles guesses at one account', async () => {
    const user = await app.makeUser('Di');
    const statuses: number[] = [];
    for (let i = 0; i < 12; i += 1) statuses.push((await app.anonymous().post('/api/session').send({ email: user.email, password: 'wrong' })).status);
    expect(statuses.slice(0, 10).every((status) => status === 401)).toBe(true);
    expect(statuses.at(-1)).toBe(429);
  });

  it('refuses a write that another site sends', async () => {
    const answer = await app.anonymous().post('/api/session').set('Origin', 'https://elsewhere.example').send({}).expect(403);
    expect(answer.body.message).toMatch(/^Only pages of this installation/);
    await app.anonymous().post('/api/session').set('Origin', 'null').send({}).expect(403);
    await app.anonymous().post('/api/session').set('Origin', 'no address').send({}).expect(403);
  });

  it('keeps one of two administrators who put each other out of office at the same moment', async () => {
    const agents = await Promise.all([app.makeUser('Fa', { administrator: true }), app.makeUser('Gi', { administrator: true })].map(async (made) => ({ user: await made, agent: await app.signIn(await made) })));
    await app.dataSource.query('UPDATE users SET administrator = false WHERE id <> ALL($1)', [agents.map(({ user }) => user.id)]);
    const dismiss = (by: number, of: number) => agents[by]!.agent.patch(`/api/users/${agents[of]!.user.id}`).send({ name: 'Out', administrator: false, disabled: false });
    const statuses = (await Promise.all([dismiss(0, 1), dismiss(1, 0)])).map((answer) => answer.status);
    // the second is told that it is the last one, or that it is no administrator any more
    expect(statuses.filter((status) => status === 200)).toHaveLength(1);
    expect(await app.dataSource.query('SELECT count(*)::int AS n FROM users WHERE administrator AND NOT disabled')).toEqual([{ n: 1 }]);
  });

  it('says in words what is wrong with the input', async () => {
    const agent = await app.signIn(await app.makeUser('Ed', { administrator: true }));
    const answer = await agent.post('/api/users').send({ name: '', email: 'no' }).expect(400);
    expect(answer.body.issues).toEqual(
      expect.arrayContaining([
        { path: 'name', message: 'is needed' },
        { path: 'email', message: 'is not an e-mail address' },
      ]),
    );
  });
});

describe('session behind a TLS proxy', () => {
  it('gives a cookie that travels over TLS only', async () => {
    const app = await TestApp.start({ secureCookies: true });
    try {
      const { email } = await app.makeUser('Ha');
      const answer = await app.anonymous().post('/api/session').set('X-Forwarded-Proto', 'https').send({ email, password: 'a long test password' }).expect(200);
      expect(String(answer.headers['set-cookie'])).toMatch(/HttpOnly; Secure; SameSite=Lax/);
    } finally {
      await app.stop();
    }
  });
});
