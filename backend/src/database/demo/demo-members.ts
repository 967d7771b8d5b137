import type { INestApplicationContext } from '@nestjs/common';
import { DataSource, In } from 'typeorm';
import { ImportConfirmService } from '../../features/imports/import-confirm.service.js';
import { ImportsService } from '../../features/imports/imports.service.js';
import { AcceptancesService } from '../../features/members/acceptances.service.js';
import { MemberWriterService } from '../../features/members/member-writer.service.js';
import { Member } from '../../features/members/member.entity.js';
import { MembersBulkService } from '../../features/members/members-bulk.service.js';
import { RevisionsService } from '../../features/revisions/revisions.service.js';
import type { ProjectScope } from '../../shared/access.js';
import { readBases, readDemoFile } from './demo-data.js';
import type { Scenario } from './demo-data.js';

/** Uploads a schedule the way the import page does, with the columns as they were understood. */
export async function importSchedule(app: INestApplicationContext, scope: ProjectScope, fileName: string): Promise<void> {
  const imports = app.get(ImportsService, { strict: false });
  const { name, content } = await readDemoFile(fileName);
  const { id, mapping } = await imports.upload(scope, name, content);
  const preview = await imports.map(scope, id, mapping);
  const problem = preview.rows.find((row) => row.state === 'wrong');
  if (problem) throw new Error(`seeds/demo/${fileName}, row ${problem.row}: ${problem.problems[0]?.sentence ?? ''}`);
  // a second run after a break finds its rows there already
  if (preview.counts.new + preview.counts.changed === 0) return imports.abandon(scope, id);
  await app.get(ImportConfirmService, { strict: false }).confirm(scope, id, { leaveOutWrongRows: false });
}

/** The structural engineer's part, all members of a file at once; what stands already is not written again. */
export async function setBases(app: INestApplicationContext, scope: ProjectScope, fileName: string): Promise<void> {
  const bases = await readBases(fileName);
  const writer = app.get(MemberWriterService, { strict: false });
  await app.get(DataSource).transaction(async (manager) => {
    await writer.lock(manager, scope.projectId);
    const members = await manager.findBy(Member, { projectId: scope.projectId, mark: In([...bases.keys()]) });
    if (members.length !== bases.size) throw new Error(`seeds/demo/${fileName} names ${bases.size} members; the schedule has ${members.length} of them.`);
    const changes = members.flatMap((before) => {
      const basis = bases.get(before.mark);
      return basis ? [{ before, set: { basis } }] : [];
    });
    await writer.update(manager, scope, changes, 'critical temperature set');
    await writer.settle(manager, scope.projectId, members.map((member) => member.zoneId));
  });
}

/** The fire engineer signs what the open items ask a signature for. */
export async function signWarnings(app: INestApplicationContext, scope: ProjectScope, signatures: Scenario['signatures']): Promise<void> {
  const { warnings } = await app.get(RevisionsService, { strict: false }).readiness(scope.projectId);
  const acceptances = app.get(AcceptancesService, { strict: false });
  for (const kind of ['high-temperature', 'bare'] as const) {
    const reason = signatures[kind];
    const memberIds = warnings.filter((item) => item.code === kind).flatMap((item) => item.memberIds);
    if (reason && memberIds.length) await acceptances.accept(scope, { memberIds, kind, reason });
  }
}

export async function takeOut(app: INestApplicationContext, scope: ProjectScope, marks: readonly string[]): Promise<void> {
  const members = await app.get(DataSource).manager.findBy(Member, { projectId: scope.projectId, mark: In([...marks]) });
  if (members.length) await app.get(MembersBulkService, { strict: false }).removeMany(scope, { members: members.map(({ id, version }) => ({ id, version })) });
}
