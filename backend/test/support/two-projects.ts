import { roles } from '@mantlet/common';
import { Job } from '../../src/features/jobs/job.entity.js';
import { Member } from '../../src/features/members/member.entity.js';
import type { Agent, TestApp } from './app.js';
import { makeScheduleProject } from './schedule-project.js';
import type { ScheduleProject } from './schedule-project.js';
import type { Things } from './valid-bodies.js';

export interface Furnished extends ScheduleProject {
  /** somebody with every role on the project */
  everything: Agent;
  things: Things;
}

/** A project with one of each thing that a path may name, and somebody who may do everything there. */
export async function furnish(app: TestApp): Promise<Furnished> {
  const p = await makeScheduleProject(app);
  const user = await app.makeUser('Everything');
  await app.join(p.project, user, ...roles);
  const everything = await app.signIn(user);
  const member = await app.dataSource.manager.findOneByOrFail(Member, { projectId: p.project.id, mark: 'B0-001' });
  const revision = await everything.post(p.url('revisions')).send({ code: 'P01', purpose: '' }).expect(201);
  const upload = await everything.post(p.url('imports')).attach('file', Buffer.from('Mark,Zone\nN1,Z01\n'), 'members.csv').expect(201);
  const view = await everything.post(p.url('member-views')).send({ name: 'Open ones', query: '' }).expect(201);
  const job = await app.dataSource.manager.save(app.dataSource.manager.create(Job, { projectId: p.project.id, kind: 'recalculation', state: 'failed' }));
  const things = {
    levelId: p.zones.Z01.levelId, zoneId: p.zones.Z01.id, memberId: member.id, sectionId: member.sectionId, productId: p.products['Testcoat']!.id,
    revisionId: (revision.body as { id: string }).id, importId: (upload.body as { id: string }).id, userId: user.id,
    viewId: (view.body as { id: string }).id, jobId: job.id,
  };
  return { ...p, everything, things };
}

/** The path of a route in a project, with what it names. */
export const pathIn = (route: string, projectId: string, things: Things): string =>
  route.replace(':projectId', projectId).replace(/:(\w+)/g, (_, name: string) => (things as unknown as Record<string, string>)[name] ?? `no-${name}`);
