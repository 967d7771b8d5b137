import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { Acceptance, Message } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { conflict, unprocessable } from '../../shared/refusal.js';
import { MemberResult } from '../assessment/member-result.entity.js';
import { AuditService } from '../audit/audit.service.js';
import { Project } from '../projects/project.entity.js';
import { MemberAcceptance } from './member-acceptance.entity.js';
import { MemberChoiceService } from './member-choice.service.js';
import { MemberWriterService } from './member-writer.service.js';
import type { Member } from './member.entity.js';

type Kind = Acceptance['kind'];

/** The fire engineer's signatures. Each is under one value, and falls when the value changes. */
@Injectable()
export class AcceptancesService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly choice: MemberChoiceService,
    private readonly writer: MemberWriterService,
    private readonly audit: AuditService,
  ) {}

  /** All or none: a member for which there is nothing to accept is named. */
  async accept(scope: ProjectScope, { memberIds, found, kind, reason }: Acceptance): Promise<{ accepted: number }> {
    return this.dataSource.transaction(async (manager) => {
      await this.writer.lock(manager, scope.projectId);
      const chosen = found ? await this.choice.read(manager, scope.projectId, { found }) : await this.choice.byId(manager, scope.projectId, memberIds ?? []);
      const results = await this.resultsOf(manager, chosen);
      const members = await this.withOccasion(manager, scope.projectId, kind, chosen, results, found !== undefined);
      const acceptedAt = new Date();
      const rows = members.map((member) => ({
        memberId: member.id, kind, reason, valueC: results.get(member.id)?.criticalTemperatureC ?? null, acceptedById: scope.actor.id, acceptedAt,
      }));
      for (let at = 0; at < rows.length; at += 2000) await manager.upsert(MemberAcceptance, rows.slice(at, at + 2000), ['memberId', 'kind']);
      await this.record(manager, scope, members, `${words[kind]} accepted`, kind, (member) => ({ old: null, new: results.get(member.id)?.criticalTemperatureC ?? null }), reason);
      await this.writer.settle(manager, scope.projectId, members.map((m) => m.zoneId));
      return { accepted: members.length };
    });
  }

  /** Takes signatures back; members without one are passed over. */
  async withdraw(scope: ProjectScope, { memberIds, kind }: { memberIds: string[]; kind: Kind }): Promise<{ withdrawn: number }> {
    return this.dataSource.transaction(async (manager) => {
      await this.writer.lock(manager, scope.projectId);
      const members = await this.choice.byId(manager, scope.projectId, memberIds);
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

  /** Those for which there is something to accept; of members named one by one, all must have it. */
  private async withOccasion(
    manager: EntityManager, projectId: string, kind: Kind, members: readonly Member[], results: ReadonlyMap<string, MemberResult>, someWill: boolean,
  ): Promise<Member[]> {
    const unassessed = members.length - results.size;
    if (unassessed > 0) throw conflict(message('job.recalculating', { members: unassessed }));
    const project = await manager.findOneByOrFail(Project, { id: projectId });
    const aboveC = project.settings.designBasis.secondSignatureAboveC;
    const having = members.filter((member) => hasOccasion(kind, member, results.get(member.id), aboveC));
    const had = new Set(having);
    const without = members.filter((member) => !had.has(member)).map((member) => member.mark);
    if (without.length && !(someWill && having.length)) throw unprocessable(refusal(kind, without.sort(), aboveC));
    return having;
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
