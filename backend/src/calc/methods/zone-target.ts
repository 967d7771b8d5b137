import type { ProductKind, ProductSupply, TargetPolicy } from '@mantlet/common';

/** One member that needs a product's thickness. */
export interface TargetItem {
  id: string;
  mark: string;
  /** µm coating, mm board and spray; boards: a stocked thickness or stack */
  requiredThickness: number;
  layers: readonly number[] | null;
  sectionFactorPerM: number;
  criticalTemperatureC: number;
  /** all pieces: girth (boards: inner box girth) × length, less deductions, m² */
  areaM2: number;
  /** boards: how much the outer girth grows per mm of thickness (8 for a full box), mm/mm; 0 otherwise */
  girthGrowth: number;
  /** all pieces together, m */
  lengthM: number;
}

/** What a policy needs of the product for a zone. */
export interface PolicyMaterial {
  policy: TargetPolicy['policy'];
  /** distinct applied thicknesses, rising */
  thicknesses: number[];
  areaM2: number;
  /** material in place, m³: thickness × area */
  volumeM3: number;
  /** litres of coating with loss, m² of board (all layers, without cutting waste), m³ of spray with loss; null where the product's supply data lack it */
  material: number | null;
  materialUnit: 'L' | 'm²' | 'm³';
}

export interface AppliedThickness {
  id: string;
  thickness: number;
  layers: readonly number[] | null;
}

export interface ZoneTarget {
  members: number;
  governing: { memberId: string; mark: string; requiredThickness: number } | null;
  lowestCriticalTemperatureC: number | null;
  highestSectionFactorPerM: number | null;
  /** area under the chosen policy, m² */
  areaM2: number;
  /** own, bands, one: always all three */
  policies: PolicyMaterial[];
  /** by the chosen policy, in the order of the items; never below required */
  applied: AppliedThickness[];
}

/** Bands shown for comparison where the chosen policy is another. */
export const bandsForComparison = 3;

interface Step {
  thickness: number;
  layers: readonly number[] | null;
  areaM2: number;
  /** Σ growth × length, m² of area per mm of thickness, so that area(t) = areaM2 + growth·t */
  growth: number;
}

/** Distinct required thicknesses, rising, with the area that needs each. */
function stepsOf(items: readonly TargetItem[]): Step[] {
  const byThickness = new Map<number, Step>();
  for (const item of items) {
    let step = byThickness.get(item.requiredThickness);
    if (!step) byThickness.set(item.requiredThickness, (step = { thickness: item.requiredThickness, layers: item.layers, areaM2: 0, growth: 0 }));
    step.areaM2 += item.areaM2;
    step.growth += (item.girthGrowth * item.lengthM) / 1000;
  }
  return [...byThickness.values()].sort((a, b) => a.thickness - b.thickness);
}

/** Material of one band, thickness × area, the area taken at the band's own thickness. */
export function bandMaterial(thickness: number, areaM2: number, growth: number): number {
  return thickness * (areaM2 + growth * thickness);
}

/**
 * The last index of each band of the partition of rising thicknesses into at most `bands` bands that needs the least material;
 * of equal partitions the one with fewest bands. Exact: a band takes its greatest thickness, so bands of a best partition are
 * contiguous, and the best partition of the first j steps into b bands ends with a band i…j after the best of the first i − 1
 * into b − 1. O(bands·n²).
 */
export function bestBands(steps: readonly Pick<Step, 'thickness' | 'areaM2' | 'growth'>[], bands: number): number[] {
  const n = steps.length;
  const area = new Float64Array(n + 1);
  const growth = new Float64Array(n + 1);
  steps.forEach((s, i) => {
    area[i + 1] = (area[i] as number) + s.areaM2;
    growth[i + 1] = (growth[i] as number) + s.growth;
  });
  const cost = (from: number, to: number): number =>
    bandMaterial((steps[to - 1] as Step).thickness, (area[to] as number) - (area[from] as number), (growth[to] as number) - (growth[from] as number));
  let before = new Float64Array(n + 1).fill(Infinity);
  before[0] = 0;
  const starts: Int32Array[] = [];
  let best = { bands: 0, material: Infinity };
  const most = Math.min(bands, n);
  for (let b = 1; b <= most; b += 1) {
    const now = new Float64Array(n + 1).fill(Infinity);
    const start = new Int32Array(n + 1);
    for (let to = b; to <= n; to += 1) {
      for (let from = b - 1; from < to; from += 1) {
        const material = (before[from] as number) + cost(from, to);
        if (material < (now[to] as number)) {
          now[to] = material;
          start[to] = from;
        }
      }
    }
    starts.push(start);
    const material = now[n] as number;
    if (material < best.material * (1 - 1e-12)) best = { bands: b, material };
    before = now;
  }
  const ends: number[] = [];
  let to = n;
  for (let b = best.bands; b > 0; b -= 1) {
    ends.unshift(to - 1);
    to = (starts[b - 1] as Int32Array)[to] as number;
  }
  return ends;
}

