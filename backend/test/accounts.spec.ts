import { createHash } from 'node:crypto';
import type { OwnSessionDto, UserDto } from '@mantlet/common';
import { PasswordService } from '../src/features/users/password.service.js';
import type { User } from '../src/features/users/user.entity.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';

const PASSWORD = 'four unrelated words here';
const ENDED = /^This (invitation|link) has expired/;

describe('accounts', () => {
  let app: TestApp;
  let administrator: Agent;
  let counter = 0;
  const address = (): string => `invited.${(counter += 1)}@example.test`;
  const invite = async (email: string, more = {}): Promise<UserDto> =>
    (await administrator.post('/api/users').send({ name: 'Ines Vited', email, ...more }).expect(201)).body as UserDto;
  const look = (token: string, purpose = 'invitation') => app.anonymous().post('/api/account-links/look-up').send({ purpose, token });
  const use = (token: string, purpose = 'invitation', password = PASSWORD, agent = app.anonymous()) => agent.post('/api/account-links/use').send({ purpose, token, password });
  const signIn = (email: string, password: string) => app.anonymous().post('/api/session').send({ email, password });
  const expire = (email: string) => app.dataSource.query(`UPDATE account_links SET expires_at = now() - interval '1 second' WHERE user_id = (SELECT id FROM users WHERE email = $1)`, [email]);
  const trail = async (label: string): Promise<string[]> =>
    (await app.dataSource.query<{ action: string }[]>('SELECT action FROM audit_entries WHERE label = $1 ORDER BY id', [label])).map((entry) => entry.action);

  beforeAll(async () => {
    app = await TestApp.start();
    administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
  });
  afterAll(() => app.stop());

  describe('by invitation', () => {
    it('begin with a mailed link, by which the person chooses a password and is signed in', async () => {
      const email = address();
      const made = await invite(email);
      expect(made).toMatchObject({ state: 'invited', lastSignedInAt: null, mailFailure: null });
      expect(Date.parse(made.invitationExpiresAt ?? '') - Date.now()).toBeGreaterThan(6.9 * 24 * 3_600_000);
      const [mail] = await app.mail.wait(email);
      expect(mail).toMatchObject({ to: `Ines Vited <${email}>`, subject: 'Your account on Mantlet' });
      expect(mail?.text).toContain('http://mantlet.example.test/accept-invitation#');
      const token = await app.mail.token(email);
      expect(token.length).toBeGreaterThanOrEqual(43);
      // before that nobody signs in, whatever the password
      await signIn(email, '').expect(401);
      await signIn(email, PASSWORD).expect(401);
      expect((await look(token).expect(200)).body).toMatchObject({ name: 'Ines Vited', email, purpose: 'invitation' });
      const agent = app.anonymous();
      const accepted = await use(token, 'invitation', PASSWORD, agent).expect(200);
      expect(accepted.body.user).toMatchObject({ email, administrator: false });
      expect((await agent.get('/api/session')).body.user).toMatchObject({ email });
      await signIn(email, PASSWORD).expect(200);
      const now = ((await administrator.get('/api/users')).body as UserDto[]).find((one) => one.email === email);
      expect(now).toMatchObject({ state: 'active', invitationExpiresAt: null });
      expect(await trail(email)).toEqual(['invited', 'invitation accepted']);
    });

    it('keep no token that could be read from the database, and none in the audit trail', async () => {
      const email = address();
      await invite(email);
      const token = await app.mail.token(email);
      const [{ found } = { found: '' }] = await app.dataSource.query<{ found: string }[]>(
        `SELECT concat((SELECT json_agg(l)::text FROM account_links l), (SELECT json_agg(m)::text FROM mails m), (SELECT json_agg(a)::text FROM audit_entries a)) AS found`,
      );
      expect(found).toContain(createHash('sha256').update(token).digest('hex'));
      expect(found).not.toContain(token);
    });

    it('are refused with one sentence where the link is used, expired, replaced, tampered with or for something else', async () => {
      const email = address();
      const { id } = await invite(email);
      const first = await app.mail.token(email);
      const { body: again } = await administrator.post(`/api/users/${id}/invitation`).send({}).expect(201);
      expect(again).toMatchObject({ state: 'invited' });
      const second = await app.mail.token(email, 2);
      expect(second).not.toBe(first);
      const last = second.endsWith('A') ? 'B' : 'A';
      for (const [token, purpose] of [[first, 'invitation'], [`${second.slice(0, -1)}${last}`, 'invitation'], [second, 'password-reset'], ['x', 'invitation'], ['🚪', 'invitation']] as const) {
        const refused = await use(token, purpose).expect(410);
        expect(refused.body).toMatchObject({ code: 'account.link-ended' });
        expect(refused.body.message).toMatch(ENDED);
        expect((await look(token, purpose).expect(410)).body).toEqual(refused.body);
      }
      await use(second, 'invitation', 'too short').expect(400);
      await expire(email);
      await use(second).expect(410);
      await administrator.post(`/api/users/${id}/invitation`).send({}).expect(201);
      const third = await app.mail.token(email, 3);
      await use(third).expect(200);
      await use(third).expect(410);
    });

    it('are accepted once where two try at the same moment', async () => {
      const email = address();
      await invite(email);
      const token = await app.mail.token(email);
      const statuses = (await Promise.all([use(token, 'invitation', 'the first of the two'), use(token, 'invitation', 'the second of the two')])).map((answer) => answer.status);
      expect(statuses.sort()).toEqual([200, 410]);
    });

    it('are withdrawn: the link is dead and the address free for another', async () => {
      const email = address();
      const { id } = await invite(email);
      const token = await app.mail.token(email);
      await administrator.delete(`/api/users/${id}/invitation`).expect(204);
      await use(token).expect(410);
      await administrator.delete(`/api/users/${id}/invitation`).expect(404);
      await administrator.post(`/api/users/${id}/invitation`).send({}).expect(404);
      await invite(email);
      expect(await trail(email)).toEqual(['invited', 'invitation withdrawn', 'invited']);
    });

    it('are not sent twice to one address, nor to whoever is in use or closed already', async () => {
      const user = await app.makeUser('Standing');
      const twice = await administrator.post('/api/users').send({ name: 'Other', email: user.email.toUpperCase() }).expect(409);
      expect(twice.body.message).toContain(user.email);
      const over = await administrator.post(`/api/users/${user.id}/invitation`).send({}).expect(409);
      expect(over.body.message).toBe('Standing has no open invitation: the account is in use or closed.');
      await administrator.delete(`/api/users/${user.id}/invitation`).expect(409);
      const email = address();
      const { id, name } = await invite(email);
      const token = await app.mail.token(email);
      await administrator.patch(`/api/users/${id}`).send({ name, administrator: false, disabled: true }).expect(200);
      await use(token).expect(410);
    });

    it('leave the last administrator in office until the invited one has come', async () => {
      const only = ((await administrator.get('/api/users')).body as UserDto[]).find((one) => one.administrator);
      const email = address();
      await invite(email, { administrator: true });
      const dismissal = { name: 'Admin', administrator: false, disabled: false };
      await administrator.patch(`/api/users/${only?.id ?? ''}`).send(dismissal).expect(409);
      const agent = app.anonymous();
      await use(await app.mail.token(email), 'invitation', PASSWORD, agent).expect(200);
      const second = ((await agent.get('/api/users').expect(200)).body as UserDto[]).find((one) => one.email === email);
      await agent.patch(`/api/users/${second?.id ?? ''}`).send({ ...dismissal, name: 'Out' }).expect(200);
      await agent.get('/api/users').expect(403);
    });
  });

  describe('with a forgotten password', () => {
    it('answer alike for everybody, and mail those who have an account in use', async () => {
      const user = await app.makeUser('Forgetful');
      const closed = await app.makeUser('Closed');
      await app.dataSource.query('UPDATE users SET disabled = true WHERE id = $1', [closed.id]);
      const invited = address();
      await invite(invited);
      await app.mail.wait(invited);
      const ask = (email: string) => app.anonymous().post('/api/password-resets').send({ email }).expect(202);
      const answers = await Promise.all(['nobody@example.test', closed.email, invited, ` ${user.email.toUpperCase()}`].map(ask));
      for (const { body, headers } of answers) {
        expect(body).toEqual(answers[0]!.body);
        expect(headers['content-length']).toBe(answers[0]!.headers['content-length']);
        expect(headers['set-cookie']).toBeUndefined();
      }
      const [mail] = await app.mail.wait(user.email);
      expect(mail?.text).toContain('/reset-password#');
      expect(mail?.text).toContain('within 60 minutes');
      expect(await app.mail.to(closed.email)).toEqual([]);
      expect(await app.mail.to('nobody@example.test')).toEqual([]);
      expect(await app.mail.to(invited)).toHaveLength(1);
    });

    it('are opened again by the mailed link, which ends every session and every other link', async () => {
      const user = await app.makeUser('Locked Out');
      const before = await app.signIn(user);
      for (const n of [1, 2]) {
        await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
        await app.mail.wait(user.email, n);
      }
      const token = await app.mail.token(user.email, 2);
      const other = /#([\w-]+)/.exec((await app.mail.to(user.email))[0]?.text ?? '')?.[1] ?? '';
      const agent = app.anonymous();
      expect((await use(token, 'password-reset', PASSWORD, agent).expect(200)).body.user).toMatchObject({ id: user.id });
      expect((await agent.get('/api/session')).body.user).toMatchObject({ id: user.id });
      await before.get('/api/projects').expect(401);
      await use(other, 'password-reset').expect(410);
      await use(token, 'password-reset').expect(410);
      await signIn(user.email, 'a long test password').expect(401);
      await signIn(user.email, PASSWORD).expect(200);
    });

    it('do not open once the hour is over or the account is closed', async () => {
      const user = await app.makeUser('Too Late');
      await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
      const late = await app.mail.token(user.email);
      await expire(user.email);
      await use(late, 'password-reset').expect(410);
      await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
      const token = await app.mail.token(user.email, 2);
      await app.dataSource.query('UPDATE users SET disabled = true WHERE id = $1', [user.id]);
      await use(token, 'password-reset').expect(410);
      await signIn(user.email, PASSWORD).expect(401);
    });

    it('are not mailed without end', async () => {
      const user = await app.makeUser('Pestered');
      for (let asked = 0; asked < 8; asked += 1) await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
      await app.mail.wait(user.email, 5);
      await new Promise((resume) => setTimeout(resume, 300));
      expect(await app.mail.to(user.email)).toHaveLength(5);
    });

    it('put another signed-in person’s session away when a link is used over it', async () => {
      const [one, other] = [await app.makeUser('One'), await app.makeUser('Other')];
      const agent = await app.signIn(other);
      await app.anonymous().post('/api/password-resets').send({ email: one.email }).expect(202);
      await use(await app.mail.token(one.email), 'password-reset', PASSWORD, agent).expect(200);
      expect((await agent.get('/api/session')).body.user).toMatchObject({ id: one.id });
      expect(await app.dataSource.query(`SELECT 1 FROM session WHERE sess->'passport'->>'user' = $1`, [other.id])).toEqual([]);
    });
  });

  describe('with several sessions', () => {
    const open = async (user: User, userAgent: string): Promise<Agent> => {
      const agent = app.anonymous();
      await agent.post('/api/session').set('User-Agent', userAgent).send({ email: user.email, password: 'a long test password' }).expect(200);
      return agent;
    };
    const list = async (agent: Agent): Promise<OwnSessionDto[]> => (await agent.get('/api/sessions').expect(200)).body as OwnSessionDto[];

    it('list them, and end one or all but their own', async () => {
      const user = await app.makeUser('Spread Out');
      const desk = await open(user, 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0');
      const phone = await open(user, 'Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36');
      const third = await open(user, '');
      const sessions = await list(desk);
      expect(sessions[0]).toMatchObject({ device: 'Firefox on Linux', current: true });
      expect(sessions.map((one) => one.current)).toEqual([true, false, false]);
      for (const one of sessions) {
        expect(Math.abs(Date.parse(one.lastSeenAt) - Date.now())).toBeLessThan(60_000);
        expect(Math.abs(Date.parse(one.startedAt ?? '') - Date.now())).toBeLessThan(60_000);
      }
      const mobile = sessions.find((one) => one.device === 'Chrome on Android');
      await desk.delete(`/api/sessions/${mobile?.id ?? ''}`).expect(204);
      await phone.get('/api/sessions').expect(401);
      expect(await list(desk)).toHaveLength(2);
      await desk.delete('/api/sessions').expect(204);
      await third.get('/api/sessions').expect(401);
      expect(await list(desk)).toHaveLength(1);
      expect(await trail(user.email)).toEqual(['session ended', 'other sessions ended']);
    });

    it('neither see nor end anybody else’s', async () => {
      const [one, other] = [await app.makeUser('Mine'), await app.makeUser('Theirs')];
      const [mine, theirs] = [await app.signIn(one), await app.signIn(other)];
      const [foreign] = await list(theirs);
      expect((await list(mine)).map((session) => session.id)).not.toContain(foreign?.id);
      await mine.delete(`/api/sessions/${foreign?.id ?? ''}`).expect(404);
      await mine.delete('/api/sessions/not-a-session').expect(400);
      expect(await list(theirs)).toHaveLength(1);
      // what stands in the cookie is told to nobody
      const [{ sid } = { sid: '' }] = await app.dataSource.query<{ sid: string }[]>(`SELECT sid FROM session WHERE sess->'passport'->>'user' = $1`, [other.id]);
      expect(JSON.stringify(await list(theirs))).not.toContain(sid);
    });

    it('keep only the one in which the password is changed, and say so by mail', async () => {
      const user = await app.makeUser('Changing');
      const [here, there] = [await app.signIn(user), await app.signIn(user)];
      const wrong = await here.put('/api/session/password').send({ current: 'wrong', next: PASSWORD }).expect(422);
      expect(wrong.body.issues).toEqual([{ path: 'current', message: 'This is not your present password.' }]);
      await there.get('/api/sessions').expect(200);
      await here.put('/api/session/password').send({ current: 'a long test password', next: PASSWORD }).expect(204);
      await there.get('/api/sessions').expect(401);
      await here.get('/api/sessions').expect(200);
      expect((await app.mail.wait(user.email))[0]?.subject).toBe('Your password on Mantlet was changed');
    });
  });

  describe('while their password is being changed', () => {
    /** The next check of a password is answered, rightly, but only once the gate is opened. */
    const holdNextCheck = (): { reached: Promise<void>; release: () => void } => {
      const passwords = app.app.get(PasswordService);
      const verify = passwords.verify.bind(passwords);
      let [arrive, release] = [() => {}, () => {}];
      const reached = new Promise<void>((done) => { arrive = done; });
      const gate = new Promise<void>((done) => { release = done; });
      jest.spyOn(passwords, 'verify').mockImplementationOnce(async (stored, password) => {
        const right = await verify(stored, password);
        arrive();
        await gate;
        return right;
      });
      return { reached, release: () => release() };
    };
    const resetPassword = async (user: User): Promise<void> => {
      await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
      await use(await app.mail.token(user.email), 'password-reset').expect(200);
    };
    afterEach(() => jest.restoreAllMocks());

    it('are not entered by a sign-in that was under way with the old one', async () => {
      const user = await app.makeUser('In Flight');
      const here = await app.signIn(user);
      const late = app.anonymous();
      const check = holdNextCheck();
      const signingIn = late.post('/api/session').send({ email: user.email, password: 'a long test password' }).then((answer) => answer);
      await check.reached;
      await here.put('/api/session/password').send({ current: 'a long test password', next: PASSWORD }).expect(204);
      check.release();
      await signingIn;
      expect((await late.get('/api/session').expect(200)).body.user).toBeNull();
      await late.get('/api/projects').expect(401);
      await here.get('/api/projects').expect(200);
    });

    it('keep the one chosen by the mailed link, against a change with the old one that was under way', async () => {
      const user = await app.makeUser('Taken Back');
      const thief = await app.signIn(user);
      const check = holdNextCheck();
      const changing = thief.put('/api/session/password').send({ current: 'a long test password', next: 'what the thief would like' }).then((answer) => answer);
      await check.reached;
      await resetPassword(user);
      check.release();
      expect((await changing).status).toBe(422);
      await signIn(user.email, 'what the thief would like').expect(401);
      await signIn(user.email, PASSWORD).expect(200);
    });

    it('open to one of two links that are used at the same moment, and never wait for each other', async () => {
      const user = await app.makeUser('Two Links');
      for (const n of [1, 2]) {
        await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
        await app.mail.wait(user.email, n);
      }
      const tokens = (await app.mail.to(user.email)).map((mail) => /#([\w-]+)/.exec(mail.text)?.[1] ?? '');
      const statuses = (await Promise.all(tokens.map((token) => use(token, 'password-reset')))).map((answer) => answer.status);
      expect(statuses.sort()).toEqual([200, 410]);
    });

    it('are held by a session that is no longer good once the hash behind it is another', async () => {
      const user = await app.makeUser('Replaced');
      const agent = await app.signIn(user);
      await app.dataSource.query('UPDATE users SET password_hash = $2 WHERE id = $1', [user.id, await app.app.get(PasswordService).hash(PASSWORD)]);
      await agent.get('/api/projects').expect(401);
    });
  });

  it('lose a right in the middle of a session with the role that gave it', async () => {
    const project = await app.makeProject();
    const user = await app.makeUser('Demoted', { administrator: true });
    await app.join(project, user, 'specifier');
    const agent = await app.signIn(user);
    await agent.get(`/api/projects/${project.id}/zones`).expect(200);
    await agent.get('/api/users').expect(200);
    await app.dataSource.query(`UPDATE memberships SET roles = '{contractor}' WHERE user_id = $1`, [user.id]);
    await agent.get(`/api/projects/${project.id}/zones`).expect(403);
    await app.dataSource.query('DELETE FROM memberships WHERE user_id = $1', [user.id]);
    await agent.get(`/api/projects/${project.id}/zones`).expect(404);
    await app.dataSource.query('UPDATE users SET administrator = false WHERE id = $1', [user.id]);
    await agent.get('/api/users').expect(403);
  });
});

describe('trying again and again', () => {
  let app: TestApp;
  beforeEach(async () => { app = await TestApp.start(); });
  afterEach(() => app.stop());
  const attempt = (path: string, body: object) => app.anonymous().post(path).send(body);

  it.each([
    ['sign-in', '/api/session', { email: 'who@example.test', password: 'wrong' }],
    ['a forgotten password', '/api/password-resets', { email: 'who@example.test' }],
    ['a link', '/api/account-links/use', { purpose: 'invitation', token: 'guess', password: PASSWORD }],
    ['a look at a link', '/api/account-links/look-up', { purpose: 'invitation', token: 'guess' }],
  ])('is slowed down for %s, with the wait in words', async (_, path, body) => {
    const answers = [];
    for (let n = 0; n < 11; n += 1) answers.push(await attempt(path, body));
    const last = answers.at(-1)!;
    expect(answers.slice(0, 10).map((answer) => answer.status)).not.toContain(429);
    expect(last.status).toBe(429);
    expect(last.body).toEqual({ message: 'Too many attempts. Wait a minute and try again.', code: 'account.too-many-attempts' });
    expect(Number(last.headers['retry-after'])).toBeGreaterThan(0);
    expect(Number(last.headers['retry-after'])).toBeLessThanOrEqual(60);
  });

  it('does not keep others out who come from the same address', async () => {
    const user = await app.makeUser('Bystander');
    for (let n = 0; n < 11; n += 1) await attempt('/api/session', { email: 'who@example.test', password: 'wrong' });
    await app.signIn(user);
  });
});

it('guesses from many addresses at one account are slowed down, and a mailed link still opens it', async () => {
  const app = await TestApp.start({ secureCookies: true });
  try {
    const user = await app.makeUser('Besieged');
    const from = (n: number) => app.anonymous().post('/api/session').set('X-Forwarded-Proto', 'https').set('X-Forwarded-For', `203.0.113.${n}`);
    const statuses: number[] = [];
    for (let n = 0; n < 31; n += 1) statuses.push((await from(n % 4).send({ email: user.email, password: 'wrong' })).status);
    expect(statuses.filter((status) => status === 401)).toHaveLength(30);
    expect(statuses.at(-1)).toBe(429);
    await app.anonymous().post('/api/password-resets').send({ email: user.email }).expect(202);
    const token = await app.mail.token(user.email);
    await app.anonymous().post('/api/account-links/use').send({ purpose: 'password-reset', token, password: PASSWORD }).expect(200);
  } finally {
    await app.stop();
  }
});
