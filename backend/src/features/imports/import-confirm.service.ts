import { Injectable } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { ImportConfirm, ImportResultDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { conflict, unprocessable } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { MemberWriterService } from '../members/member-writer.service.js';
import type { MemberChange, NewMember } from '../members/member-writer.service.js';
import { ImportEvaluationService, toRowDto } from './import-evaluation.service.js';
import type { Evaluation } from './import-evaluation.service.js';
import { ImportsService, sheetOf } from './imports.service.js';
import { MemberImport } from './member-import.entity.js';
import type { ComparedRow } from './rows/compare.js';

/** The one step that writes: everything the preview showed, in one transaction, or nothing. */
@Injectable()
export class ImportConfirmService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly imports: ImportsService,
    private readonly evaluation: ImportEvaluationService,
    private readonly writer: MemberWriterService,
    private readonly audit: AuditService,
  ) {}

  /** @throws Refusal 409 where it was confirmed or given up, or the project changed since the preview; 422 where rows are wrong */
  async confirm(scope: ProjectScope, importId: string, { leaveOutWrongRows }: ImportConfirm): Promise<ImportResultDto> {
    return this.dataSource.transaction(async (manager) => {
      await this.writer.lock(manager, scope.projectId);
      const found = await this.imports.loadOpen(manager, scope, importId);
      if (found.state === 'mapping') throw conflict(message('import.map-first', {}));
      const evaluated = await this.evaluation.evaluate(manager, scope, sheetOf(found.cells, found.mapping), found.mapping);
      if (evaluated.digest !== found.previewDigest) throw conflict(message('import.changed-meanwhile', {}));
      refuseWrongRows(evaluated, found, leaveOutWrongRows);
      const result = await this.write(manager, scope, evaluated);
      await manager.update(MemberImport, importId, { state: 'confirmed', cells: null });
      await this.audit.record(manager, {
        projectId: scope.projectId, actor: scope.actor, action: 'schedule imported', entity: 'import', entityId: importId, label: found.fileName,
        changes: Object.entries(result).map(([field, value]) => ({ field, old: null, new: value })),
      });
      return result;
    });
  }

  private async write(manager: EntityManager, scope: ProjectScope, { rows, counts, standing }: Evaluation): Promise<ImportResultDto> {
    const added = rows.flatMap((row): NewMember[] => (row.state === 'new' && row.target ? [newMember(row, row.target)] : []));
    const changed = rows.flatMap((row): MemberChange[] => {
      const before = row.standing && standing.get(row.standing.id);
      if (row.state !== 'changed' || !row.target || !before) return [];
      return [{ before, set: { ...row.target, ...(row.basis ? { basis: row.basis } : {}) } }];
    });
    await this.writer.insert(manager, scope, added, 'member imported');
    await this.writer.update(manager, scope, changed, 'member changed by import');
    await this.writer.settle(manager, scope.projectId, [...added.map((m) => m.zoneId), ...changed.flatMap((c) => [c.before.zoneId, c.set.zoneId ?? c.before.zoneId])]);
    return { added: added.length, changed: changed.length, unchanged: counts.unchanged, leftOut: counts.wrong };
  }
}

function refuseWrongRows({ rows, counts }: Evaluation, found: MemberImport & { cells: { name: string; rows: string[][] }[] }, leaveOut: boolean): void {
  if (counts.wrong === rows.length) throw unprocessable(message('import.nothing-to-write', {}));
  if (!counts.wrong || leaveOut) return;
  const headers = sheetOf(found.cells, found.mapping).rows[found.mapping.headerRow - 1] ?? [];
  const wrong = rows.filter((row) => row.state === 'wrong').map((row) => toRowDto(row, headers, found.mapping));
  const first = wrong[0]!;
  throw unprocessable(
    message('import.wrong-rows', { count: counts.wrong, row: first.row, column: first.problems[0]?.column ?? '', problem: first.problems[0]?.sentence ?? '' }),
    wrong.slice(0, 50).flatMap((row) => row.problems.map((problem) => ({ path: `row ${row.row}, ${problem.column}`, message: problem.sentence }))),
  );
}

function newMember(row: ComparedRow, target: NonNullable<ComparedRow['target']>): NewMember {
  return { ...target, mark: row.mark, coatBackConnections: 0, coatBackGirthMm: 0, deductionM2: 0, onSite: true, ...(row.basis ? { basis: row.basis } : {}) };
}