function materialOf(kind: ProductKind, supply: ProductSupply, bands: { thickness: number; layers: number; areaM2: number; growth: number }[]) {
  const toMetre = kind === 'coating' ? 1e-6 : 1e-3;
  const areas = bands.map((b) => b.areaM2 + b.growth * b.thickness);
  const areaM2 = areas.reduce((a, b) => a + b, 0);
  const volumeM3 = bands.reduce((sum, b) => sum + bandMaterial(b.thickness, b.areaM2, b.growth) * toMetre, 0);
  const kept = 1 - supply.lossFraction;
  if (kind === 'board') {
    return { areaM2, volumeM3, material: bands.reduce((sum, b, i) => sum + b.layers * (areas[i] ?? 0), 0), materialUnit: 'm²' as const };
  }
  if (kind === 'spray') return { areaM2, volumeM3, material: volumeM3 / kept, materialUnit: 'm³' as const };
  const solids = supply.volumeSolidsPercent;
  return { areaM2, volumeM3, material: solids === null ? null : (volumeM3 * 1000) / (solids / 100) / kept, materialUnit: 'L' as const };
}

function endsOf(policy: TargetPolicy, steps: readonly Step[]): number[] {
  if (policy.policy === 'own') return steps.map((_, i) => i);
  if (policy.policy === 'one') return steps.length > 0 ? [steps.length - 1] : [];
  return bestBands(steps, policy.bands);
}

function policyMaterial(policy: TargetPolicy, steps: readonly Step[], kind: ProductKind, supply: ProductSupply): PolicyMaterial {
  let from = 0;
  const bands = endsOf(policy, steps).map((end) => {
    const members = steps.slice(from, end + 1);
    from = end + 1;
    const top = steps[end] as Step;
    return {
      thickness: top.thickness,
      layers: top.layers?.length ?? 1,
      areaM2: members.reduce((a, s) => a + s.areaM2, 0),
      growth: members.reduce((a, s) => a + s.growth, 0),
    };
  });
  return { policy: policy.policy, thicknesses: bands.map((b) => b.thickness), ...materialOf(kind, supply, bands) };
}

function governingOf(items: readonly TargetItem[]): TargetItem | null {
  let best: TargetItem | null = null;
  for (const item of items) {
    if (
      !best || item.requiredThickness > best.requiredThickness
      || (item.requiredThickness === best.requiredThickness && item.criticalTemperatureC < best.criticalTemperatureC)
    ) best = item;
  }
  return best;
}

function appliedOf(items: readonly TargetItem[], policy: TargetPolicy, steps: readonly Step[]): AppliedThickness[] {
  const tops = endsOf(policy, steps).map((end) => steps[end] as Step);
  return items.map((item) => {
    const top = tops.find((t) => t.thickness >= item.requiredThickness) as Step;
    return { id: item.id, thickness: top.thickness, layers: top.layers };
  });
}

/**
 * The target protection level of the members of one zone that share a product and a period: who governs, what each policy needs,
 * and what the chosen policy puts on each member.
 */
export function zoneTarget(items: readonly TargetItem[], policy: TargetPolicy, kind: ProductKind, supply: ProductSupply): ZoneTarget {
  const steps = stepsOf(items);
  const governing = governingOf(items);
  const compared: TargetPolicy[] = [
    { policy: 'own' },
    policy.policy === 'bands' ? policy : { policy: 'bands', bands: bandsForComparison },
    { policy: 'one' },
  ];
  const policies = compared.map((p) => policyMaterial(p, steps, kind, supply));
  return {
    members: items.length,
    governing: governing && { memberId: governing.id, mark: governing.mark, requiredThickness: governing.requiredThickness },
    lowestCriticalTemperatureC: items.length === 0 ? null : items.reduce((least, i) => Math.min(least, i.criticalTemperatureC), Infinity),
    highestSectionFactorPerM: items.length === 0 ? null : items.reduce((most, i) => Math.max(most, i.sectionFactorPerM), -Infinity),
    areaM2: policies.find((p) => p.policy === policy.policy)?.areaM2 ?? 0,
    policies,
    applied: appliedOf(items, policy, steps),
  };
}
