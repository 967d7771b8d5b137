import type { MemberResultDto, PolicyMaterialDto, ZoneTargetDto } from '@mantlet/common';
import { thicknessUnit } from '@mantlet/common';
import { assessMembers, boxOf, girthGrowth, memberAreas, profileGroup, sectionOutline, zoneTarget } from '../../calc/index.js';
import type { TakeoffMember, TargetItem } from '../../calc/index.js';
import { acceptanceHolds, inputHashes, resolveCases, withSteelReason } from './member-case.js';
import type { ResolvedCase } from './member-case.js';
import type { ProjectInputs } from './project-inputs.service.js';
import { sha256 } from '../../shared/canonical-json.js';

/** What is stored of a member. */
export interface MemberOutcome extends MemberResultDto {
  memberId: string;
  inputsHash: string;
  /** net protected area of all pieces, m² */
  areaM2: number | null;
  open: boolean;
}
export interface ZoneOutcome {
  zoneId: string;
  inputsHash: string;
  members: number;
  settled: number;
  open: number;
  protectedAreaM2: number;
  targets: ZoneTargetDto[];
}

/** The takeoff's view of a member under a result; null where nothing is applied to it. */
export function takeoffMember(
  member: ResolvedCase['member'], levelId: string, shape: ResolvedCase['case']['shape'],
  result: Pick<MemberResultDto, 'verdict' | 'productId' | 'coatedGirthMm' | 'appliedThickness' | 'layers'>,
): TakeoffMember | null {
  if (result.verdict !== 'protected' || result.productId === null || result.coatedGirthMm === null || result.appliedThickness === null) return null;
  const { id, mark, zoneId, memberType, onSite, quantity, lengthMm, coatBackConnections, coatBackGirthMm, deductionM2, exposure, protectionForm } = member;
  return {
    id, mark, levelId, zoneId, productId: result.productId, memberType, group: profileGroup(shape), onSite, quantity, lengthMm,
    coatedGirthMm: result.coatedGirthMm, box: boxOf(sectionOutline(shape, exposure, protectionForm)),
    thickness: result.appliedThickness, layers: result.layers, coatBackConnections, coatBackGirthMm, deductionM2,
  };
}

/** Assesses all members of the inputs; then, zone by zone and system by system, the target sets what each one gets. */
export function assessInputs(inputs: ProjectInputs): { members: MemberOutcome[]; zones: ZoneOutcome[] } {
  const resolved = resolveCases(inputs);
  const hashes = inputHashes(inputs);
  const assessed = assessMembers(resolved.map((r) => r.case));
  const outcomes = resolved.map((r, i): MemberOutcome => {
    const result = withSteelReason(r, assessed[i] as MemberResultDto);
    const assumed = result.assumed && !acceptanceHolds(r.member.acceptances, 'assumed', result);
    return { ...result, assumed, appliedThickness: null, memberId: r.member.id, inputsHash: hashes.get(r.member.id) as string, areaM2: null, open: false };
  });
  const byZone = new Map<string, { resolved: ResolvedCase; outcome: MemberOutcome }[]>(inputs.zones.map((zone) => [zone.id, []]));
  resolved.forEach((r, i) => byZone.get(r.zone.id)?.push({ resolved: r, outcome: outcomes[i] as MemberOutcome }));
  const zones = inputs.zones.map((zone) => settleZone(inputs, zone.id, byZone.get(zone.id) ?? []));
  return { members: outcomes, zones };
}

type Pair = { resolved: ResolvedCase; outcome: MemberOutcome };

function settleZone(inputs: ProjectInputs, zoneId: string, pairs: Pair[]): ZoneOutcome {
  const byProduct = new Map<string, Pair[]>();
  for (const pair of pairs) {
    const { outcome } = pair;
    if (outcome.verdict !== 'protected' || outcome.productId === null || outcome.requiredThickness === null) continue;
    const group = byProduct.get(outcome.productId);
    if (group) group.push(pair);
    else byProduct.set(outcome.productId, [pair]);
  }
  const targets = [...byProduct].map(([productId, group]) => applyTarget(inputs, productId, group));
  for (const { resolved, outcome } of pairs) outcome.open = isOpen(outcome, resolved.product?.expired ?? false);
  const open = pairs.filter(({ outcome }) => outcome.open).length;
  return {
    zoneId, inputsHash: zoneHash(pairs.map(({ outcome }) => outcome.inputsHash)), members: pairs.length, settled: pairs.length - open, open,
    protectedAreaM2: pairs.reduce((sum, { outcome }) => sum + (outcome.areaM2 ?? 0), 0), targets,
  };
}

/** A zone's target rests on all of its members: one that left is seen, too. */
export const zoneHash = (memberHashes: readonly string[]): string => sha256([...memberHashes].sort().join('|'));

/** What keeps the schedule from being prepared. */
export function isOpen(result: Pick<MemberResultDto, 'verdict' | 'assumed'>, productExpired: boolean): boolean {
  return result.assumed || (result.verdict !== 'protected' && result.verdict !== 'bare') || (result.verdict === 'protected' && productExpired);
}

function applyTarget(inputs: ProjectInputs, productId: string, group: Pair[]): ZoneTargetDto {
  const product = inputs.products.get(productId);
  const first = group[0];
  if (!product || !first) throw new Error(`product ${productId} was not read`);
  const { deductions } = inputs.project.settings;
  const { zone } = first.resolved;
  const bodies = group.map(({ resolved, outcome }) =>
    takeoffMember(resolved.member, zone.levelId, resolved.case.shape, { ...outcome, appliedThickness: outcome.requiredThickness }) as TakeoffMember);
  const items = group.map(({ resolved, outcome }, i): TargetItem => {
    const body = bodies[i] as TakeoffMember;
    return {
      id: outcome.memberId, mark: resolved.member.mark, requiredThickness: outcome.requiredThickness as number, layers: outcome.layers,
      sectionFactorPerM: outcome.sectionFactorPerM as number, criticalTemperatureC: outcome.criticalTemperatureC as number,
      areaM2: memberAreas({ ...body, thickness: 0 }, deductions).netM2, girthGrowth: girthGrowth(body.box),
      lengthM: (resolved.member.lengthMm * resolved.member.quantity) / 1000,
    };
  });
  const target = zoneTarget(items, zone.targetPolicy, product.kind, product.supply);
  let areaM2 = 0;
  group.forEach(({ outcome }, i) => {
    const applied = target.applied[i];
    outcome.appliedThickness = applied?.thickness ?? null;
    outcome.layers = applied?.layers ? [...applied.layers] : null;
    outcome.areaM2 = memberAreas({ ...(bodies[i] as TakeoffMember), thickness: outcome.appliedThickness ?? 0, layers: outcome.layers }, deductions).netM2;
    areaM2 += outcome.areaM2;
  });
  return {
    productId, productName: product.name, productKind: product.kind, thicknessUnit: thicknessUnit[product.kind], members: target.members, areaM2,
    governing: target.governing, lowestCriticalTemperatureC: target.lowestCriticalTemperatureC, highestSectionFactorPerM: target.highestSectionFactorPerM,
    policies: target.policies.map(({ policy, thicknesses, material, materialUnit, areaM2: policyAreaM2, volumeM3 }): PolicyMaterialDto => ({ policy, thicknesses, material, materialUnit, areaM2: policyAreaM2, volumeM3 })),
  };
}
