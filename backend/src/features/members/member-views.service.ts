import { Injectable } from '@nestjs/common';
import { message, mostMemberViews } from '@mantlet/common';
import type { MemberViewDto, MemberViewInput } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, Not } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { conflict, notFound } from '../../shared/refusal.js';
import { MemberView } from './member-view.entity.js';

/** Lists that a person keeps, each their own: another's are neither shown nor found. */
@Injectable()
export class MemberViewsService {
  constructor(@InjectDataSource() private readonly dataSource: DataSource) {}

  async list(scope: ProjectScope): Promise<MemberViewDto[]> {
    const views = await this.dataSource.manager.find(MemberView, { where: own(scope), order: { name: 'ASC' } });
    return views.map(toDto);
  }

  create(scope: ProjectScope, input: MemberViewInput): Promise<MemberViewDto> {
    return this.write(scope, async (manager) => {
      if ((await manager.countBy(MemberView, own(scope))) >= mostMemberViews) throw conflict(message('member-view.too-many', { most: mostMemberViews }));
      await requireFreeName(manager, scope, input.name, null);
      return manager.save(MemberView, manager.create(MemberView, { ...own(scope), ...input }));
    });
  }

  update(scope: ProjectScope, id: string, input: MemberViewInput): Promise<MemberViewDto> {
    return this.write(scope, async (manager) => {
      const view = await manager.findOneBy(MemberView, { ...own(scope), id });
      if (!view) throw notFound('list');
      await requireFreeName(manager, scope, input.name, id);
      return manager.save(MemberView, Object.assign(view, input));
    });
  }

  async remove(scope: ProjectScope, id: string): Promise<void> {
    const { affected } = await this.dataSource.manager.delete(MemberView, { ...own(scope), id });
    if (!affected) throw notFound('list');
  }

  /** One writer at a time for each person, so that number and names hold. */
  private async write(scope: ProjectScope, act: (manager: EntityManager) => Promise<MemberView>): Promise<MemberViewDto> {
    return this.dataSource.transaction(async (manager) => {
      await manager.query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', [`member-views ${scope.projectId} ${scope.actor.id}`]);
      return toDto(await act(manager));
    });
  }
}

const own = (scope: ProjectScope): { projectId: string; userId: string } => ({ projectId: scope.projectId, userId: scope.actor.id });
const toDto = ({ id, name, query }: MemberView): MemberViewDto => ({ id, name, query });

async function requireFreeName(manager: EntityManager, scope: ProjectScope, name: string, exceptId: string | null): Promise<void> {
  const taken = await manager.existsBy(MemberView, { ...own(scope), name, ...(exceptId && { id: Not(exceptId) }) });
  if (taken) throw conflict(message('member-view.name-taken', { name }));
}
