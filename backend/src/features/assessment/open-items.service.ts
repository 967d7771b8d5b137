import { Injectable } from '@nestjs/common';
import { formatNumber } from '@mantlet/common';
import type { OpenItemDto, Role } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import type { Job } from '../jobs/job.entity.js';
import { JobsService } from '../jobs/jobs.service.js';
import type { StaleResults } from './assessment.service.js';
import { AssessmentService } from './assessment.service.js';
import { acceptanceHolds } from './member-case.js';
import { LISTED_MEMBERS, inOrder, itemsOfMembers } from './open-items.js';
import type { OpenMember } from './open-items.js';
import type { InputZone, ProjectInputs } from './project-inputs.service.js';
import { ProjectInputsService } from './project-inputs.service.js';
import { storedOutcomes } from './result-store.js';
import { waitingCounts } from './waiting-counts.js';
import type { MemberOutcome } from './zone-outcome.js';

/** What keeps a schedule from being prepared or deserves a look, and who must act. */
@Injectable()
export class OpenItemsService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly inputs: ProjectInputsService,
    private readonly assessment: AssessmentService,
    private readonly jobs: JobsService,
  ) {}

  /** Blockers first, in the order of who must act; at most 500 member ids an item, `count` says how many there are. */
  async openItems(projectId: string): Promise<OpenItemDto[]> {
    const { manager } = this.dataSource;
    return this.itemsOf(manager, await this.inputs.load(manager, projectId, null));
  }

  /** The same within a transaction, for inputs that were read already (the whole project's). */
  async itemsOf(manager: EntityManager, inputs: ProjectInputs): Promise<OpenItemDto[]> {
    const stored = await storedOutcomes(manager, inputs.zones.map((zone) => zone.id));
    const { designBasis } = inputs.project.settings;
    return inOrder([
      ...withoutMembers(inputs),
      ...staleItem(await this.assessment.stale(manager, inputs), await this.jobs.unfinished(manager, inputs.project.id, 'recalculation')),
      ...itemsOfMembers(membersOf(inputs, stored), designBasis.secondSignatureAboveC),
      ...expiredProducts(inputs, stored),
      ...foreignEnvironments(inputs, stored),
    ]);
  }

  /** How many blockers wait for each role, by project; cheap, see waitingCounts. */
  waiting(projectIds: readonly string[]): Promise<Map<string, Map<Role, number>>> {
    return waitingCounts(this.dataSource.manager, projectIds);
  }
}

const zoneLabel = (zone: InputZone): string => `${zone.code} ${zone.name}`;
const blank = { zoneId: null, zoneLabel: null, memberIds: [], count: 0 };

function withoutMembers(inputs: ProjectInputs): OpenItemDto[] {
  if (inputs.members.length > 0) return [];
  return [{ ...blank, role: 'specifier', kind: 'blocker', code: 'no-members', title: 'There are no members yet; type them in or import a schedule', page: 'members' }];
}

function staleItem({ memberIds, zoneIds }: StaleResults, job: Job | null): OpenItemDto[] {
  if (memberIds.length + zoneIds.length === 0) return [];
  const what = memberIds.length > 0 ? `${formatNumber(memberIds.length)} ${memberIds.length === 1 ? 'result is' : 'results are'}` : 'Targets of zones are';
  const inWork = job !== null && job.state !== 'failed';
  const title = inWork ? `${what} being recalculated; wait until this is done` : `${what} older than the inputs; recalculate`;
  return [{
    ...blank, role: 'specifier', kind: 'blocker', code: inWork ? 'recalculating' : 'stale', title, page: 'schedule',
    memberIds: memberIds.slice(0, LISTED_MEMBERS), count: memberIds.length,
  }];
}

/** Members that have a result; the others are among the stale. */
function membersOf(inputs: ProjectInputs, stored: ReadonlyMap<string, MemberOutcome>): OpenMember[] {
  const zones = new Map(inputs.zones.map((zone, order) => [zone.id, { label: zoneLabel(zone), order }]));
  const limitC = inputs.project.settings.designBasis.secondSignatureAboveC;
  return inputs.members
    .flatMap((m): OpenMember[] => {
      const result = stored.get(m.id);
      if (!result) return [];
      const high = result.criticalTemperatureC !== null && result.criticalTemperatureC > limitC;
      return [{
        id: m.id, mark: m.mark, memberType: m.memberType, zoneId: m.zoneId, zoneLabel: zones.get(m.zoneId)?.label ?? '',
        verdict: result.verdict, reason: result.reason, assumed: result.assumed, governing: result.governing, utilisation: result.utilisation,
        criticalTemperatureC: result.criticalTemperatureC, highUnsigned: high && !acceptanceHolds(m.acceptances, 'high-temperature', result),
        bareUnsigned: result.verdict === 'bare' && !acceptanceHolds(m.acceptances, 'bare', result),
      }];
    })
    .sort((a, b) => (zones.get(a.zoneId)?.order ?? 0) - (zones.get(b.zoneId)?.order ?? 0));
}

function usersOf(productId: string, inputs: ProjectInputs, stored: ReadonlyMap<string, MemberOutcome>): string[] {
  return inputs.members.filter((m) => stored.get(m.id)?.verdict === 'protected' && stored.get(m.id)?.productId === productId).map((m) => m.id);
}

function expiredProducts(inputs: ProjectInputs, stored: ReadonlyMap<string, MemberOutcome>): OpenItemDto[] {
  return [...inputs.products.values()].filter((product) => product.expired).flatMap((product): OpenItemDto[] => {
    const users = usersOf(product.id, inputs, stored);
    if (users.length === 0) return [];
    const rest = users.length === 1 ? '1 member rests' : `${formatNumber(users.length)} members rest`;
    return [{
      ...blank, role: 'specifier', kind: 'blocker', code: 'expired', title: `The assessment of ${product.name} expired on ${product.expiresOn}; ${rest} on it`,
      page: 'products', memberIds: users.slice(0, LISTED_MEMBERS), count: users.length,
    }];
  });
}

/** A system outside the environment it is assessed for (ISO 12944-2 categories); a product that states none is not judged. */
function foreignEnvironments(inputs: ProjectInputs, stored: ReadonlyMap<string, MemberOutcome>): OpenItemDto[] {
  return inputs.zones.flatMap((zone) => [...new Set(Object.values(zone.systems))].flatMap((productId): OpenItemDto[] => {
    const product = inputs.products.get(productId);
    if (!product || product.environments.length === 0 || product.environments.includes(zone.environment)) return [];
    const users = usersOf(productId, { ...inputs, members: inputs.members.filter((m) => m.zoneId === zone.id) }, stored);
    if (users.length === 0) return [];
    return [{
      role: 'specifier', kind: 'warning', code: 'environment', page: 'zones', zoneId: zone.id, zoneLabel: zoneLabel(zone),
      title: `Zone ${zone.code} is environment ${zone.environment}; ${product.name} is assessed for ${product.environments.join(', ')}`,
      memberIds: users.slice(0, LISTED_MEMBERS), count: users.length,
    }];
  }));
}
