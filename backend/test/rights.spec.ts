import { roles } from '@mantlet/common';
import type { Role } from '@mantlet/common';
import { MemberAcceptance } from '../src/features/members/member-acceptance.entity.js';
import { Member } from '../src/features/members/member.entity.js';
import { Membership } from '../src/features/memberships/membership.entity.js';
import { Product } from '../src/features/products/product.entity.js';
import { Project } from '../src/features/projects/project.entity.js';
import { ZoneSystem } from '../src/features/zones/zone-system.entity.js';
import { Zone } from '../src/features/zones/zone.entity.js';
import { accessTable } from './access.table.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';
import { digestOfEverything } from './support/digest.js';
import { furnish, pathIn } from './support/two-projects.js';
import type { Furnished } from './support/two-projects.js';
import { validBodies } from './support/valid-bodies.js';
import type { Things } from './support/valid-bodies.js';

type Verb = 'get' | 'post' | 'put' | 'patch' | 'delete';
const split = (key: string): [Verb, string] => key.split(' ').map((part, i) => (i ? part : part.toLowerCase())) as [Verb, string];
const furtherIds = Object.keys(accessTable).filter((key) => /:projectId\/.*:/.test(key));

let app: TestApp;
beforeAll(async () => {
  app = await TestApp.start();
});
afterAll(() => app.stop());

describe('rights across projects', () => {
  let a: Furnished;
  let b: Furnished;
  beforeAll(async () => {
    [a, b] = [await furnish(app), await furnish(app)];
  });

  const send = (key: string, path: string, things: Things) => {
    const [verb] = split(key);
    const sent = a.everything[verb](path);
    if (key.endsWith('evidence-file') && verb === 'put') return sent.attach('file', Buffer.from('a,b\n1,2\n'), 'evidence.csv');
    const body = validBodies[key]?.(things);
    return body ? sent.send(body) : sent;
  };

  it.each(furtherIds)('%s with the id of another project’s thing finds nothing and changes nothing', async (key) => {
    const before = await digestOfEverything(app.dataSource);
    const path = pathIn(split(key)[1], a.project.id, b.things);
    const answer = await send(key, `${path}${/^DELETE/.test(key) ? '?version=1' : ''}`, a.things);
    expect({ status: answer.status, message: (answer.body as { message: string }).message }).toEqual({ status: 404, message: expect.stringMatching(/^There is no such /) });
    expect(await digestOfEverything(app.dataSource)).toEqual(before);
  });

  const named: [string, (mine: Things, theirs: Things) => object][] = [
    ['POST /api/projects/:projectId/zones', (mine, { levelId }) => validBodies['POST /api/projects/:projectId/zones']!({ ...mine, levelId })],
    ['PATCH /api/projects/:projectId/zones/:zoneId', (mine, { levelId }) => validBodies['PATCH /api/projects/:projectId/zones/:zoneId']!({ ...mine, levelId })],
    ['PUT /api/projects/:projectId/zones/:zoneId/protection', (mine, { productId }) => validBodies['PUT /api/projects/:projectId/zones/:zoneId/protection']!({ ...mine, productId })],
    ...(['zoneId', 'sectionId'] as const).flatMap((name): typeof named => [
      ['POST /api/projects/:projectId/members', (mine, theirs) => validBodies['POST /api/projects/:projectId/members']!({ ...mine, [name]: theirs[name] })],
      ['PATCH /api/projects/:projectId/members/:memberId', (mine, theirs) => validBodies['PATCH /api/projects/:projectId/members/:memberId']!({ ...mine, [name]: theirs[name] })],
      ...['bulk', 'bulk/preview'].map((tail): typeof named[number] => [`POST /api/projects/:projectId/members/${tail}`, (mine, theirs) => ({ members: [{ id: mine.memberId, version: 1 }], set: { [name]: theirs[name] } })]),
    ]),
    ['PUT /api/projects/:projectId/imports/:importId/mapping', (mine, { zoneId }) => ({ ...validBodies['PUT /api/projects/:projectId/imports/:importId/mapping']!(mine), defaults: { zoneId } })],
    ...['bulk', 'bulk/preview', 'structural', 'delete'].map((tail) => `POST /api/projects/:projectId/members/${tail}`).flatMap((key): typeof named => [
      [key, (_, theirs) => validBodies[key]!(theirs)],
      [key, (mine, theirs) => ({ ...validBodies[key]!(mine), members: [{ id: mine.memberId, version: 1 }, { id: theirs.memberId, version: 1 }] })],
    ]),
    ...['POST /api/projects/:projectId/acceptances', 'DELETE /api/projects/:projectId/acceptances'].flatMap((key): typeof named => [
      [key, (_, theirs) => validBodies[key]!(theirs)],
      // one of one's own beside it does not help
      [key, (mine, theirs) => ({ ...validBodies[key]!(mine), memberIds: [mine.memberId, theirs.memberId] })],
    ]),
  ];
  it.each(named)('%s that names another project’s thing in its body is refused, and changes nothing', async (key, body) => {
    const before = await digestOfEverything(app.dataSource);
    const [verb, path] = split(key);
    const answer = await a.everything[verb](pathIn(path, a.project.id, a.things)).send(body(a.things, b.things));
    expect([404, 409, 422]).toContain(answer.status);
    expect(await digestOfEverything(app.dataSource)).toEqual(before);
  });

  it.each(['bulk', 'bulk/preview', 'structural', 'delete', 'acceptances'])('all that a filter finds in another project is not found for %s, whatever the number and stamp seen there', async (tail) => {
    const filter = { memberIds: [b.things.memberId] };
    const { body: seen } = await b.everything.post(b.url('members/found')).send({ filter }).expect(200);
    expect(seen).toMatchObject({ count: 1 });
    const found = { filter, count: 1, stamp: (seen as { stamp: string }).stamp };
    const before = await digestOfEverything(app.dataSource);
    const path = tail === 'acceptances' ? tail : `members/${tail}`;
    const { members: _, memberIds: __, ...rest } = validBodies[`POST /api/projects/:projectId/${path}`]!(a.things) as Record<string, unknown>;
    const answer = await a.everything.post(a.url(path)).send({ ...rest, found });
    expect(answer.status).toBe(409);
    expect(await digestOfEverything(app.dataSource)).toEqual(before);
    const { body: none } = await a.everything.post(a.url('members/found')).send({ filter }).expect(200);
    expect(none).toMatchObject({ count: 0 });
  });

  it('a list asked for another project’s things is empty', async () => {
    for (const query of [{ zoneIds: b.things.zoneId }, { levelIds: b.things.levelId }, { productIds: b.things.productId }, { memberIds: b.things.memberId }]) {
      const answer = await a.everything.get(a.url('members')).query(query).expect(200);
      expect((answer.body as { total: number }).total).toBe(0);
    }
    const trail = await a.everything.get(a.url('audit')).query({ entityId: b.things.revisionId }).expect(200);
    expect((trail.body as { total: number }).total).toBe(0);
  });
});

