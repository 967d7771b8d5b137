import { Injectable } from '@nestjs/common';
import type { MemberDto, MemberInput, MemberStructural, MemberUpdate } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { notFound } from '../../shared/refusal.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { AuditService } from '../audit/audit.service.js';
import { Section } from '../sections/section.entity.js';
import { tidy } from './exposure.js';
import { toMemberDto } from './member-mapper.js';
import { MemberWriterService } from './member-writer.service.js';
import { Member } from './member.entity.js';

/** Members one by one: the specifier's part, and the structural engineer's. */
@Injectable()
export class MembersService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly writer: MemberWriterService,
    private readonly assessment: AssessmentService,
    private readonly audit: AuditService,
  ) {}

  /** A member of the project as its form shows it. @throws Refusal 404 */
  async find(manager: EntityManager, projectId: string, memberId: string): Promise<MemberDto> {
    const member = await manager.findOne(Member, {
      where: { id: memberId, projectId }, relations: { acceptances: { acceptedBy: true }, basisSetBy: true, result: true },
    });
    if (!member) throw notFound('member');
    return toMemberDto(member, (acceptance, result) => this.assessment.holds(acceptance, result));
  }

  /** A new member's critical temperature is not given until the structural engineer says. */
  async create(scope: ProjectScope, input: MemberInput): Promise<MemberDto> {
    return this.dataSource.transaction(async (manager) => {
      await this.writer.lock(manager, scope.projectId);
      await this.writer.check(manager, scope.projectId, input, null);
      const [id] = await this.writer.insert(manager, scope, [{ ...input, exposure: tidy(input.exposure) }], 'member made');
      await this.writer.settle(manager, scope.projectId, [input.zoneId]);
      return this.find(manager, scope.projectId, id as string);
    });
  }

  async update(scope: ProjectScope, memberId: string, { version, ...input }: MemberUpdate): Promise<MemberDto> {
    return this.change(scope, memberId, version, 'member changed', async (manager) => {
      await this.writer.check(manager, scope.projectId, input, memberId);
      return { ...input, exposure: tidy(input.exposure) };
    });
  }

  /** The structural engineer's alone; stored with who and when. */
  async setStructural(scope: ProjectScope, memberId: string, { version, basis }: MemberStructural): Promise<MemberDto> {
    return this.change(scope, memberId, version, 'critical temperature set', async () => ({ basis }));
  }

  private async change(
    scope: ProjectScope, memberId: string, version: number, action: string,
    decide: (manager: EntityManager) => Promise<Partial<Pick<Member, keyof MemberInput | 'basis'>>>,
  ): Promise<MemberDto> {
    return this.dataSource.transaction(async (manager) => {
      await this.writer.lock(manager, scope.projectId);
      const before = await manager.findOneBy(Member, { id: memberId, projectId: scope.projectId });
      if (!before) throw notFound('member');
      await this.audit.requireVersion(manager, 'member', before, version, () => this.standing(manager, before));
      const set = await decide(manager);
      const changed = await this.writer.update(manager, scope, [{ before, set }], action);
      if (changed) await this.writer.settle(manager, scope.projectId, [before.zoneId, set.zoneId ?? before.zoneId]);
      return this.find(manager, scope.projectId, memberId);
    });
  }

  /** A member as a stale form is shown it: its section by name too, since the form may never have seen it. */
  private async standing(manager: EntityManager, { id, projectId, sectionId }: Member): Promise<MemberDto & { designation: string }> {
    const section = await manager.findOneByOrFail(Section, { id: sectionId });
    return { ...(await this.find(manager, projectId, id)), designation: section.designation };
  }

  async remove(scope: ProjectScope, memberId: string, version: number): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      await this.writer.lock(manager, scope.projectId);
      const member = await manager.findOneBy(Member, { id: memberId, projectId: scope.projectId });
      if (!member) throw notFound('member');
      await this.audit.requireVersion(manager, 'member', member, version, () => this.standing(manager, member));
      await this.erase(manager, scope, [member]);
    });
  }

  /** Takes them out of the project, and works out anew what they leave behind. */
  async erase(manager: EntityManager, scope: ProjectScope, members: readonly Member[]): Promise<void> {
    await manager.delete(Member, { id: In(members.map((m) => m.id)) });
    await this.audit.record(
      manager,
      ...members.map((member) => ({
        projectId: scope.projectId, actor: scope.actor, action: 'member deleted', entity: 'member', entityId: member.id, label: member.mark,
        changes: (['memberType', 'grade', 'lengthMm', 'quantity', 'basis'] as const).map((field) => ({ field, old: member[field], new: null })),
      })),
    );
    await this.writer.settle(manager, scope.projectId, members.map((m) => m.zoneId));
  }
}
