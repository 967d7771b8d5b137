import type { MemberResultDto, SectionShape } from '@mantlet/common';
import { yieldStrength } from '../../calc/index.js';
import type { Determined, MemberCase } from '../../calc/index.js';
import { canonicalJson, sha256 } from '../../shared/canonical-json.js';
import type { InputAcceptance, InputMember, InputProduct, InputZone, ProjectInputs } from './project-inputs.service.js';

/** The thickest part, which decides the yield strength (EN 1993-1-1 Table 3.1). mm */
export function thickestPartMm(shape: SectionShape): number {
  switch (shape.kind) {
    case 'i': case 'channel': case 'tee': case 'box': return Math.max(shape.tfMm, shape.twMm);
    case 'i-unequal': return Math.max(shape.twMm, shape.topThicknessMm, shape.bottomThicknessMm);
    case 'round': return shape.dMm;
    default: return shape.tMm;
  }
}

/** A member as the calculation reads it, or the reason why its steel is unknown though the temperature depends on it. */
export interface ResolvedCase {
  member: InputMember;
  zone: InputZone;
  product: InputProduct | null;
  steel: Determined<number>;
  case: MemberCase;
}

/** Resolves every id of the inputs. In the order of the members. */
export function resolveCases(inputs: ProjectInputs): ResolvedCase[] {
  const { settings } = inputs.project;
  const zones = new Map(inputs.zones.map((zone) => [zone.id, zone]));
  const products = new Map([...inputs.products.values()].map((p) => [p.id, { id: p.id, kind: p.kind, evidence: p.evidence, curves: p.curves, expired: p.expired, name: p.name }]));
  return inputs.members.map((member) => {
    const zone = zones.get(member.zoneId);
    const section = inputs.sections.get(member.sectionId);
    if (!zone || !section) throw new Error(`member ${member.id} refers to a zone or section that was not read`);
    const productId = zone.systems[member.memberType];
    const steel = yieldStrength(member.grade, thickestPartMm(section.shape));
    // a declared temperature does not read the strength; without a strength every other way is refused
    const strengthMatters = !steel.ok && member.basis.way !== 'declared';
    return {
      member, zone, steel: strengthMatters ? steel : { ok: true, value: steel.ok ? steel.value : 0 },
      product: (productId && inputs.products.get(productId)) || null,
      case: {
        memberType: member.memberType, shape: section.shape, properties: section.properties,
        steel: { grade: member.grade, yieldStrengthMPa: steel.ok ? steel.value : 0 },
        exposure: member.exposure, protectionForm: member.protectionForm,
        basis: strengthMatters ? { way: 'none' } : member.basis,
        accepted: false, design: settings.designBasis, readingRules: settings.readingRules, periodMin: zone.periodMin, curve: zone.curve,
        product: (productId && products.get(productId)) || null,
      },
    };
  });
}

/** Puts back what resolveCases withheld: the way, and the steel as the reason. */
export function withSteelReason(resolved: ResolvedCase, result: MemberResultDto): MemberResultDto {
  if (resolved.steel.ok || resolved.member.basis.way === 'none') return result;
  return { ...result, way: resolved.member.basis.way, reason: resolved.steel.reason };
}

/** Two temperatures that print alike are the same to whoever signed. */
const sameTemperature = (a: number | null, b: number | null): boolean => a !== null && b !== null && Math.abs(a - b) < 0.05;

/** A signature holds only under the value it was given for; leaving a member bare has the bare limit as its value. */
export function acceptanceHolds(acceptances: readonly InputAcceptance[], kind: InputAcceptance['kind'], result: MemberResultDto): boolean {
  return acceptances.some((a) => a.kind === kind && sameTemperature(a.valueC, result.criticalTemperatureC) && (kind !== 'bare' || result.verdict === 'bare'));
}

/** Changes whenever the calculation itself does, so that stored results are seen to be older. */
const METHOD_VERSION = 4;

/** A digest for each member over everything that enters its result; parts that many share are digested once. */
export function inputHashes(inputs: ProjectInputs): Map<string, string> {
  const digest = (value: unknown): string => sha256(canonicalJson(value));
  const { designBasis, readingRules, deductions } = inputs.project.settings;
  const settings = digest({ METHOD_VERSION, designBasis, readingRules, deductions });
  const sections = new Map([...inputs.sections.values()].map((s) => [s.id, digest([s.shape, s.properties])]));
  const products = new Map([...inputs.products.values()].map((p) => [p.id, digest([p.id, p.kind, p.name, p.evidence, p.curves, p.expired, p.supply])]));
  const zones = new Map(inputs.zones.map((z) => [z.id, { systems: z.systems, digest: digest([z.periodMin, z.curve, z.targetPolicy]) }]));
  return new Map(inputs.members.map((m) => {
    const zone = zones.get(m.zoneId);
    const product = zone?.systems[m.memberType];
    const { id: _id, mark: _mark, sectionId, zoneId, ...own } = m;
    const parts = [canonicalJson(own), sections.get(sectionId), zoneId, zone?.digest, product ? products.get(product) : 'none', settings];
    return [m.id, sha256(parts.join('|'))];
  }));
}
