import type { LevelDto } from '@mantlet/common';
import type { Project } from '../src/features/projects/project.entity.js';
import { TestApp } from './support/app.js';
import { build } from './support/building.js';

describe('levels', () => {
  let app: TestApp;
  let project: Project;
  let team: Awaited<ReturnType<TestApp['team']>>;
  const at = (path = ''): string => `/api/projects/${project.id}/levels${path}`;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());
  beforeEach(async () => {
    project = await app.makeProject();
    team = await app.team(project);
  });
  const ground = { code: '00', name: 'Ground floor', elevationM: 0, heightM: 4.5 };

  it('are made by the fire engineer and listed from the lowest up', async () => {
    await team['fire-engineer'].post(at()).send({ ...ground, code: '01', elevationM: 4.5 }).expect(201);
    await team['fire-engineer'].post(at()).send({ ...ground, code: 'B1', elevationM: -3.6 }).expect(201);
    const made = await team['fire-engineer'].post(at()).send(ground).expect(201);
    expect(made.body).toMatchObject({ ...ground, version: 1 });
    const listed = await team['structural-engineer'].get(at()).expect(200);
    expect((listed.body as LevelDto[]).map((level) => level.code)).toEqual(['B1', '00', '01']);
  });

  it('are not for others to change, nor for those outside the design team to see', async () => {
    for (const role of ['structural-engineer', 'specifier', 'contractor', 'inspector', 'reader'] as const) await team[role].post(at()).send(ground).expect(403);
    for (const role of ['contractor', 'inspector', 'reader'] as const) await team[role].get(at()).expect(403);
  });

  it('refuse an edit of something saved meanwhile, and show what stands', async () => {
    const { body } = await team['fire-engineer'].post(at()).send(ground).expect(201);
    const edit = (name: string): object => ({ ...ground, name, version: 1 });
    const first = await team['fire-engineer'].patch(at(`/${body.id as string}`)).send(edit('Entrance')).expect(200);
    expect(first.body).toMatchObject({ name: 'Entrance', version: 2 });
    const second = await team['fire-engineer'].patch(at(`/${body.id as string}`)).send(edit('Foyer')).expect(409);
    expect(second.body).toMatchObject({ code: 'shared.stale', current: { name: 'Entrance', version: 2 }, by: 'The fire-engineer' });
    expect(Date.now() - Date.parse((second.body as { at: string }).at)).toBeLessThan(60_000);
    const trail = await team.specifier.get(`/api/projects/${project.id}/audit`).query({ entity: 'level' }).expect(200);
    expect(trail.body.items[0]).toMatchObject({ action: 'level changed', changes: [{ field: 'name', old: 'Ground floor', new: 'Entrance' }] });
    expect(trail.body.total).toBe(2);
  });

  it('leave no trace where nothing changed', async () => {
    const { body } = await team['fire-engineer'].post(at()).send(ground).expect(201);
    const same = await team['fire-engineer'].patch(at(`/${body.id as string}`)).send({ ...ground, version: 1 }).expect(200);
    expect(same.body.version).toBe(1);
    expect((await team.specifier.get(`/api/projects/${project.id}/audit`).query({ entity: 'level' })).body.total).toBe(1);
  });

  it('have codes of their own within the project', async () => {
    await team['fire-engineer'].post(at()).send(ground).expect(201);
    const twice = await team['fire-engineer'].post(at()).send(ground).expect(409);
    expect(twice.body.message).toBe('There already is a level "00".');
    const other = await app.makeProject();
    const otherTeam = await app.team(other);
    await otherTeam['fire-engineer'].post(`/api/projects/${other.id}/levels`).send(ground).expect(201);
  });

  it('are deleted only when no zone is on them', async () => {
    const level = await build.level(app, project, 'L1');
    for (const code of ['A', 'B', 'C', 'D']) await build.zone(app, level, code);
    const refused = await team['fire-engineer'].delete(at(`/${level.id}`)).expect(409);
    expect(refused.body.message).toBe('Level L1 still holds zones A, B, C and 1 other. Move the zones to another level or delete them first.');
    const empty = await build.level(app, project, 'L2');
    await team['fire-engineer'].delete(at(`/${empty.id}`)).expect(204);
    await team['fire-engineer'].delete(at(`/${empty.id}`)).expect(404);
  });

  it("of another project are not found through one's own", async () => {
    const other = await app.makeProject();
    const theirs = await build.level(app, other, 'X');
    await team['fire-engineer'].patch(at(`/${theirs.id}`)).send({ ...ground, version: 1 }).expect(404);
    await team['fire-engineer'].delete(at(`/${theirs.id}`)).expect(404);
    await team['fire-engineer'].get(`/api/projects/${other.id}/levels`).expect(404);
  });

  it('say in words what is wrong with the input', async () => {
    const bad = await team['fire-engineer'].post(at()).send({ code: ' ', name: 'x', elevationM: 'high', heightM: 0 }).expect(400);
    expect(bad.body.issues).toEqual(expect.arrayContaining([
      { path: 'code', message: 'is needed' }, { path: 'elevationM', message: 'must be a number' }, { path: 'heightM', message: 'must be above 0' },
    ]));
    await team['fire-engineer'].patch(at('/not-an-id')).send({ ...ground, version: 1 }).expect(400);
    await team['fire-engineer'].post(at()).send({ ...ground, name: 'nul \u0000 byte' }).expect(400);
  });
});