/** Who decides what, from the product's own description of its people. */
const decides: Record<string, readonly Role[]> = {
  'zone.levelId': ['fire-engineer'], 'zone.code': ['fire-engineer'], 'zone.name': ['fire-engineer'], 'zone.periodMin': ['fire-engineer'], 'zone.curve': ['fire-engineer'],
  'zone.reference': ['fire-engineer'], 'zone.environment': ['specifier'], 'zone.targetPolicy': ['specifier'], 'zone.systems': ['specifier'],
  'member.zoneId': ['specifier'], 'member.mark': ['specifier'], 'member.memberType': ['specifier'], 'member.sectionId': ['specifier'], 'member.grade': ['specifier'],
  'member.lengthMm': ['specifier'], 'member.quantity': ['specifier'], 'member.exposure': ['specifier'], 'member.protectionForm': ['specifier'], 'member.onSite': ['specifier'],
  'member.note': ['specifier'], 'member.deductionM2': ['specifier'], 'member.coatBackConnections': ['specifier'], 'member.coatBackGirthMm': ['specifier'],
  // actions, restraint, utilisation and declared temperature are one: where the critical temperature comes from
  'member.basis': ['structural-engineer'], 'member.acceptances': ['fire-engineer'],
  'project.designBasis': ['fire-engineer'], 'project.readingRules': ['specifier'], 'project.deductions': ['specifier'], 'project.contractorSeesPrices': ['specifier'],
  'project.markUpPercent': ['specifier'], 'project.distribution': ['specifier'],
  'project.number': ['fire-engineer', 'specifier'], 'project.name': ['fire-engineer', 'specifier'], 'project.place': ['fire-engineer', 'specifier'],
  'project.currency': ['fire-engineer', 'specifier'], 'project.note': ['fire-engineer', 'specifier'],
  'product.name': ['specifier'], 'product.supply': ['specifier'], 'product.evidence': ['specifier'], 'product.evidenceExpiresOn': ['specifier'],
  'team.roles': ['fire-engineer', 'specifier'],
};

