import { Injectable } from '@nestjs/common';
import { exposureNames, memberSentence, memberTypeNames, wayNames } from '@mantlet/common';
import type { MemberNeighboursDto, MemberPageDto, MemberQuery, MemberRowDto, MemberValue, MemberValuesDto, Message } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import { notFound } from '../../shared/refusal.js';
import { searchMembers, sortBy } from './member-search.js';
import { Member } from './member.entity.js';

const columns: Record<Exclude<keyof MemberRowDto, 'sentence'> | 'reason', string> = {
  id: 'm.id', mark: 'm.mark', version: 'm.version', levelCode: 'l.code', zoneId: 'm.zoneId', zoneCode: 'z.code', periodMin: 'z.periodMin',
  memberType: 'm.memberType', sectionId: 'm.sectionId', section: 's.designation', family: 's.family', grade: 'm.grade', lengthMm: 'm.lengthMm',
  quantity: 'm.quantity', exposure: "m.exposure->>'arrangement'", protectionForm: 'm.protectionForm', note: 'm.note', way: "m.basis->>'way'",
  verdict: 'r.verdict', sectionFactorPerM: 'r.sectionFactorPerM', criticalTemperatureC: 'r.criticalTemperatureC', utilisation: 'r.utilisation',
  assumed: 'coalesce(r.assumed, false)', requiredThickness: 'r.requiredThickness', appliedThickness: 'r.appliedThickness', thicknessUnit: 'r.thicknessUnit',
  productName: 'p.name', areaM2: 'r.areaM2', open: 'coalesce(r.open, true)', reason: 'r.reason',
};

/** What a filter may choose from: the value, how it is called, and the order it is listed in. */
const valueColumns: Record<keyof MemberValuesDto, { value: string; label?: string; order?: string; words?: Record<string, string> }> = {
  levelIds: { value: 'l.id', label: "l.code || ' ' || l.name", order: 'l.elevationM' },
  zoneIds: { value: 'z.id', label: "z.code || ' ' || z.name", order: 'z.code' },
  memberTypes: { value: 'm.memberType', words: memberTypeNames },
  families: { value: 's.family' },
  sectionIds: { value: 's.id', label: 's.designation', order: 's.designation' },
  grades: { value: 'm.grade' },
  exposures: { value: "m.exposure->>'arrangement'", words: exposureNames },
  protectionForms: { value: 'm.protectionForm', words: { profile: 'Follows the profile', boxed: 'Boxed' } },
  periods: { value: 'z.periodMin', label: "z.periodMin || ' min'", order: 'z.periodMin' },
  productIds: { value: 'p.id', label: 'p.name', order: 'p.name' },
  verdicts: { value: 'r.verdict' },
  ways: { value: "m.basis->>'way'", words: wayNames },
};

/** Thousands of members, a window at a time: filtered, searched and sorted in the database. */
@Injectable()
export class MemberListService {
  constructor(@InjectDataSource() private readonly dataSource: DataSource) {}

  async list(projectId: string, query: MemberQuery): Promise<MemberPageDto> {
    const found = searchMembers(this.dataSource.manager, projectId, query);
    // every join is to one row, so that rows are members; counting distinct keys took twice as long at 20,000 members
    const [counted, project] = await Promise.all([found.clone().select('count(*)::int', 'total').getRawOne<{ total: number }>(), this.whole(projectId)]);
    const total = counted?.total ?? 0;
    const direction = query.direction === 'desc' ? 'DESC' : 'ASC';
    found.select([]);
    for (const [name, column] of Object.entries(columns)) found.addSelect(column, name);
    found.orderBy(sortBy[query.sort], direction, 'NULLS LAST');
    if (query.sort !== 'mark') found.addOrderBy('m.mark', 'ASC');
    const rows = await found.offset((query.page - 1) * query.pageSize).limit(query.pageSize)
      .getRawMany<Omit<MemberRowDto, 'sentence'> & { reason: Message | null }>();
    return { items: rows.map(toRow), total, page: query.page, pageSize: query.pageSize, project };
  }

  /** Before and after the member in the list as the query filters and sorts it; a page or window plays no part. */
  async neighbours(projectId: string, memberId: string, query: MemberQuery): Promise<MemberNeighboursDto> {
    const direction = query.direction === 'desc' ? 'DESC' : 'ASC';
    const order = `${sortBy[query.sort]} ${direction} NULLS LAST${query.sort === 'mark' ? '' : ', m.mark ASC'}`;
    const found = searchMembers(this.dataSource.manager, projectId, query).select([]).addSelect('m.id', 'id')
      .addSelect(`lag(m.id) OVER (ORDER BY ${order})`, 'previousId').addSelect(`lead(m.id) OVER (ORDER BY ${order})`, 'nextId');
    const [sql, parameters] = found.getQueryAndParameters();
    const [row] = await this.dataSource.query<MemberNeighboursDto[]>(`SELECT "previousId", "nextId" FROM (${sql}) listed WHERE id = $${parameters.length + 1}`, [...parameters, memberId]);
    if (row) return row;
    // one that the filter leaves out has no neighbours in the list; one of another project is not there at all
    if (!(await this.dataSource.manager.existsBy(Member, { id: memberId, projectId }))) throw notFound('member');
    return { previousId: null, nextId: null };
  }

  private async whole(projectId: string): Promise<MemberPageDto['project']> {
    const [row] = await this.dataSource.query<{ members: number; open: number }[]>(
      `SELECT count(*)::int AS members, count(*) FILTER (WHERE coalesce(r.open, true))::int AS open
       FROM members m LEFT JOIN member_results r ON r.member_id = m.id WHERE m.project_id = $1`, [projectId]);
    return row as MemberPageDto['project'];
  }

  /** Every value that members of the project have, with how many have it. */
  async values(projectId: string): Promise<MemberValuesDto> {
    const entries = await Promise.all(Object.entries(valueColumns).map(async ([key, { value, label = value, order = label, words }]) => {
      const found = searchMembers(this.dataSource.manager, projectId, {}).select([])
        .addSelect(`cast(${value} AS text)`, 'value').addSelect(`max(${label})`, 'label').addSelect('count(*)::int', 'members').addSelect(`max(${order})`, 'place')
        .andWhere(`${value} IS NOT NULL`).groupBy(value).orderBy('place');
      const rows = await found.getRawMany<MemberValue>();
      return [key, rows.map((row) => ({ value: row.value, label: words?.[row.value] ?? row.label, members: row.members }))];
    }));
    return Object.fromEntries(entries) as MemberValuesDto;
  }
}

function toRow({ reason, ...row }: Omit<MemberRowDto, 'sentence'> & { reason: Message | null }): MemberRowDto {
  return { ...row, sentence: memberSentence({ ...row, reason }) };
}
