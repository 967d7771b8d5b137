import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { Acceptance, Message } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { unprocessable } from '../../shared/refusal.js';
import { MemberResult } from '../assessment/member-result.entity.js';
import { AuditService } from '../audit/audit.service.js';
import { Project } from '../projects/project.entity.js';
import { MemberAcceptance } from './member-acceptance.entity.js';
import { MemberWriterService } from './member-writer.service.js';
import type { Member } from './member.entity.js';
import { MembersService } from './members.service.js';

type Kind = Acceptance['kind'];

/** The fire engineer's signatures. Each is under one value, and falls when the value changes. */
@Injectable()
export class AcceptancesService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly members: MembersService,
    private readonly writer: MemberWriterService,
    private readonly audit: AuditService,
  ) {}

  /** All or none: a member for which there is nothing to accept is named. */
  async accept(scope: ProjectScope, { memberIds, kind, reason }: Acceptance): Promise<{ accepted: number }> {
    return this.dataSource.transaction(async (manager) => {
      const members = await this.members.lockMembers(manager, scope.projectId, memberIds);
      const results = await this.resultsOf(manager, members);
      await this.requireOccasion(manager, scope.projectId, kind, members, results);
      const acceptedAt = new Date();
      const rows = members.map((member) => ({
        memberId: member.id, kind, reason, valueC: results.get(member.id)?.criticalTemperatureC ?? null, acceptedById: scope.actor.id, acceptedAt,
      }));
      await manager.upsert(MemberAcceptance, rows, ['memberId', 'kind']);
      await this.record(manager, scope, members, `${words[kind]} accepted`, kind, (member) => ({ old: null, new: results.get(member.id)?.criticalTemperatureC ?? null }), reason);
      await this.writer.settle(manager, scope.projectId, members.map((m) => m.zoneId));
      return { accepted: members.length };
    });
  }

  /** Takes signatures back; members without one are passed over. */
  async withdraw(scope: ProjectScope, { memberIds, kind }: { memberIds: string[]; kind: Kind }): Promise<{ withdrawn: number }> {
    return this.dataSource.transaction(async (manager) => {
      const members = await this.members.lockMembers(manager, scope.projectId, memberIds);
      const signed = await manager.findBy(MemberAcceptance, { memberId: In(members.map((m) => m.id)), kind });
      const values = new Map(signed.map((acceptance) => [acceptance.memberId, acceptance.valueC]));
      const concerned = members.filter((member) => values.has(member.id));
      await manager.delete(MemberAcceptance, { memberId: In(concerned.map((m) => m.id)), kind });
      await this.record(manager, scope, concerned, `${words[kind]} no longer accepted`, kind, (member) => ({ old: values.get(member.id) ?? null, new: null }), null);
      await this.writer.settle(manager, scope.projectId, concerned.map((m) => m.zoneId));
      return { withdrawn: concerned.length };
    });
  }

  private async resultsOf(manager: EntityManager, members: readonly Member[]): Promise<Map<string, MemberResult>> {
    const results = await manager.findBy(MemberResult, { memberId: In(members.map((m) => m.id)) });
    return new Map(results.map((result) => [result.memberId, result]));
  }

  private async requireOccasion(manager: EntityManager, projectId: string, kind: Kind, members: readonly Member[], results: ReadonlyMap<string, MemberResult>): Promise<void> {
    const project = await manager.findOneByOrFail(Project, { id: projectId });
    const aboveC = project.settings.designBasis.secondSignatureAboveC;
    const without = members.filter((member) => !hasOccasion(kind, member, results.get(member.id), aboveC)).map((member) => member.mark);
    if (without.length) throw unprocessable(refusal(kind, without.sort(), aboveC));
  }

  private async record(
    manager: EntityManager, scope: ProjectScope, members: readonly Member[], action: string, kind: Kind,
    change: (member: Member) => { old: unknown; new: unknown }, why: string | null,
  ): Promise<void> {
    await this.audit.record(
      manager,
      ...members.map((member) => ({
        projectId: scope.projectId, actor: scope.actor, action, entity: 'member', entityId: member.id, label: member.mark,
        changes: [{ field: kind, ...change(member) }], why,
      })),
    );
  }
}

const words: Record<Kind, string> = { assumed: 'assumed temperature', 'high-temperature': 'high critical temperature', bare: 'leaving bare' };

function hasOccasion(kind: Kind, member: Member, result: MemberResult | undefined, aboveC: number): boolean {
  if (!result || result.criticalTemperatureC === null) return false;
  if (kind === 'assumed') return member.basis.way === 'assumed';
  return kind === 'bare' ? result.verdict === 'bare' : result.criticalTemperatureC > aboveC;
}

function refusal(kind: Kind, marks: string[], aboveC: number): Message {
  if (kind === 'assumed') return message('member.not-assumed', { marks });
  return kind === 'bare' ? message('member.not-bare', { marks }) : message('member.not-high', { marks, aboveC });
}
