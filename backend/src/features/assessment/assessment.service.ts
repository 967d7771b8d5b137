import { Injectable } from '@nestjs/common';
import type { MemberChartsDto, MemberResultDto, RecalculationDto, SectionOutline, WorkingStepDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import { determineSectionOutline, explainMember } from '../../calc/index.js';
import type { TakeoffMember } from '../../calc/index.js';
import { recalculateInPlaceMax } from '../../shared/environment.js';
import { lockProject } from '../../shared/project-lock.js';
import { publish, resultsEvent } from '../../shared/project-events.js';
import { notFound } from '../../shared/refusal.js';
import { JobsService } from '../jobs/jobs.service.js';
import { acceptanceHolds, inputHashes, resolveCases, withSteelReason } from './member-case.js';
import type { InputAcceptance, ProjectInputs } from './project-inputs.service.js';
import { ProjectInputsService } from './project-inputs.service.js';
import { storeOutcomes, storeZones, storedOutcomes, unassessed, withdrawResults } from './result-store.js';
import { assessInputs, takeoffMember, zoneHash } from './zone-outcome.js';

/** What the sheet of one member shows beside its stored result. */
export interface MemberExplanation {
  result: MemberResultDto;
  working: WorkingStepDto[];
  charts: MemberChartsDto | null;
  outline: SectionOutline | null;
  /** what is stored of it, which every other page shows, rests on other inputs than these */
  outOfDate: boolean;
  /** the last day of its product's assessment, where that has passed */
  evidenceExpiredOn: string | null;
}

/** Members and zones whose stored results do not rest on the inputs as they stand. */
export interface StaleResults {
  memberIds: string[];
  zoneIds: string[];
}

export interface StoredResult {
  result: MemberResultDto;
  areaM2: number | null;
  inputsHash: string;
}

/** Keeps results current with their inputs. */
@Injectable()
export class AssessmentService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly inputs: ProjectInputsService,
    private readonly jobs: JobsService,
  ) {}

  /**
   * Call it after every change to anything that enters a result: these zones (all where null) are assessed anew in the caller's
   * transaction. Where that would take long, their results are taken away instead, so that no old one is ever shown, and a worker
   * makes the new ones. `changed` counts members whose result is another than before.
   */
  async recompute(manager: EntityManager, projectId: string, zoneIds: string[] | null): Promise<RecalculationDto> {
    await lockProject(manager, projectId);
    const [touched] = await manager.query<{ n: number }[]>(
      'SELECT count(*)::int AS n FROM members WHERE project_id = $1 AND ($2::uuid[] IS NULL OR zone_id = ANY($2))', [projectId, zoneIds]);
    const members = touched?.n ?? 0;
    if (members <= recalculateInPlaceMax()) return { ...(await this.assess(manager, projectId, zoneIds)), queued: false };
    const waiting = await withdrawResults(manager, projectId, zoneIds);
    await this.jobs.enqueue(manager, projectId, 'recalculation', waiting);
    await publish(manager, [resultsEvent(projectId)]);
    return { members, changed: 0, queued: true };
  }

  /** At once, however many there are. */
  async assess(manager: EntityManager, projectId: string, zoneIds: string[] | null): Promise<{ members: number; changed: number }> {
    const inputs = await this.inputs.load(manager, projectId, zoneIds);
    const outcome = assessInputs(inputs);
    const changed = await storeOutcomes(manager, inputs.zones.map((zone) => zone.id), outcome.members);
    await storeZones(manager, outcome.zones);
    await publish(manager, [resultsEvent(projectId)]);
    return { members: outcome.members.length, changed };
  }

  recalculate(projectId: string): Promise<RecalculationDto> {
    return this.dataSource.transaction((manager) => this.recompute(manager, projectId, null));
  }

  /**
   * One member's result with its working, charts and outline, worked out from its inputs as they stand; what the zone's policy applies
   * is taken from the stored result. 404 where it is not of the project.
   */
  async explain(projectId: string, memberId: string): Promise<MemberExplanation> {
    const { manager } = this.dataSource;
    const [place] = await manager.query<{ zoneId: string }[]>('SELECT zone_id AS "zoneId" FROM members WHERE id = $1 AND project_id = $2', [memberId, projectId]);
    if (!place) throw notFound('member');
    const zone = await this.inputs.load(manager, projectId, [place.zoneId]);
    const [resolved] = resolveCases({ ...zone, members: zone.members.filter((m) => m.id === memberId) });
    if (!resolved) throw notFound('member');
    const explained = explainMember(resolved.case);
    const result = withSteelReason(resolved, explained.result);
    const stored = (await storedOutcomes(manager, [place.zoneId])).get(memberId);
    const applies = result.verdict === 'protected' && stored?.verdict === 'protected' && stored.productId === result.productId;
    const product = result.productId === null ? undefined : zone.products.get(result.productId);
    const outline = determineSectionOutline(resolved.case.shape, resolved.case.exposure, resolved.case.protectionForm);
    return {
      working: explained.working, charts: explained.charts, outline: outline.ok ? outline.value : null,
      outOfDate: stored !== undefined && stored.inputsHash !== inputHashes({ ...zone, members: [resolved.member] }).get(memberId),
      evidenceExpiredOn: product?.expired ? product.expiresOn : null,
      result: {
        ...result, assumed: result.assumed && !acceptanceHolds(resolved.member.acceptances, 'assumed', result),
        appliedThickness: applies ? stored.appliedThickness : null, layers: applies ? stored.layers : result.layers,
      },
    };
  }

  /** Members without a result: a worker is at them, and every total is incomplete. */
  unassessed(manager: EntityManager, projectId: string): Promise<number> {
    return unassessed(manager, projectId);
  }

  /** Stored results by member. */
  async storedResults(manager: EntityManager, zoneIds: string[]): Promise<Map<string, StoredResult>> {
    const stored = await storedOutcomes(manager, zoneIds);
    return new Map([...stored].map(([id, { memberId: _m, open: _o, inputsHash, areaM2, ...result }]) => [id, { result, areaM2, inputsHash }]));
  }

  /** Whether a signature still stands under the value it was given for. */
  holds(acceptance: InputAcceptance, result: MemberResultDto): boolean {
    return acceptanceHolds([acceptance], acceptance.kind, result);
  }

  /** Members that carry protection by their stored results, as the takeoff counts them. */
  async takeoffMembers(manager: EntityManager, inputs: ProjectInputs): Promise<TakeoffMember[]> {
    const stored = await storedOutcomes(manager, inputs.zones.map((zone) => zone.id));
    const levels = new Map(inputs.zones.map((zone) => [zone.id, zone.levelId]));
    return inputs.members.flatMap((member) => {
      const section = inputs.sections.get(member.sectionId);
      const result = stored.get(member.id);
      // a system taken away since the result was stored: the result is stale and counts for nothing
      if (!section || !result || (result.productId !== null && !inputs.products.has(result.productId))) return [];
      return takeoffMember(member, levels.get(member.zoneId) ?? '', section.shape, result) ?? [];
    });
  }

  /** What was not worked out from the inputs as they stand. */
  async stale(manager: EntityManager, inputs: ProjectInputs): Promise<StaleResults> {
    const zoneIds = inputs.zones.map((zone) => zone.id);
    const hashes = inputHashes(inputs);
    const members = await manager.query<{ id: string; hash: string }[]>(
      'SELECT r.member_id AS id, r.inputs_hash AS hash FROM member_results r JOIN members m ON m.id = r.member_id WHERE m.zone_id = ANY($1)', [zoneIds]);
    const zones = await manager.query<{ id: string; hash: string }[]>('SELECT zone_id AS id, inputs_hash AS hash FROM zone_results WHERE zone_id = ANY($1)', [zoneIds]);
    const storedMembers = new Map(members.map(({ id, hash }) => [id, hash]));
    const storedZones = new Map(zones.map(({ id, hash }) => [id, hash]));
    const byZone = new Map<string, string[]>(zoneIds.map((id) => [id, []]));
    for (const member of inputs.members) byZone.get(member.zoneId)?.push(hashes.get(member.id) as string);
    return {
      memberIds: inputs.members.filter((m) => storedMembers.get(m.id) !== hashes.get(m.id)).map((m) => m.id),
      // a zone without members needs no target
      zoneIds: [...byZone].filter(([id, own]) => (own.length > 0 || storedZones.has(id)) && storedZones.get(id) !== zoneHash(own)).map(([id]) => id),
    };
  }
}
