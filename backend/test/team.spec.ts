import type { MembershipDto } from '@mantlet/common';
import type { Project } from '../src/features/projects/project.entity.js';
import { TestApp } from './support/app.js';
import type { Agent } from './support/app.js';

describe('the team of a project', () => {
  let app: TestApp;
  let project: Project;
  let lead: Agent;
  let leadId: string;
  const at = (path = ''): string => `/api/projects/${project.id}/memberships${path}`;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());
  beforeEach(async () => {
    project = await app.makeProject();
    const user = await app.makeUser('Lead');
    leadId = user.id;
    await app.join(project, user, 'fire-engineer');
    lead = await app.signIn(user);
  });

  it('takes in those who have an account, who see the project from then on', async () => {
    const user = await app.makeUser('New Colleague');
    const agent = await app.signIn(user);
    await agent.get(at()).expect(404);
    const added = await lead.post(at()).send({ email: ` ${user.email.toUpperCase()} `, roles: ['reader', 'contractor', 'reader'] }).expect(201);
    // each role once, in the usual order
    expect(added.body).toEqual({ userId: user.id, name: 'New Colleague', email: user.email, roles: ['contractor', 'reader'] });
    const seen = await agent.get(at()).expect(200);
    expect((seen.body as MembershipDto[]).map((one) => one.name)).toEqual(['Lead', 'New Colleague']);
  });

  it('says in words why somebody cannot be added', async () => {
    const nobody = await lead.post(at()).send({ email: 'nobody@example.test', roles: ['reader'] }).expect(422);
    expect(nobody.body).toMatchObject({ code: 'team.no-account', issues: [{ path: 'email' }] });
    const disabled = await app.makeUser('Gone');
    await app.dataSource.query('UPDATE users SET disabled = true WHERE id = $1', [disabled.id]);
    await lead.post(at()).send({ email: disabled.email, roles: ['reader'] }).expect(422);
    const user = await app.makeUser('Twice');
    await lead.post(at()).send({ email: user.email, roles: ['reader'] }).expect(201);
    const twice = await lead.post(at()).send({ email: user.email, roles: ['inspector'] }).expect(409);
    expect(twice.body.message).toBe('Twice is on the team already. Change their roles in the list instead.');
    const bad = await lead.post(at()).send({ email: 'no', roles: [] }).expect(400);
    expect(bad.body.issues).toEqual(expect.arrayContaining([{ path: 'email', message: 'is not an e-mail address' }, { path: 'roles', message: 'give at least one role' }]));
    await lead.post(at()).send({ email: user.email, roles: ['owner'] }).expect(400);
  });

  it('is changed by fire engineer and specifier only', async () => {
    const team = await app.team(project);
    const user = await app.makeUser('Other');
    for (const role of ['structural-engineer', 'contractor', 'inspector', 'reader'] as const) {
      await team[role].get(at()).expect(200);
      await team[role].post(at()).send({ email: user.email, roles: ['specifier'] }).expect(403);
      await team[role].put(at(`/${leadId}`)).send({ roles: ['reader'] }).expect(403);
      await team[role].delete(at(`/${leadId}`)).expect(403);
    }
    await team.specifier.post(at()).send({ email: user.email, roles: ['specifier'] }).expect(201);
  });

  it('lets rights follow roles at once, and traces them', async () => {
    const user = await app.makeUser('Changing');
    await app.join(project, user, 'reader');
    const agent = await app.signIn(user);
    await agent.get(`/api/projects/${project.id}/zones`).expect(403);
    const changed = await lead.put(at(`/${user.id}`)).send({ roles: ['specifier', 'reader'] }).expect(200);
    expect(changed.body.roles).toEqual(['specifier', 'reader']);
    await agent.get(`/api/projects/${project.id}/zones`).expect(200);
    await lead.delete(at(`/${user.id}`)).expect(204);
    await agent.get(`/api/projects/${project.id}/zones`).expect(404);
    const trail = await lead.get(`/api/projects/${project.id}/audit`).query({ entity: 'membership' }).expect(200);
    expect(trail.body.items).toMatchObject([
      { action: 'left the team', label: 'Changing', changes: [{ field: 'roles', old: ['specifier', 'reader'], new: [] }] },
      { action: 'roles changed', label: 'Changing', changes: [{ field: 'roles', old: ['reader'], new: ['specifier', 'reader'] }] },
    ]);
  });

  it('narrows its trail by person, thing and time, and refuses what is none of these', async () => {
    const user = await app.makeUser('In the trail');
    const at0 = `/api/projects/${project.id}/audit`;
    const before = new Date().toISOString();
    await lead.post(at()).send({ email: user.email, roles: ['reader'] }).expect(201);
    const mine = await lead.get(at0).query({ userId: leadId, from: before }).expect(200);
    expect(mine.body).toMatchObject({ total: 1, items: [{ entity: 'membership', label: 'In the trail' }] });
    expect((await lead.get(at0).query({ userId: user.id }).expect(200)).body.total).toBe(0);
    expect((await lead.get(at0).query({ entity: 'zone', from: before }).expect(200)).body.total).toBe(0);
    const earlier = await lead.get(at0).query({ before }).expect(200);
    expect(earlier.body.items.some((e: { label: string }) => e.label === 'In the trail')).toBe(false);
    for (const query of [{ userId: 'me' }, { from: 'yesterday' }, { before: '2026-02-30T00:00:00Z' }, { from: "'; drop table audit_entries" }]) await lead.get(at0).query(query).expect(400);
  });

  it('refuses roles set over somebody else’s, and shows who set them', async () => {
    const user = await app.makeUser('Twice set');
    await app.join(project, user, 'reader');
    // the same person on another project, whose trail is nobody's business here
    await app.join(await app.makeProject(), user, 'inspector');
    await lead.put(at(`/${user.id}`)).send({ roles: ['inspector'], was: { roles: ['reader'] } }).expect(200);
    const stale = await lead.put(at(`/${user.id}`)).send({ roles: ['contractor'], was: { roles: ['reader'] } }).expect(409);
    expect(stale.body).toMatchObject({ code: 'shared.stale', current: { roles: ['inspector'] }, by: expect.any(String), at: expect.any(String) });
    await lead.put(at(`/${user.id}`)).send({ roles: ['contractor'], was: { roles: ['inspector'] } }).expect(200);
  });

  it('never loses the last who can change it', async () => {
    const reader = await app.makeUser('Reading');
    await app.join(project, reader, 'reader');
    const refused = await lead.delete(at(`/${leadId}`)).expect(409);
    expect(refused.body.code).toBe('team.needs-a-lead');
    await lead.put(at(`/${leadId}`)).send({ roles: ['structural-engineer'] }).expect(409);
    await lead.put(at(`/${leadId}`)).send({ roles: ['specifier', 'contractor'] }).expect(200);
    await lead.put(at(`/${reader.id}`)).send({ roles: ['fire-engineer'] }).expect(200);
    await lead.delete(at(`/${leadId}`)).expect(204);
    await lead.get(at()).expect(404);
  });

  it('keeps one of two leads who remove each other at the same moment', async () => {
    const second = await app.makeUser('Second');
    await app.join(project, second, 'specifier');
    const agent = await app.signIn(second);
    const answers = await Promise.all([lead.delete(at(`/${second.id}`)), agent.delete(at(`/${leadId}`))]);
    const statuses = answers.map((answer) => answer.status);
    expect(statuses.filter((status) => status === 204)).toHaveLength(1);
    expect(await app.dataSource.query('SELECT count(*)::int AS n FROM memberships WHERE project_id = $1', [project.id])).toEqual([{ n: 1 }]);
  });

  it("does not reach into another project's team", async () => {
    const other = await app.makeProject();
    const stranger = await app.makeUser('Stranger');
    await app.join(other, stranger, 'reader');
    await lead.put(at(`/${stranger.id}`)).send({ roles: ['reader'] }).expect(404);
    await lead.delete(at(`/${stranger.id}`)).expect(404);
    await lead.get(`/api/projects/${other.id}/memberships`).expect(404);
    // not even the administrator reads a project without being on its team
    const administrator = await app.signIn(await app.makeUser('Admin', { administrator: true }));
    await administrator.get(at()).expect(404);
  });
});
