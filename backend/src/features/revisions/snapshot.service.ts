import { Injectable } from '@nestjs/common';
import { sumDecimals } from '@mantlet/common';
import type { AcceptanceDto, RevisionSummaryDto, ScheduleSnapshot, SnapshotMember, SnapshotProduct, SnapshotZone, ZoneTargetDto } from '@mantlet/common';
import type { EntityManager } from 'typeorm';
import { canonicalJson, sha256 } from '../../shared/canonical-json.js';
import { AssessmentService } from '../assessment/assessment.service.js';
import { OpenItemsService } from '../assessment/open-items.service.js';
import { ProjectInputsService } from '../assessment/project-inputs.service.js';
import type { ProjectInputs } from '../assessment/project-inputs.service.js';
import { QuantitiesService, inWords } from '../quantities/quantities.service.js';
import type { Revision } from './revision.entity.js';

interface MemberFacts { id: string; note: string; basisSetBy: string | null; basisSetAt: Date | null }
type AcceptanceRow = { memberId: string; kind: AcceptanceDto['kind']; valueC: number | null; reason: string; by: string; at: Date };

/** Takes the snapshot that a revision freezes, and reads what is in one. */
@Injectable()
export class SnapshotService {
  constructor(
    private readonly inputs: ProjectInputsService,
    private readonly assessment: AssessmentService,
    private readonly openItems: OpenItemsService,
    private readonly quantities: QuantitiesService,
  ) {}

  /** Everything the schedule says, by value, as it stands in this transaction. Blockers are listed, not judged. */
  async take(manager: EntityManager, revision: Pick<Revision, 'id' | 'projectId' | 'code' | 'purpose'>, takenAt: Date): Promise<ScheduleSnapshot> {
    const inputs = await this.inputs.load(manager, revision.projectId, null);
    const items = await this.openItems.itemsOf(manager, inputs);
    const { id, number, name, place, currency, settings } = inputs.project;
    return {
      format: 1,
      project: { id, number, name, place, currency },
      revision: { id: revision.id, code: revision.code, purpose: revision.purpose },
      takenAt: takenAt.toISOString(),
      settings,
      levels: inputs.levels,
      zones: await this.zones(manager, inputs),
      products: await this.products(manager, inputs),
      members: await this.members(manager, inputs),
      quantities: await this.quantities.frozen(manager, inputs),
      blockers: items.filter((item) => item.kind === 'blocker'),
      warnings: items.filter((item) => item.kind === 'warning'),
    };
  }

  private async zones(manager: EntityManager, inputs: ProjectInputs): Promise<SnapshotZone[]> {
    const rows = await manager.query<{ zoneId: string; targets: ZoneTargetDto[] }[]>(
      'SELECT zone_id AS "zoneId", targets FROM zone_results WHERE zone_id = ANY($1)', [inputs.zones.map((zone) => zone.id)]);
    const targets = new Map(rows.map((row) => [row.zoneId, row.targets]));
    return inputs.zones.map(({ systems, ...zone }) => ({
      ...zone, targets: targets.get(zone.id) ?? [],
      systems: Object.entries(systems).map(([memberType, productId]) => ({ memberType: memberType as SnapshotZone['systems'][number]['memberType'], productId })),
    }));
  }

  private async products(manager: EntityManager, inputs: ProjectInputs): Promise<SnapshotProduct[]> {
    type Facts = Omit<SnapshotProduct, 'evidenceForm' | 'evidenceSha256' | 'curves' | 'environments' | 'supply' | 'name' | 'kind' | 'evidenceExpiresOn'>;
    const rows = await manager.query<Facts[]>(
      `SELECT id, maker, invented, evidence_reference AS "evidenceReference", evidence_edition AS "evidenceEdition", evidence_standard AS "evidenceStandard",
         evidence_file_sha256 AS "evidenceFileSha256", note FROM products WHERE id = ANY($1) ORDER BY name, id`, [[...inputs.products.keys()]]);
    return rows.flatMap((row): SnapshotProduct[] => {
      const product = inputs.products.get(row.id);
      if (!product) return [];
      const { name, kind, evidence, expiresOn, curves, environments, supply } = product;
      return [{ ...row, name, kind, evidenceExpiresOn: expiresOn, evidenceForm: evidence.form, evidenceSha256: sha256(canonicalJson(evidence)), curves, environments, supply }];
    });
  }

