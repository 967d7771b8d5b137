import type { MemberViewDto } from '@mantlet/common';
import type { Project } from '../src/features/projects/project.entity.js';
import { MemberView } from '../src/features/members/member-view.entity.js';
import { TestApp } from './support/app.js';

describe('kept lists of members', () => {
  let app: TestApp;
  let project: Project;
  let team: Awaited<ReturnType<TestApp['team']>>;
  const at = (path = ''): string => `/api/projects/${project.id}/member-views${path}`;
  beforeAll(async () => {
    app = await TestApp.start();
  });
  afterAll(() => app.stop());
  beforeEach(async () => {
    project = await app.makeProject();
    team = await app.team(project);
  });

  it('are one’s own: kept, renamed, changed and deleted by nobody else', async () => {
    const made = (await team.specifier.post(at()).send({ name: 'Bottom flange 10', query: 'open=true&columns=mark,section' }).expect(201)).body as MemberViewDto;
    await team.specifier.post(at()).send({ name: ' Bottom flange 9 ', query: '' }).expect(201);
    const listed = (await team.specifier.get(at()).expect(200)).body as MemberViewDto[];
    expect(listed.map((view) => view.name)).toEqual(['Bottom flange 9', 'Bottom flange 10']);
    expect((await team['fire-engineer'].get(at()).expect(200)).body).toEqual([]);
    await team['fire-engineer'].put(at(`/${made.id}`)).send({ name: 'Mine', query: '' }).expect(404);
    await team['fire-engineer'].delete(at(`/${made.id}`)).expect(404);
    const changed = await team.specifier.put(at(`/${made.id}`)).send({ name: 'Bottom flange 10', query: 'open=false' }).expect(200);
    expect(changed.body).toEqual({ id: made.id, name: 'Bottom flange 10', query: 'open=false' });
    await team.specifier.delete(at(`/${made.id}`)).expect(204);
    expect(await app.dataSource.manager.countBy(MemberView, { projectId: project.id })).toBe(1);
  });

  it('have names of their own, up to 50, of text an address can hold', async () => {
    await team.specifier.post(at()).send({ name: 'Open', query: '' }).expect(201);
    const taken = await team.specifier.post(at()).send({ name: 'Open', query: 'a=b' }).expect(409);
    expect(taken.body.message).toBe('You have a list called Open already. Give this one another name, or change that one.');
    for (const bad of [{ name: '', query: '' }, { name: 'x'.repeat(61), query: '' }, { name: 'a', query: 'x'.repeat(4001) }, { name: 'a', query: 'ä' }, { name: 'a' }, { name: 7, query: '' }]) {
      await team.specifier.post(at()).send(bad).expect(400);
    }
    for (const odd of ['🔥 first', 'قائمة', '<b>%_\\']) await team.specifier.post(at()).send({ name: odd, query: '' }).expect(201);
    const more = await Promise.all(Array.from({ length: 50 }, (_, i) => team.specifier.post(at()).send({ name: `List ${i}`, query: '' })));
    expect(more.filter((answer) => answer.status === 201)).toHaveLength(46);
    expect(more.filter((answer) => answer.status === 409)).toHaveLength(4);
    const same = await Promise.all([1, 2, 3].map(() => team['fire-engineer'].post(at()).send({ name: 'Twice', query: '' })));
    expect(same.map((answer) => answer.status).sort()).toEqual([201, 409, 409]);
  });

  it('of one project are not found under another', async () => {
    const made = (await team.specifier.post(at()).send({ name: 'Open', query: '' }).expect(201)).body as MemberViewDto;
    const other = await app.makeProject();
    await team.specifier.get(`/api/projects/${other.id}/member-views`).expect(404);
    await team.specifier.put(`/api/projects/${other.id}/member-views/${made.id}`).send({ name: 'Open', query: '' }).expect(404);
    await team.contractor.get(at()).expect(403);
  });
});
