import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import request from 'supertest';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { baseOf } from './support/listen.js';

type Headers = Record<string, string | undefined>;
const policyOf = (headers: Headers): Record<string, string> =>
  Object.fromEntries((headers['content-security-policy'] ?? '').split(';').map((rule) => [rule.split(' ')[0], rule.split(' ').slice(1).join(' ')]));

/** What a browser is told, and what is refused of it, whoever sits in front. */
describe('a browser', () => {
  let app: TestApp;
  let folder: string;
  let base: string;
  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'mantlet-client-'));
    writeFileSync(join(folder, 'index.html'), '<!doctype html><style nonce="MANTLET_NONCE">a{}</style><meta name="style-nonce" content="MANTLET_NONCE">');
    writeFileSync(join(folder, 'main-1a2b.js'), 'export {};');
    app = await TestApp.start({ clientDir: folder });
    base = await baseOf(app.app);
  });
  afterAll(async () => {
    await app.stop();
    rmSync(folder, { recursive: true, force: true });
  });
  /** of the client, whose answers no route of ours states */
  const page = (path = '/') => request(base).get(path).set('Accept', 'text/html');

  it('runs nothing but the server’s own files, and styles with the nonce of this very answer', async () => {
    const { headers, text } = await page().expect(200);
    const policy = policyOf(headers as Headers);
    const nonce = /'nonce-([A-Za-z0-9+/]{22}==)'/.exec(policy['style-src'] ?? '')?.[1] ?? '';
    expect(nonce).not.toBe('');
    expect(text.match(/nonce="([^"]*)"/)?.[1]).toBe(nonce);
    expect(text).not.toContain('MANTLET_NONCE');
    expect(policy).toEqual({
      'default-src': "'none'", 'script-src': "'self'", 'style-src': `'self' 'nonce-${nonce}'`, 'img-src': "'self' data:", 'font-src': "'self'", 'connect-src': "'self'",
      'frame-src': "'self'", 'manifest-src': "'self'", 'object-src': "'none'", 'base-uri': "'none'", 'form-action': "'self'", 'frame-ancestors': "'none'",
    });
    expect(headers).toMatchObject({
      'cache-control': 'no-store', 'x-content-type-options': 'nosniff', 'x-frame-options': 'DENY', 'referrer-policy': 'no-referrer', 'cross-origin-opener-policy': 'same-origin',
    });
    expect(headers['x-powered-by']).toBeUndefined();
  });

  it('gets a nonce that no other answer has, at every address of the client', async () => {
    const nonces = await Promise.all(['/', '/', '/projects/1/members?sort=mark', '/sign-in?to=//elsewhere.example'].map(async (path) => {
      const { headers, text } = await page(path).set('Host', 'elsewhere.example').expect(200);
      // nothing of the request comes back in the page
      expect(text).not.toContain('elsewhere');
      return /'nonce-([^']+)'/.exec(String(headers['content-security-policy']))?.[1];
    }));
    expect(new Set(nonces).size).toBe(4);
  });

  it('keeps the built files, which have a name of their own for each content, and nothing of the API', async () => {
    expect((await request(base).get('/main-1a2b.js').expect(200)).headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const agent = await app.signIn(await app.makeUser('Reading'));
    for (const path of ['/api/session', '/api/projects', '/api/sessions', '/api/no-such-page', '/api/docs/openapi.json']) {
      expect((await agent.get(path)).headers['cache-control']).toBe('no-store');
    }
    expect((await request(base).get('/API/projects').set('Accept', 'application/json').expect(401)).headers['cache-control']).toBe('no-store');
    await request(base).get('/..%2f..%2fetc%2fpasswd').set('Accept', 'application/json').expect(404);
  });

  it('may show the PDF inside the schedule’s own page, and no other answer inside any', async () => {
    const agent = await app.signIn(await app.makeUser('Framing'));
    const ancestors = async (path: string): Promise<[string | undefined, unknown]> => {
      const { headers } = await agent.get(path);
      return [policyOf(headers as Headers)['frame-ancestors'], headers['x-frame-options']];
    };
    expect(await ancestors('/api/projects/1/revisions/2/pdf')).toEqual(["'self'", 'SAMEORIGIN']);
    for (const path of ['/api/projects/1/revisions/2', '/api/projects/1/revisions/2/pdf/more', '/api/projects/1/revisions/2/verify', '/api/session', '/api/docs']) {
      expect(await ancestors(path)).toEqual(["'none'", 'DENY']);
    }
  });

  it('lets in styles without a nonce on the documentation’s pages alone', async () => {
    const agent = await app.signIn(await app.makeUser('Looking up'));
    expect(policyOf((await agent.get('/api/docs/').expect(200)).headers as Headers)).toMatchObject({ 'style-src': "'self' 'unsafe-inline'", 'script-src': "'self'" });
    for (const path of ['/api/docsx', '/api/projects', '/docs']) expect(policyOf((await request(base).get(path)).headers as Headers)['style-src']).not.toContain('unsafe');
  });

  describe('that writes', () => {
    let agent: Agent;
    let own: string;
    let count = 0;
    beforeAll(async () => {
      agent = await app.signIn(await app.makeUser('Writing'));
      own = new URL(base).host;
    });
    const write = (headers: Record<string, string>) => {
      count += 1;
      return agent.post('/api/projects').set(headers).send({ number: `W-${count}`, name: 'Written', place: 'Here', currency: 'EUR', note: '', roles: ['specifier'] });
    };

    it.each<[string, () => Record<string, string>]>([
      ['another site', () => ({ Origin: 'https://elsewhere.example' })],
      ['another port', () => ({ Origin: 'http://127.0.0.1:1' })],
      ['a name that begins like ours', () => ({ Origin: `http://${own}.elsewhere.example` })],
      ['a name in front of which ours stands as a user', () => ({ Origin: `http://${own}@elsewhere.example` })],
      ['a sandboxed page', () => ({ Origin: 'null' })],
      ['nonsense', () => ({ Origin: '//' })],
      ['another site, as the browser says', () => ({ 'Sec-Fetch-Site': 'cross-site' })],
      ['a neighbour of the same site', () => ({ Origin: `http://${own}`, 'Sec-Fetch-Site': 'same-site' })],
      ['anything the browser does not say', () => ({ 'Sec-Fetch-Site': 'something new' })],
    ])('is refused where it comes from %s', async (_, headers) => {
      const before = (await agent.get('/api/projects')).body as unknown[];
      const answer = await write(headers()).expect(403);
      expect(answer.body).toMatchObject({ code: 'shared.forbidden', message: expect.stringMatching(/^Only pages of this installation/) as string });
      expect(answer.headers['cache-control']).toBe('no-store');
      expect((await agent.get('/api/projects')).body).toHaveLength(before.length);
    });

    it('is let through from its own pages, and where no browser speaks', async () => {
      await write({ Origin: `http://${own}`, 'Sec-Fetch-Site': 'same-origin' }).expect(201);
      await write({ 'Sec-Fetch-Site': 'none' }).expect(201);
      await write({}).expect(201);
    });

    it('is refused with every method that changes something, before anybody is asked who they are', async () => {
      for (const method of ['post', 'put', 'patch', 'delete'] as const) {
        await agent[method]('/api/session').set('Origin', 'https://elsewhere.example').expect(403);
      }
      await agent.post('/api/session').set('X-HTTP-Method-Override', 'GET').set('Origin', 'https://elsewhere.example').expect(403);
      // it is still signed in
      await agent.get('/api/projects').set('Origin', 'https://elsewhere.example').expect(200);
    });

    it('tells no other site that it may read', async () => {
      const { headers } = await agent.get('/api/projects').set('Origin', 'https://elsewhere.example').expect(200);
      expect(Object.keys(headers).filter((name) => name.startsWith('access-control'))).toEqual([]);
      expect(headers['cross-origin-resource-policy']).toBe('same-origin');
    });
  });
});