describe('rights per field', () => {
  async function fieldsOf(p: Furnished): Promise<Record<string, unknown>> {
    const { manager } = app.dataSource;
    const { zoneId, memberId, productId } = p.things;
    const { settings, ...project } = await manager.findOneByOrFail(Project, { id: p.project.id });
    const all = {
      zone: { ...(await manager.findOneByOrFail(Zone, { id: zoneId })), systems: (await manager.findBy(ZoneSystem, { zoneId })).map((one) => `${one.memberType} ${one.productId}`).sort() },
      member: { ...(await manager.findOneByOrFail(Member, { id: memberId })), acceptances: await manager.countBy(MemberAcceptance, { memberId }) },
      project: { ...project, ...settings },
      product: await manager.findOneByOrFail(Product, { id: productId }),
      team: { roles: (await manager.find(Membership, { where: { projectId: p.project.id }, order: { userId: 'ASC' } })).map((one) => one.roles) },
    };
    return Object.fromEntries(Object.keys(decides).map((field) => {
      const [thing, name] = field.split('.') as [keyof typeof all, string];
      return [field, JSON.stringify((all[thing] as unknown as Record<string, unknown>)[name])];
    }));
  }

  /** Every route that writes to these things, each sent everything that anybody might decide. */
  async function tryEverything(p: Furnished, agent: Agent): Promise<void> {
    const { things } = p;
    const versionOf = async (entity: typeof Zone | typeof Member | typeof Project | typeof Product, id: string): Promise<number> =>
      (await app.dataSource.manager.findOneByOrFail<{ id: string; version: number }>(entity, { id })).version;
    const body = (key: string): object => validBodies[key]!({ ...things, levelId: p.zones.Z02.levelId });
    const all = (keys: string[]): object => Object.assign({}, ...keys.map(body)) as object;
    const at = '/api/projects/:projectId';
    const zone = { ...all([`PATCH ${at}/zones/:zoneId`, `PUT ${at}/zones/:zoneId/protection`]) };
    const member = {
      ...all([`PATCH ${at}/members/:memberId`, `PUT ${at}/members/:memberId/structural`]), zoneId: p.zones.Z02.id, sectionId: p.members.get('B0-002')!.sectionId,
      memberType: 'column', onSite: false, note: 'changed', deductionM2: 0.5, coatBackConnections: 2, coatBackGirthMm: 600,
    };
    const project = {
      ...all([`PATCH ${at}`, `PUT ${at}/design-basis`, `PUT ${at}/takeoff-settings`]), readingRules: { sectionFactor: 'next-row-up', temperature: 'linear' },
      number: `T-${p.project.id.slice(0, 8)}`,
      deductions: { endLapMm: 10, openingThresholdM2: 0.2, coatBackMm: 400 }, contractorSeesPrices: true, distribution: ['list@example.test'],
    };
    const product = { ...all([`PUT ${at}/products/:productId`]), evidenceExpiresOn: '2098-01-01' };
    const path = (tail: string): string => pathIn(`${at}${tail}`, p.project.id, things);
    // first, while the critical temperature is an assumed one: what may be accepted
    await app.dataSource.manager.update(Member, things.memberId, { basis: { way: 'assumed' } });
    await p.everything.post(path('/recalculate'));
    await agent.post(path('/acceptances')).send(body(`POST ${at}/acceptances`));
    await agent.put(path('/memberships/:userId')).send({ roles: ['reader'] });
    await agent.put(path('/products/:productId')).send({ ...product, version: await versionOf(Product, things.productId) });
    for (const tail of ['/zones/:zoneId', '/zones/:zoneId/protection']) await agent[tail.endsWith('n') ? 'put' : 'patch'](path(tail)).send({ ...zone, version: await versionOf(Zone, things.zoneId) });
    await agent.post(path('/members/bulk')).send({ members: [{ id: things.memberId, version: await versionOf(Member, things.memberId) }], set: member });
    await agent.post(path('/members/structural')).send({ members: [{ id: things.memberId, version: await versionOf(Member, things.memberId) }], basis: { way: 'declared', temperatureC: 562, reference: 'r' } });
    await agent.patch(path('/members/:memberId')).send({ ...member, version: await versionOf(Member, things.memberId) });
    await agent.put(path('/members/:memberId/structural')).send({ ...member, version: await versionOf(Member, things.memberId) });
    await agent.patch(path('')).send({ ...project, version: await versionOf(Project, p.project.id) });
    for (const tail of ['/design-basis', '/takeoff-settings']) await agent.put(path(tail)).send({ ...project, version: await versionOf(Project, p.project.id) });
  }

  it.each(roles)('the %s changes what is theirs to decide, by whatever route, and nothing else', async (role) => {
    const p = await furnish(app);
    await app.dataSource.manager.update(Member, p.things.memberId, { basis: { way: 'assumed' } });
    const before = await fieldsOf(p);
    await tryEverything(p, p.team[role]);
    const after = await fieldsOf(p);
    const changed = Object.keys(decides).filter((field) => before[field] !== after[field]);
    expect(changed).toEqual(Object.keys(decides).filter((field) => decides[field]!.includes(role)));
  });
});