  private async members(manager: EntityManager, inputs: ProjectInputs): Promise<SnapshotMember[]> {
    const zoneIds = inputs.zones.map((zone) => zone.id);
    const facts = await manager.query<MemberFacts[]>(
      `SELECT m.id, m.note, u.name AS "basisSetBy", m.basis_set_at AS "basisSetAt" FROM members m LEFT JOIN users u ON u.id = m.basis_set_by_id
       WHERE m.zone_id = ANY($1)`, [zoneIds]);
    const acceptances = await manager.query<AcceptanceRow[]>(
      `SELECT a.member_id AS "memberId", a.kind, a.value_c AS "valueC", a.reason, u.name AS by, a.accepted_at AS at
       FROM member_acceptances a JOIN members m ON m.id = a.member_id JOIN users u ON u.id = a.accepted_by_id WHERE m.zone_id = ANY($1) ORDER BY a.kind`, [zoneIds]);
    const results = await this.assessment.storedResults(manager, zoneIds);
    const factsOf = new Map(facts.map((row) => [row.id, row]));
    const acceptancesOf = new Map<string, AcceptanceRow[]>();
    for (const row of acceptances) acceptancesOf.set(row.memberId, [...(acceptancesOf.get(row.memberId) ?? []), row]);
    return inputs.members.map(({ sectionId, acceptances: _, ...member }) => {
      const own = factsOf.get(member.id);
      const stored = results.get(member.id);
      return {
        ...member, section: inputs.sections.get(sectionId)?.designation ?? '', note: own?.note ?? '',
        basisSetBy: own?.basisSetBy ?? null, basisSetAt: own?.basisSetAt?.toISOString() ?? null,
        acceptances: (acceptancesOf.get(member.id) ?? []).map(({ kind, valueC, reason, by, at }) => ({
          kind, valueC, reason, by, at: at.toISOString(), stillHolds: stored ? this.assessment.holds({ kind, valueC }, stored.result) : false,
        })),
        result: stored?.result ?? null, areaM2: stored?.areaM2 ?? null, inputsHash: stored?.inputsHash ?? null,
      };
    });
  }
}

/** What a snapshot holds, in short. */
export function summaryOf(snapshot: ScheduleSnapshot): RevisionSummaryDto {
  const { members, quantities } = snapshot;
  return {
    levels: snapshot.levels.length, zones: snapshot.zones.length, members: members.length,
    pieces: members.reduce((sum, m) => sum + m.quantity, 0),
    bareMembers: members.filter((m) => m.result?.verdict === 'bare').length,
    protectedAreaM2: protectedArea(snapshot),
    products: quantities.purchases.flatMap((purchase) => {
      const product = snapshot.products.find((p) => p.id === purchase.productId);
      const lines = quantities.lines.filter((line) => line.productId === purchase.productId);
      if (!product) return [];
      const { id, name, kind, invented, evidenceReference, evidenceEdition, evidenceExpiresOn } = product;
      return [{
        id, name, kind, invented, evidenceReference, evidenceEdition, evidenceExpiresOn, members: lines.reduce((sum, line) => sum + line.marks, 0),
        areaM2: sumDecimals(lines.map((line) => line.netM2)).toFixed(2), purchase: inWords(purchase, lines),
      }];
    }),
    warnings: snapshot.warnings,
  };
}

/** As printed: the sum of the quantities' lines, m². */
export function protectedArea(snapshot: ScheduleSnapshot): number {
  return Number(snapshot.quantities.byLevelAndProduct.total.netM2);
}
