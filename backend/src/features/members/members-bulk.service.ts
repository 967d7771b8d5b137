import { Injectable } from '@nestjs/common';
import type { MembersChangedDto, BulkMember, BulkStructural, MemberChoice, PreviewAnswerDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { tidy } from './exposure.js';
import { MemberChoiceService } from './member-choice.service.js';
import type { MemberChange } from './member-writer.service.js';
import { MemberWriterService } from './member-writer.service.js';
import { MembersService } from './members.service.js';

/** Many members at once: all of them, or none. */
@Injectable()
export class MembersBulkService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly choice: MemberChoiceService,
    private readonly members: MembersService,
    private readonly writer: MemberWriterService,
  ) {}

  /** The same fields for all. */
  setMany(scope: ProjectScope, { set, ...choice }: BulkMember): Promise<MembersChangedDto> {
    return this.change(scope, choice, set.exposure ? { ...set, exposure: tidy(set.exposure) } : set, 'members changed together');
  }

  /** The same way to a critical temperature for all: the structural engineer's alone. */
  setStructural(scope: ProjectScope, { basis, ...choice }: BulkStructural): Promise<MembersChangedDto> {
    return this.change(scope, choice, { basis }, 'critical temperatures set together');
  }

  /** How many would be other than they are, without changing any. */
  async preview(scope: ProjectScope, { set, ...choice }: BulkMember): Promise<PreviewAnswerDto> {
    const { manager } = this.dataSource;
    const members = await this.choice.read(manager, scope.projectId, choice);
    await this.writer.check(manager, scope.projectId, set, null);
    const tidied = set.exposure ? { ...set, exposure: tidy(set.exposure) } : set;
    return { chosen: members.length, changes: this.writer.countChanges(members.map((before) => ({ before, set: tidied }))) };
  }

  async removeMany(scope: ProjectScope, choice: MemberChoice): Promise<{ deleted: number }> {
    return this.dataSource.transaction(async (manager) => {
      const members = await this.choice.lock(manager, scope.projectId, choice);
      await this.members.erase(manager, scope, members);
      return { deleted: members.length };
    });
  }

  private change(scope: ProjectScope, choice: MemberChoice, set: MemberChange['set'], action: string): Promise<MembersChangedDto> {
    return this.dataSource.transaction(async (manager) => {
      const members = await this.choice.lock(manager, scope.projectId, choice);
      await this.writer.check(manager, scope.projectId, set, null);
      const changed = await this.writer.update(manager, scope, members.map((before) => ({ before, set })), action);
      if (!changed) return { changed, results: 0 };
      const results = await this.writer.settle(manager, scope.projectId, [...members.map((m) => m.zoneId), ...(set.zoneId ? [set.zoneId] : [])]);
      return { changed, results };
    });
  }
}
