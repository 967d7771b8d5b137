import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { FoundRequest, FoundSummaryDto, MemberChoice, MembersFound } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, In } from 'typeorm';
import type { EntityManager, SelectQueryBuilder } from 'typeorm';
import { conflict } from '../../shared/refusal.js';
import { Project } from '../projects/project.entity.js';
import { searchMembers } from './member-search.js';
import { MemberWriterService } from './member-writer.service.js';
import { Member } from './member.entity.js';

const marksShown = 8;

/** Which members something is to be done with, and whether they are still as they were when they were chosen. */
@Injectable()
export class MemberChoiceService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly writer: MemberWriterService,
  ) {}

  /** What a filter finds, under a stamp that moves with any of its members, its version or its result. */
  async summary(projectId: string, query: FoundRequest): Promise<FoundSummaryDto> {
    const { manager } = this.dataSource;
    const { settings } = await manager.findOneByOrFail(Project, { id: projectId });
    const found = finds(manager, projectId, query);
    const [standing, marks, acceptable] = await Promise.all([
      stampOf(found),
      found.clone().select('m.mark', 'mark').orderBy('m.mark').limit(marksShown).getRawMany<{ mark: string }>(),
      found.clone().select("count(*) FILTER (WHERE r.assumed)::int", 'assumed').addSelect("count(*) FILTER (WHERE r.verdict = 'bare')::int", 'bare')
        .addSelect('count(*) FILTER (WHERE r.criticalTemperatureC > :aboveC)::int', 'high').setParameter('aboveC', settings.designBasis.secondSignatureAboveC)
        .getRawOne<{ assumed: number; bare: number; high: number }>(),
    ]);
    return {
      ...standing, marks: marks.map((row) => row.mark),
      acceptable: { assumed: acceptable?.assumed ?? 0, 'high-temperature': acceptable?.high ?? 0, bare: acceptable?.bare ?? 0 },
    };
  }

  /** The chosen members, and no other writer until the end of the transaction. @throws Refusal where one is gone or has moved */
  async lock(manager: EntityManager, projectId: string, choice: MemberChoice): Promise<Member[]> {
    await this.writer.lock(manager, projectId);
    return this.read(manager, projectId, choice);
  }

  /** The same for looking only. */
  async read(manager: EntityManager, projectId: string, { members, found }: MemberChoice): Promise<Member[]> {
    if (found) return this.allFound(manager, projectId, found);
    const versions = new Map((members ?? []).map(({ id, version }) => [id, version]));
    const standing = await this.byId(manager, projectId, [...versions.keys()]);
    const moved = standing.filter((member) => member.version !== versions.get(member.id));
    if (moved.length) throw conflict(message('member.moved', { marks: moved.map((m) => m.mark).sort() }));
    return standing;
  }

  /** @throws Refusal where one is missing */
  async byId(manager: EntityManager, projectId: string, memberIds: readonly string[]): Promise<Member[]> {
    const wanted = [...new Set(memberIds)];
    const members = await manager.findBy(Member, { id: In(wanted), projectId });
    if (members.length < wanted.length) throw conflict(message('member.some-unknown', { count: wanted.length - members.length }));
    return members;
  }

  private async allFound(manager: EntityManager, projectId: string, asked: MembersFound): Promise<Member[]> {
    const found = finds(manager, projectId, asked);
    const standing = await stampOf(found);
    if (standing.count !== asked.count || standing.stamp !== asked.stamp) throw conflict(message('member.found-moved', { then: asked.count, now: standing.count }));
    return found.getMany();
  }
}

function finds(manager: EntityManager, projectId: string, { filter, except }: FoundRequest): SelectQueryBuilder<Member> {
  const found = searchMembers(manager, projectId, filter);
  return except.length ? found.andWhere('m.id NOT IN (:...except)', { except }) : found;
}

async function stampOf(found: SelectQueryBuilder<Member>): Promise<{ count: number; stamp: string }> {
  const row = await found.clone().select('count(*)::int', 'count')
    .addSelect(`coalesce(md5(string_agg(concat_ws(' ', m.id, m.version, r.inputsHash), ',' ORDER BY m.id)), '')`, 'stamp').getRawOne<{ count: number; stamp: string }>();
  return { count: row?.count ?? 0, stamp: row?.stamp ?? '' };
}