describe('rights as they change', () => {
  let p: Furnished;
  beforeAll(async () => {
    p = await furnish(app);
  });

  it('several roles add up, and one that is taken away ends at the next request', async () => {
    const user = await app.makeUser('Both');
    const agent = await app.signIn(user);
    const setRoles = (...held: Role[]) => p.everything.put(p.url(`memberships/${user.id}`)).send({ roles: held }).expect(200);
    await p.everything.post(p.url('memberships')).send({ email: user.email, roles: ['contractor'] }).expect(201);
    const asFire = () => agent.post(p.url('levels')).send({ code: `L${Math.random()}`, name: 'Roof', elevationM: 90, heightM: 3 });
    const asSpecifier = () => agent.patch(p.url(`revisions/${p.things.revisionId}`)).send({ code: 'P01', purpose: `${Math.random()}` });
    await asFire().expect(403);
    await asSpecifier().expect(403);
    await setRoles('fire-engineer', 'specifier');
    await asFire().expect(201);
    await asSpecifier().expect(200);
    await setRoles('fire-engineer');
    await asFire().expect(201);
    await asSpecifier().expect(403);
    await setRoles('reader');
    await agent.get(p.url('zones')).expect(403);
    await agent.get(p.url('site')).expect(200);
    await p.everything.delete(p.url(`memberships/${user.id}`)).expect(204);
    await agent.get(p.url('site')).expect(404);
  });

  it('those who see issued work only are shown nothing of what is not', async () => {
    await p.everything.post(p.url(`revisions/${p.things.revisionId}/prepare`)).expect(200);
    await p.checker.post(p.url(`revisions/${p.things.revisionId}/check`)).expect(200);
    await p.checker.post(p.url(`revisions/${p.things.revisionId}/issue`)).expect(200);
    const { manager } = app.dataSource;
    // after the issue: everything that is new is draft
    await manager.update(Zone, p.things.zoneId, { name: 'SECRET zone', reference: 'SECRET reference' });
    await manager.update(Member, p.things.memberId, { mark: 'SECRET-1', note: 'SECRET note' });
    const product = await manager.findOneByOrFail(Product, { id: p.things.productId });
    await manager.update(Product, product.id, { name: 'SECRET coating', supply: { ...product.supply, materialRate: '98765.43' } });
    const draft = await p.everything.post(p.url('revisions')).send({ code: 'SECRET-P02', purpose: 'SECRET purpose' }).expect(201);
    const secrets = /SECRET|98765/;
    expect((await p.everything.get(p.url('members'))).text).toMatch(secrets);
    for (const role of ['contractor', 'inspector', 'reader'] as const) {
      for (const key of Object.keys(accessTable).filter((one) => one.startsWith('GET '))) {
        for (const revisionId of key.includes(':revisionId') ? [p.things.revisionId, (draft.body as { id: string }).id] : [p.things.revisionId]) {
          const answer = await p.team[role].get(pathIn(split(key)[1], p.project.id, { ...p.things, revisionId }));
          expect({ role, key, leaks: secrets.test(answer.text ?? '') }).toEqual({ role, key, leaks: false });
        }
      }
      await p.team[role].get(p.url(`revisions/${p.things.revisionId}`)).expect(200);
      await p.team[role].get(p.url(`revisions/${(draft.body as { id: string }).id}`)).expect(404);
    }
  });
});
