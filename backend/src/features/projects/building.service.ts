import { Injectable } from '@nestjs/common';
import type { BuildingDto, BuildingLevelDto, BuildingZoneDto, ZoneDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import { OpenItemsService } from '../assessment/open-items.service.js';
import type { ProjectInputs } from '../assessment/project-inputs.service.js';
import { ProjectInputsService } from '../assessment/project-inputs.service.js';
import { LevelsService } from '../levels/levels.service.js';
import { QuantitiesService } from '../quantities/quantities.service.js';
import { ZonesService, sumTallies } from '../zones/zones.service.js';

/** A project's front page: the building with its levels and zones, what is open, and what protects it. */
@Injectable()
export class BuildingService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly levels: LevelsService,
    private readonly zones: ZonesService,
    private readonly inputs: ProjectInputsService,
    private readonly openItems: OpenItemsService,
    private readonly quantities: QuantitiesService,
  ) {}

  async get(projectId: string): Promise<BuildingDto> {
    // read once for what is open and for what there is to apply: all members and their evidence are in it
    const inputs = await this.inputs.load(this.dataSource.manager, projectId, null);
    const [zones, issued, ofProject, openItems] = await Promise.all([
      this.zones.list(projectId), this.issuedMembersByZone(projectId), this.levels.list(projectId), this.openItems.itemsOf(this.dataSource.manager, inputs),
    ]);
    const levels = ofProject.map(({ id, code, name, elevationM, heightM }): BuildingLevelDto => ({
      id, code, name, elevationM, heightM,
      zones: zones.filter((zone) => zone.levelId === id).map((zone) => toBuildingZone(zone, issued.get(zone.id) ?? 0)),
    }));
    const { members, settled, open, unassessed } = sumTallies(zones);
    return {
      members, settled, open, unassessed, levels, openItems,
      protection: await this.protection(projectId, inputs, members, unassessed),
    };
  }

  /**
   * Products first, then what may stay bare, then what has no answer yet; the members of all lines add up to the schedule's.
   * While members are being recalculated, how much there is of a product is not known.
   */
  private async protection(projectId: string, inputs: ProjectInputs, members: number, unassessed: number): Promise<BuildingDto['protection']> {
    const products = await this.quantities.totalsByProduct(inputs);
    const [row]: { bare: string; protected: string }[] = await this.dataSource.manager.query(
      `SELECT count(*) FILTER (WHERE r.verdict = 'bare') AS bare, count(*) FILTER (WHERE r.verdict = 'protected') AS protected
         FROM members m JOIN member_results r ON r.member_id = m.id WHERE m.project_id = $1`,
      [projectId],
    );
    const bare = Number(row?.bare ?? 0);
    const unanswered = members - bare - Number(row?.protected ?? 0) - unassessed;
    return [
      ...products.map(({ productName, kind, members: count, areaM2, net }) => ({ label: productName, kind, members: count, ...(unassessed ? { areaM2: null, net: null } : { areaM2, net }) })),
      ...(bare ? [{ label: 'May stay bare', kind: 'bare' as const, members: bare, areaM2: null, net: null }] : []),
      ...(unassessed ? [{ label: 'Being recalculated', kind: 'open' as const, members: unassessed, areaM2: null, net: null }] : []),
      ...(unanswered ? [{ label: 'No answer yet', kind: 'open' as const, members: unanswered, areaM2: null, net: null }] : []),
    ];
  }

  /** Members of the zones as the issued revision froze them. */
  private async issuedMembersByZone(projectId: string): Promise<Map<string, number>> {
    const rows: { zoneId: string; members: string }[] = await this.dataSource.manager.query(
      `SELECT m->>'zoneId' AS "zoneId", count(*) AS members
         FROM revisions r, jsonb_array_elements(r.snapshot::jsonb->'members') m
        WHERE r.project_id = $1 AND r.state = 'issued' GROUP BY 1`,
      [projectId],
    );
    return new Map(rows.map(({ zoneId, members }) => [zoneId, Number(members)]));
  }
}

function toBuildingZone(zone: ZoneDto, issuedMembers: number): BuildingZoneDto {
  const { id, code, name, periodMin, curve, protectedAreaM2, members, settled, open, unassessed } = zone;
  return { id, code, name, periodMin, curve: curve.kind, protectedAreaM2, members, settled, open, unassessed, issuedMembers };
}
