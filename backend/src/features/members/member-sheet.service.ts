import { Injectable } from '@nestjs/common';
import type { MemberSheetDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, LessThan, MoreThan } from 'typeorm';
import { AssessmentService } from '../assessment/assessment.service.js';
import { MemberResult } from '../assessment/member-result.entity.js';
import { AuditService } from '../audit/audit.service.js';
import { Product } from '../products/product.entity.js';
import { Section } from '../sections/section.entity.js';
import { toSectionDto } from '../sections/sections.service.js';
import { Zone } from '../zones/zone.entity.js';
import { sentenceOf } from './member-mapper.js';
import { Member } from './member.entity.js';
import { MembersService } from './members.service.js';

/** Everything about one member: drawing, curves, working and history. */
@Injectable()
export class MemberSheetService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly members: MembersService,
    private readonly assessment: AssessmentService,
    private readonly audit: AuditService,
  ) {}

  async sheet(projectId: string, memberId: string): Promise<MemberSheetDto> {
    const { manager } = this.dataSource;
    const member = await this.members.find(manager, projectId, memberId);
    const [section, zone, stored, explained, history] = await Promise.all([
      manager.findOneByOrFail(Section, { id: member.sectionId }),
      manager.findOneOrFail(Zone, { where: { id: member.zoneId }, relations: { level: true } }),
      manager.findOneBy(MemberResult, { memberId }),
      this.assessment.explain(projectId, memberId),
      this.audit.list(projectId, { entity: 'member', entityId: memberId, page: 1, pageSize: 100 }),
    ]);
    const { result, working, charts, outline, outOfDate, evidenceExpiredOn } = explained;
    const product = result.productId ? await manager.findOne(Product, { where: { id: result.productId }, select: { id: true, name: true } }) : null;
    const { id, code, name, periodMin, curve, level } = zone;
    return {
      member, section: toSectionDto(section), zone: { id, code, name, periodMin, curve: curve.kind }, level: { id: level.id, code: level.code, name: level.name },
      productName: product?.name ?? null, result, sentence: sentenceOf(stored && result, product?.name ?? null), areaM2: stored?.areaM2 ?? null,
      outline, working, charts, outOfDate, evidenceExpiredOn, history: history.items,
      ...(await this.neighbours(projectId, member.mark)),
    };
  }

  /** By mark, within the project. */
  private async neighbours(projectId: string, mark: string): Promise<Pick<MemberSheetDto, 'previousId' | 'nextId'>> {
    const { manager } = this.dataSource;
    const [previous, next] = await Promise.all([
      manager.findOne(Member, { where: { projectId, mark: LessThan(mark) }, order: { mark: 'DESC' }, select: { id: true, mark: true } }),
      manager.findOne(Member, { where: { projectId, mark: MoreThan(mark) }, order: { mark: 'ASC' }, select: { id: true, mark: true } }),
    ]);
    return { previousId: previous?.id ?? null, nextId: next?.id ?? null };
  }
}
