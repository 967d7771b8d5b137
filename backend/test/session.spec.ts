import { TestApp } from './support/app.js';

describe('session', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());

  it('lets the first visitor of an empty installation make the administrator, and nobody after', async () => {
    const agent = app.anonymous();
    expect((await agent.get('/api/session').expect(200)).body).toEqual({ user: null, needsSetUp: true });
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
  });

  it('says in words what is wrong with the input', async () => {
    const agent = await app.signIn(await app.makeUser('Ed', { administrator: true }));
    const answer = await agent.post('/api/users').send({ name: '', email: 'no', password: 'short' }).expect(400);
    expect(answer.body.issues).toEqual(
      expect.arrayContaining([
        { path: 'name', message: 'is needed' },
        { path: 'email', message: 'is not an e-mail address' },
        { path: 'password', message: 'needs at least 12 characters' },
      ]),
    );
  });
});
