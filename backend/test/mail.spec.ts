import net from 'node:net';
import type { CaughtMailDto, UserDto } from '@mantlet/common';
import { createApp } from '../src/create-app.js';
import { writeMail } from '../src/features/mail/mail-templates.js';
import { TestApp } from './support/app.js';

describe('mail', () => {
  it('says in plain text and HTML the same, and lets no name in as markup or as a paragraph', () => {
    const mail = writeMail('added-to-team', { name: 'A\n\nClick here', addedBy: '<b>B</b> & "C"', project: '26-1 عمارة 🏗', roles: 'reader', link: 'http://m.example.test/projects/1' });
    expect(mail.subject).toBe('You are on the team of 26-1 عمارة 🏗');
    expect(mail.text).toContain('Hello A Click here,');
    expect(mail.html).toContain('&lt;b&gt;B&lt;/b&gt; &amp; &quot;C&quot;');
    expect(mail.html).not.toContain('<b>');
    expect(mail.html).not.toMatch(/<img|<script|src=/);
  });

  it('survives the way with every sign, and is read on the page of caught mail', async () => {
    const app = await TestApp.start();
    try {
      const administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
      const name = 'Zoë “Ω” Ælfric-Österreicher the Second of Somewhere Very Far Away 🏗 =3D';
      await administrator.post('/api/users').send({ name, email: 'far@example.test' }).expect(201);
      await app.mail.wait('far@example.test');
      const stranger = app.anonymous();
      const [first] = (await stranger.get('/api/caught-mail').expect(200)).body as CaughtMailDto[];
      expect(first).toMatchObject({ to: `${name} <far@example.test>`, subject: 'Your account on Mantlet' });
      const { body } = await stranger.get(`/api/caught-mail/${first?.id ?? ''}`).expect(200);
      expect(body.text).toMatch(/^Hello Zoë “Ω” .* 🏗 =3D,\n\nAdmin has made an account/);
      expect(body.text).toMatch(/^http:\/\/mantlet\.example\.test\/accept-invitation#[\w-]{43}$/m);
      await stranger.get('/api/caught-mail/1764000000000-00000000').expect(404);
      await stranger.get(`/api/caught-mail/${encodeURIComponent('../secrets')}`).expect(400);
      expect((await stranger.get('/api/session')).body.caughtMail).toBe(true);
    } finally {
      await app.stop();
    }
  });

  it('tells who joins a team, and nobody who was only invited', async () => {
    const app = await TestApp.start();
    try {
      const project = await app.makeProject();
      const lead = await app.makeUser('Lead');
      await app.join(project, lead, 'specifier');
      const agent = await app.signIn(lead);
      const user = await app.makeUser('Colleague');
      const at = `/api/projects/${project.id}/memberships`;
      await agent.post(at).send({ email: user.email, roles: ['contractor', 'inspector'] }).expect(201);
      const [mail] = await app.mail.wait(user.email);
      expect(mail?.subject).toBe(`You are on the team of ${project.number} ${project.name}`);
      expect(mail?.text).toContain('as contractor and inspector');
      expect(mail?.text).toContain(`http://mantlet.example.test/projects/${project.id}`);
      const administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
      await administrator.post('/api/users').send({ name: 'Waiting', email: 'waiting@example.test' }).expect(201);
      const waiting = await agent.post(at).send({ email: 'waiting@example.test', roles: ['reader'] }).expect(422);
      const nobody = await agent.post(at).send({ email: 'nobody@example.test', roles: ['reader'] }).expect(422);
      expect(waiting.body.message.replace('waiting', 'nobody')).toBe(nobody.body.message);
    } finally {
      await app.stop();
    }
  });

  const failureOf = async (app: TestApp, email: string): Promise<string | null> => {
    const administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
    await administrator.post('/api/users').send({ name: 'Unreached', email }).expect(201);
    for (let tries = 0; tries < 200; tries += 1) {
      const found = ((await administrator.get('/api/users')).body as UserDto[]).find((one) => one.email === email);
      if (found?.mailFailure) return found.mailFailure;
      await new Promise((resume) => setTimeout(resume, 25));
    }
    return null;
  };

  it('that cannot be sent is tried again, and the administrator is told why it stays', async () => {
    // a port that nobody listens on, found by asking for one and giving it back
    const port = await new Promise<number>((resolve) => {
      const server = net.createServer().listen(0, '127.0.0.1', () => { const { port: free } = server.address() as net.AddressInfo; server.close(() => resolve(free)); });
    });
    const app = await TestApp.start({ smtpUrl: `smtp://127.0.0.1:${port}` });
    try {
      expect(await failureOf(app, 'unreached@example.test')).toBe('The invitation could not be sent: the mail server cannot be reached.');
      for (let tries = 0; tries < 200; tries += 1) {
        const [{ attempts } = { attempts: 0 }] = await app.dataSource.query<{ attempts: number }[]>('SELECT attempts FROM mails');
        if (attempts === 3) return;
        await new Promise((resume) => setTimeout(resume, 25));
      }
      throw new Error('it was not tried three times');
    } finally {
      await app.stop();
    }
  });

  it('that the mail server refuses for good is not tried again', async () => {
    let connections = 0;
    const server = net.createServer((socket) => {
      connections += 1;
      socket.write('220 ready\r\n');
      socket.on('data', (data) => {
        const line = data.toString();
        socket.write(line.startsWith('RCPT') ? '550 no such mailbox\r\n' : line.startsWith('QUIT') ? '221 bye\r\n' : '250 ok\r\n');
      });
      socket.on('error', () => undefined);
    });
    const port = await new Promise<number>((resolve) => { server.listen(0, '127.0.0.1', () => resolve((server.address() as net.AddressInfo).port)); });
    const app = await TestApp.start({ smtpUrl: `smtp://127.0.0.1:${port}` });
    try {
      expect(await failureOf(app, 'refused@example.test')).toBe('The invitation could not be sent: the mail server does not accept this address.');
      await new Promise((resume) => setTimeout(resume, 200));
      expect(connections).toBe(1);
    } finally {
      await app.stop();
      server.close();
    }
  });

  it('is shown to nobody but who sits at the machine, unless it is a demonstration', async () => {
    const app = await TestApp.start();
    try {
      const ask = (headers: Record<string, string>, path = '/api/caught-mail') => app.anonymous().get(path).set(headers);
      await ask({ Host: 'localhost:4700' }).expect(200);
      // a name elsewhere that was made to lead here, and what proxies say of whom they speak for
      const strange: Record<string, string>[] = [{ Host: 'elsewhere.example' }, { Host: '127.0.0.1.elsewhere.example' }, { Host: '192.0.2.7:4700' }, { 'X-Forwarded-For': '203.0.113.9' }, { Forwarded: 'for=203.0.113.9' }, { 'X-Real-IP': '203.0.113.9' }];
      for (const headers of strange) {
        const answer = await ask(headers).expect(403);
        expect(answer.body.message).toMatch(/^Caught mail opens every account/);
        await ask(headers, '/api/caught-mail/1764000000000-00000000').expect(403);
        expect((await ask(headers, '/api/session')).body.caughtMail).toBe(false);
      }
    } finally {
      await app.stop();
    }
    const demo = await TestApp.start({ caughtMail: 'for-everybody' });
    try {
      await demo.anonymous().get('/api/caught-mail').set('Host', 'demo.example').expect(200);
    } finally {
      await demo.stop();
    }
  });

  it('is caught on no server that the public reaches over TLS', async () => {
    await expect(createApp({ databaseUrl: 'postgres://nobody@127.0.0.1:1/none', sessionSecret: 'x', secureCookies: true, caughtMailDir: '/nowhere', quiet: true }))
      .rejects.toThrow('Caught mail is for demonstrations and development');
    const app = await TestApp.start({ secureCookies: true });
    try {
      await app.anonymous().get('/api/caught-mail').expect(404);
      expect((await app.anonymous().get('/api/session')).body.caughtMail).toBe(false);
    } finally {
      await app.stop();
    }
  });
});
