import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { importFieldNames, importFields, message, sentence } from '@mantlet/common';
import type { ImportField, ImportMapping, ImportPreviewDto, ImportRowDto, ImportRowState } from '@mantlet/common';
import { In } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { ProjectScope } from '../../shared/access.js';
import { Level } from '../levels/level.entity.js';
import { Member } from '../members/member.entity.js';
import { Section } from '../sections/section.entity.js';
import { SectionsService } from '../sections/sections.service.js';
import type { SectionResolver } from '../sections/sections.service.js';
import { Zone } from '../zones/zone.entity.js';
import type { CellGrid } from './reading/cell-grid.js';
import { columnLetters } from './reading/cell-grid.js';
import { compareRow } from './rows/compare.js';
import type { ComparedRow } from './rows/compare.js';
import { isStructural } from './rows/suggest-mapping.js';
import { readRows } from './rows/read-rows.js';

export interface Evaluation {
  rows: ComparedRow[];
  notes: string[];
  counts: Record<ImportRowState, number>;
  /** the same for the same outcome: every row's state and what it would write */
  digest: string;
  /** the members that rows would change, by id */
  standing: ReadonlyMap<string, Member>;
}

/** Reads a schedule by its mapping and holds it against the project as it stands. Writes nothing. */
@Injectable()
export class ImportEvaluationService {
  constructor(private readonly sections: SectionsService) {}

  async evaluate(manager: EntityManager, scope: ProjectScope, sheet: CellGrid, given: ImportMapping): Promise<Evaluation> {
    const { projectId } = scope;
    const { mapping, ignored } = withoutForeignColumns(given, scope);
    const zones = await manager.find(Zone, { where: { projectId }, select: { id: true, code: true, name: true, levelId: true }, order: { code: 'ASC' } });
    const levels = await manager.find(Level, { where: { projectId }, select: { id: true, code: true, name: true }, order: { elevationM: 'ASC' } });
    const resolver = remembering(await this.sections.resolver(projectId, manager));
    const read = readRows(sheet.rows, { mapping, places: { zones, levels }, section: resolver.find, suggestSections: resolver.suggest });
    const members = await manager.findBy(Member, { projectId });
    const byMark = new Map(members.map((member) => [member.mark, member]));
    const levelCodes = new Map(levels.map((level) => [level.id, level.code]));
    const namer = {
      zone: nameOf(new Map(zones.map((z) => [z.id, z.code]))),
      levelOf: nameOf(new Map(zones.map((z) => [z.id, levelCodes.get(z.levelId) ?? '']))),
      section: await this.sectionNames(manager, members, read.rows.flatMap((r) => r.draft.sectionId ?? [])),
    };
    const rows = read.rows.map((row) => compareRow(row, byMark.get(row.mark) ?? null, mapping.defaults, namer));
    return { rows, notes: [...ignored, ...read.notes], counts: count(rows), digest: digestOf(rows), standing: new Map(members.map((m) => [m.id, m])) };
  }

  private async sectionNames(manager: EntityManager, members: readonly Member[], more: readonly string[]): Promise<(id: string) => string> {
    const ids = [...new Set([...members.map((m) => m.sectionId), ...more])];
    const sections = await manager.find(Section, { where: { id: In(ids) }, select: { id: true, designation: true } });
    return nameOf(new Map(sections.map((s) => [s.id, s.designation])));
  }
}

const nameOf = (names: ReadonlyMap<string, string>) => (id: string): string => names.get(id) ?? '';

/** The structural engineer's columns count only where the importer is one. */
function withoutForeignColumns(mapping: ImportMapping, scope: ProjectScope): { mapping: ImportMapping; ignored: string[] } {
  if (scope.roles.includes('structural-engineer')) return { mapping, ignored: [] };
  const chosen = Object.entries(mapping.columns) as [ImportField, number][];
  const foreign = chosen.filter(([field]) => isStructural(field)).map(([field]) => importFieldNames[field]);
  if (!foreign.length) return { mapping, ignored: [] };
  const columns = Object.fromEntries(chosen.filter(([field]) => !isStructural(field)));
  return { mapping: { ...mapping, columns }, ignored: [sentence(message('import.structural-ignored', { fields: foreign }))] };
}

/** A schedule of thousands of rows has dozens of sections; unknown ones are searched for once each. */
function remembering(resolver: SectionResolver): SectionResolver {
  const found = new Map<string, Section | null>();
  const suggested = new Map<string, string[]>();
  const once = <T>(known: Map<string, T>, text: string, work: (text: string) => T): T => {
    if (!known.has(text)) known.set(text, work(text));
    return known.get(text) as T;
  };
  // past the first hundred unknown names the file has another trouble, and suggestions would only cost time
  const suggest = (text: string): string[] => (suggested.size < 100 || suggested.has(text) ? once(suggested, text, resolver.suggest) : []);
  return { find: (text) => once(found, text, resolver.find), suggest };
}

function count(rows: readonly ComparedRow[]): Record<ImportRowState, number> {
  const counts: Record<ImportRowState, number> = { new: 0, changed: 0, unchanged: 0, wrong: 0 };
  for (const row of rows) counts[row.state] += 1;
  return counts;
}

function digestOf(rows: readonly ComparedRow[]): string {
  const hash = createHash('sha256');
  for (const { row, state, mark, changes, target, basis, problems } of rows) {
    hash.update(JSON.stringify([row, state, mark, changes, state === 'new' ? target : null, basis, problems.length]));
  }
  return hash.digest('hex');
}

export function toPreviewDto(evaluation: Evaluation, sheet: CellGrid, mapping: ImportMapping, query: { state?: ImportRowState | undefined; page: number; pageSize: number }): ImportPreviewDto {
  const wanted = query.state ? evaluation.rows.filter((row) => row.state === query.state) : evaluation.rows;
  const headers = sheet.rows[mapping.headerRow - 1] ?? [];
  return {
    notes: evaluation.notes, counts: evaluation.counts, total: wanted.length, page: query.page, pageSize: query.pageSize,
    rows: wanted.slice((query.page - 1) * query.pageSize, query.page * query.pageSize).map((row) => toRowDto(row, headers, mapping)),
  };
}

export function toRowDto(row: ComparedRow, headers: readonly string[], mapping: ImportMapping): ImportRowDto {
  return {
    row: row.row, state: row.state, mark: row.mark, values: row.values, changes: row.changes,
    problems: [...row.problems].sort((a, b) => importFields.indexOf(a.field) - importFields.indexOf(b.field))
      .map(({ field, reason }) => ({ column: columnLabel(field, headers, mapping), sentence: sentence(reason) })),
  };
}

/** As the file names it, with the letter a spreadsheet shows: "Length (mm), column F". */
function columnLabel(field: ImportField, headers: readonly string[], mapping: ImportMapping): string {
  const column = mapping.columns[field];
  if (column === undefined) return `${importFieldNames[field]}, no column`;
  return `${headers[column] || importFieldNames[field]}, column ${columnLetters(column)}`;
}
