import { Injectable } from '@nestjs/common';
import { importFieldNames, message, sentence } from '@mantlet/common';
import type { ImportDto, ImportMapping, ImportPreviewDto, ImportRowState } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { conflict, notFound, unprocessable } from '../../shared/refusal.js';
import { AuditService } from '../audit/audit.service.js';
import { Zone } from '../zones/zone.entity.js';
import { ImportEvaluationService, toPreviewDto } from './import-evaluation.service.js';
import type { Evaluation } from './import-evaluation.service.js';
import { MemberImport } from './member-import.entity.js';
import type { CellGrid } from './reading/cell-grid.js';
import { readSchedule } from './reading/read-schedule.js';
import { checkMapping, ungivenFields } from './rows/check-mapping.js';
import { suggestMapping } from './rows/suggest-mapping.js';

export interface PreviewQuery { state?: ImportRowState | undefined; page: number; pageSize: number }
const firstPage: PreviewQuery = { page: 1, pageSize: 100 };

/** A schedule on its way in: upload, mapping, preview. Nothing reaches the members here. */
@Injectable()
export class ImportsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly evaluation: ImportEvaluationService,
    private readonly audit: AuditService,
  ) {}

  /** @throws Refusal in words where the file is no schedule */
  async upload(scope: ProjectScope, fileName: string, content: Buffer): Promise<ImportDto> {
    const { sheets, notes } = await readSchedule(fileName, content);
    const suggestion = suggestMapping(sheets, scope.roles.includes('structural-engineer'));
    const { manager } = this.dataSource;
    const saved = await manager.save(
      manager.create(MemberImport, {
        projectId: scope.projectId, userId: scope.actor.id, fileName, state: 'mapping', cells: sheets, mapping: suggestion.mapping,
        previewDigest: null, notes: [...notes, ...suggestion.notes],
      }),
    );
    return toDto(saved, sheets, scope);
  }

  async find(scope: ProjectScope, importId: string): Promise<ImportDto> {
    const found = await this.load(this.dataSource.manager, scope, importId);
    return toDto(found, found.cells ?? [], scope);
  }

  /** Takes the person's own mapping and shows what every row would do. */
  async map(scope: ProjectScope, importId: string, mapping: ImportMapping): Promise<ImportPreviewDto> {
    return this.dataSource.transaction(async (manager) => {
      const found = await this.loadOpen(manager, scope, importId);
      const faults = checkMapping(mapping, found.cells);
      const [first] = faults;
      if (first) throw unprocessable(first.reason, faults.map((f) => ({ path: f.path, message: sentence(f.reason) })));
      const { zoneId } = mapping.defaults;
      if (zoneId && !(await manager.existsBy(Zone, { id: zoneId, projectId: scope.projectId }))) {
        throw unprocessable(message('member.zone-unknown', {}), [{ path: 'defaults.zoneId', message: 'is not a zone of the project' }]);
      }
      const evaluated = await this.evaluation.evaluate(manager, scope, sheetOf(found.cells, mapping), mapping);
      requireNeeded(mapping, evaluated);
      await manager.update(MemberImport, importId, { mapping: mapping as MemberImport['mapping'] & object, state: 'previewed', previewDigest: evaluated.digest });
      return toPreviewDto(evaluated, sheetOf(found.cells, mapping), mapping, firstPage);
    });
  }

  /** The preview against the project as it stands now; what is shown is what confirming will write. */
  async preview(scope: ProjectScope, importId: string, query: PreviewQuery): Promise<ImportPreviewDto> {
    return this.dataSource.transaction(async (manager) => {
      const found = await this.loadOpen(manager, scope, importId);
      if (found.state === 'mapping') throw conflict(message('import.map-first', {}));
      const sheet = sheetOf(found.cells, found.mapping);
      const evaluated = await this.evaluation.evaluate(manager, scope, sheet, found.mapping);
      if (evaluated.digest !== found.previewDigest) await manager.update(MemberImport, importId, { previewDigest: evaluated.digest });
      return toPreviewDto(evaluated, sheet, found.mapping, query);
    });
  }

  async abandon(scope: ProjectScope, importId: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      const found = await this.loadOpen(manager, scope, importId);
      await manager.update(MemberImport, importId, { state: 'abandoned', cells: null });
      await this.audit.record(manager, { projectId: scope.projectId, actor: scope.actor, action: 'import given up', entity: 'import', entityId: importId, label: found.fileName });
    });
  }

  /** An import is its uploader's own. @throws Refusal 404 */
  private async load(manager: EntityManager, scope: ProjectScope, importId: string, forUpdate = false): Promise<MemberImport> {
    const query = manager
      .createQueryBuilder(MemberImport, 'i')
      .addSelect('i.cells')
      .where('i.id = :importId AND i.projectId = :projectId AND i.userId = :userId', { importId, projectId: scope.projectId, userId: scope.actor.id });
    if (forUpdate) query.setLock('pessimistic_write');
    const found = await query.getOne();
    if (!found) throw notFound('import');
    return found;
  }

  /** Locked until the transaction's end, so that it is confirmed or given up once. @throws Refusal where it was already */
  async loadOpen(manager: EntityManager, scope: ProjectScope, importId: string): Promise<MemberImport & { cells: CellGrid[] }> {
    const found = await this.load(manager, scope, importId, true);
    if (found.state === 'confirmed' || found.state === 'abandoned' || !found.cells) throw conflict(message('import.over', { state: found.state }));
    return found as MemberImport & { cells: CellGrid[] };
  }
}

export function sheetOf(cells: readonly CellGrid[], mapping: ImportMapping): CellGrid {
  return cells.find((sheet) => sheet.name === mapping.sheet) ?? { name: mapping.sheet, rows: [] };
}

/** A field that no column and no value for all gives is one thing to say, not one for each row. */
function requireNeeded(mapping: ImportMapping, evaluated: Evaluation): void {
  const fields = ungivenFields(mapping);
  const newRows = evaluated.rows.filter((row) => !row.standing && row.mark).length;
  if (!fields.length || !newRows) return;
  const reason = message('import.needed-for-new', { fields: fields.map((field) => importFieldNames[field]), count: newRows });
  throw unprocessable(reason, fields.map((field) => ({ path: `columns.${field}`, message: 'is needed for new members' })));
}

function toDto(found: MemberImport, sheets: readonly CellGrid[], scope: ProjectScope): ImportDto {
  const { id, fileName, state, createdAt, mapping, notes } = found;
  const base = { id, fileName, state, createdAt: createdAt.toISOString(), mapping, notes };
  // once written or given up, the file's cells are let go
  if (sheets.length === 0) return { ...base, sheets: [] };
  return { ...base, sheets: suggestMapping(sheets, scope.roles.includes('structural-engineer')).sheets };
}
