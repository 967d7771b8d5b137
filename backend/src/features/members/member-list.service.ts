import { Injectable } from '@nestjs/common';
import type { MemberQuery, MemberRowDto, Message, Page } from '@mantlet/common';
import { memberSentence } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { SelectQueryBuilder } from 'typeorm';
import { MemberResult } from '../assessment/member-result.entity.js';
import { Level } from '../levels/level.entity.js';
import { Product } from '../products/product.entity.js';
import { Section } from '../sections/section.entity.js';
import { Zone } from '../zones/zone.entity.js';
import { Member } from './member.entity.js';

/** What each column is sorted by; ties go by mark. */
const sortBy: Record<MemberQuery['sort'], string> = {
  mark: 'm.mark', level: 'l.elevationM', zone: 'z.code', type: 'm.memberType', section: 's.designation', sectionFactor: 'r.sectionFactorPerM',
  criticalTemperature: 'r.criticalTemperatureC', thickness: 'r.appliedThickness', verdict: 'r.verdict', quantity: 'm.quantity', length: 'm.lengthMm',
};
const columns: Record<Exclude<keyof MemberRowDto, 'sentence'> | 'reason', string> = {
  id: 'm.id', mark: 'm.mark', zoneId: 'm.zoneId', zoneCode: 'z.code', levelCode: 'l.code', memberType: 'm.memberType', sectionId: 'm.sectionId',
  section: 's.designation', grade: 'm.grade', lengthMm: 'm.lengthMm', quantity: 'm.quantity', exposure: "m.exposure->>'arrangement'",
  protectionForm: 'm.protectionForm', way: "m.basis->>'way'", verdict: 'r.verdict', sectionFactorPerM: 'r.sectionFactorPerM',
  criticalTemperatureC: 'r.criticalTemperatureC', assumed: 'coalesce(r.assumed, false)', requiredThickness: 'r.requiredThickness',
  appliedThickness: 'r.appliedThickness', thicknessUnit: 'r.thicknessUnit', productName: 'p.name', areaM2: 'r.areaM2',
  // a member that was never assessed is open as well
  open: 'coalesce(r.open, true)', version: 'm.version', reason: 'r.reason',
};

/** Thousands of members, a page at a time: filtered, searched and sorted in the database. */
@Injectable()
export class MemberListService {
  constructor(@InjectDataSource() private readonly dataSource: DataSource) {}

  async list(projectId: string, query: MemberQuery): Promise<Page<MemberRowDto>> {
    const found = this.matching(projectId, query);
    const total = await found.getCount();
    const direction = query.direction === 'desc' ? 'DESC' : 'ASC';
    found.select([]);
    for (const [name, column] of Object.entries(columns)) found.addSelect(column, name);
    found.orderBy(sortBy[query.sort], direction, 'NULLS LAST');
    if (query.sort !== 'mark') found.addOrderBy('m.mark', 'ASC');
    const rows = await found.offset((query.page - 1) * query.pageSize).limit(query.pageSize)
      .getRawMany<Omit<MemberRowDto, 'sentence'> & { reason: Message | null }>();
    return { items: rows.map(toRow), total, page: query.page, pageSize: query.pageSize };
  }

  private matching(projectId: string, query: MemberQuery): SelectQueryBuilder<Member> {
    const found = this.dataSource.manager
      .createQueryBuilder(Member, 'm')
      .innerJoin(Zone, 'z', 'z.id = m.zoneId')
      .innerJoin(Level, 'l', 'l.id = z.levelId')
      .innerJoin(Section, 's', 's.id = m.sectionId')
      .leftJoin(MemberResult, 'r', 'r.memberId = m.id')
      .leftJoin(Product, 'p', 'p.id = r.productId')
      .where('m.projectId = :projectId', { projectId });
    const among = (column: string, values: readonly string[] | undefined): void => {
      if (values?.length) found.andWhere(`${column} IN (:...${column.replace('.', '_')})`, { [column.replace('.', '_')]: values });
    };
    among('m.zoneId', query.zoneIds);
    among('z.levelId', query.levelIds);
    among('m.memberType', query.memberTypes);
    among('r.verdict', query.verdicts);
    among('r.productId', query.productIds);
    among('m.id', query.memberIds);
    if (query.open) found.andWhere('coalesce(r.open, true) = :open', { open: query.open === 'true' });
    if (query.search) {
      // spaces in a section's name are a matter of taste
      found.andWhere(`(m.mark ILIKE :like OR m.note ILIKE :like OR replace(s.designation, ' ', '') ILIKE replace(:like, ' ', ''))`, { like: `%${query.search.replace(/[\\%_]/g, '\\$&')}%` });
    }
    return found;
  }
}

function toRow({ reason, ...row }: Omit<MemberRowDto, 'sentence'> & { reason: Message | null }): MemberRowDto {
  return { ...row, sentence: memberSentence({ ...row, reason }) };
}
