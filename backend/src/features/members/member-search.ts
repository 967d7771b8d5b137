import type { MemberNarrowing, MemberSortKey } from '@mantlet/common';
import type { EntityManager, SelectQueryBuilder } from 'typeorm';
import { MemberResult } from '../assessment/member-result.entity.js';
import { Level } from '../levels/level.entity.js';
import { Product } from '../products/product.entity.js';
import { Section } from '../sections/section.entity.js';
import { Zone } from '../zones/zone.entity.js';
import { Member } from './member.entity.js';

/** coatings are kept in µm, boards and sprays in mm: one order for both */
const unitInMm = "(CASE r.thicknessUnit WHEN 'µm' THEN 0.001 ELSE 1 END)";

/** What each column is sorted by; ties go by mark, which is one of a kind in a project. */
export const sortBy: Record<MemberSortKey, string> = {
  mark: 'm.mark', level: 'l.elevationM', zone: 'z.code', type: 'm.memberType', section: 's.designation', family: 's.family', grade: 'm.grade',
  length: 'm.lengthMm', quantity: 'm.quantity', exposure: "m.exposure->>'arrangement'", form: 'm.protectionForm', sectionFactor: 'r.sectionFactorPerM',
  criticalTemperature: 'r.criticalTemperatureC', way: "m.basis->>'way'", thickness: `r.requiredThickness * ${unitInMm}`, applied: `r.appliedThickness * ${unitInMm}`,
  product: 'p.name', area: 'r.areaM2', period: 'z.periodMin', utilisation: 'r.utilisation', verdict: 'r.verdict',
};
const amongBy = {
  levelIds: 'z.levelId', zoneIds: 'm.zoneId', memberTypes: 'm.memberType', families: 's.family', sectionIds: 'm.sectionId', grades: 'm.grade',
  exposures: "m.exposure->>'arrangement'", protectionForms: 'm.protectionForm', periods: 'z.periodMin', productIds: 'r.productId', verdicts: 'r.verdict',
  ways: "m.basis->>'way'", memberIds: 'm.id',
} as const satisfies Partial<Record<keyof MemberNarrowing, string>>;

const rangeBy = {
  sectionFactor: 'r.sectionFactorPerM', criticalTemperature: 'r.criticalTemperatureC', thickness: `r.requiredThickness * ${unitInMm}`, utilisation: 'r.utilisation',
  length: 'm.lengthMm / 1000',
} as const;

/** a signature under the value that stands; leaving bare is signed only where bare is the result */
const standing = `EXISTS (SELECT 1 FROM member_acceptances a WHERE a.member_id = m.id AND abs(a.value_c - r.criticalTemperatureC) < 0.05
  AND (a.kind <> 'bare' OR r.verdict = 'bare'))`;

/** Members of the project with what they are filtered and sorted by, narrowed. */
export function searchMembers(manager: EntityManager, projectId: string, query: MemberNarrowing): SelectQueryBuilder<Member> {
  const found = manager
    .createQueryBuilder(Member, 'm')
    .innerJoin(Zone, 'z', 'z.id = m.zoneId')
    .innerJoin(Level, 'l', 'l.id = z.levelId')
    .innerJoin(Section, 's', 's.id = m.sectionId')
    .leftJoin(MemberResult, 'r', 'r.memberId = m.id')
    .leftJoin(Product, 'p', 'p.id = r.productId')
    .where('m.projectId = :projectId', { projectId });
  for (const [key, column] of Object.entries(amongBy) as [keyof typeof amongBy, string][]) {
    const values = query[key];
    if (values?.length) found.andWhere(`${column} IN (:...${key})`, { [key]: values });
  }
  for (const [name, column] of Object.entries(rangeBy) as [keyof typeof rangeBy, string][]) {
    const [above, upTo] = [query[`${name}Above`], query[`${name}UpTo`]];
    if (above !== undefined) found.andWhere(`${column} > :${name}Above`, { [`${name}Above`]: above });
    if (upTo !== undefined) found.andWhere(`${column} <= :${name}UpTo`, { [`${name}UpTo`]: upTo });
  }
  // a member that was never assessed is open as well
  if (query.open) found.andWhere('coalesce(r.open, true) = :open', { open: query.open === 'true' });
  if (query.assumed) found.andWhere('coalesce(r.assumed, false) = :assumed', { assumed: query.assumed === 'true' });
  if (query.accepted) found.andWhere(query.accepted === 'true' ? standing : `NOT ${standing}`);
  if (query.search) {
    const like = `%${query.search.replace(/[\\%_]/g, '\\$&')}%`;
    // spaces in a section's name are a matter of taste
    found.andWhere(`(m.mark ILIKE :like OR m.note ILIKE :like OR replace(s.designation, ' ', '') ILIKE replace(:like, ' ', ''))`, { like });
  }
  return found;
}
