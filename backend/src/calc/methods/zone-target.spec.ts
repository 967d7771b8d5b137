import { productSupplySchema } from '@mantlet/common';
import fc from 'fast-check';
import { bandMaterial, bestBands, zoneTarget } from './zone-target.js';
import type { TargetItem } from './zone-target.js';

const supply = productSupplySchema.parse({ volumeSolidsPercent: 70, lossFraction: 0.2 });

/** Every way to put n members into at most k groups, each at its greatest thickness: nothing about order or contiguity is assumed. */
function leastByTryingAll(steps: { thickness: number; areaM2: number; growth: number }[], bands: number): number {
  let least = Infinity;
  const groups: (typeof steps)[] = [];
  const place = (i: number): void => {
    if (i === steps.length) {
      const material = groups.reduce((sum, g) => sum + bandMaterial(
        Math.max(...g.map((s) => s.thickness)), g.reduce((a, s) => a + s.areaM2, 0), g.reduce((a, s) => a + s.growth, 0)), 0);
      least = Math.min(least, material);
      return;
    }
    const step = steps[i] as (typeof steps)[number];
    for (const g of groups) {
      g.push(step);
      place(i + 1);
      g.pop();
    }
    if (groups.length < bands) {
      groups.push([step]);
      place(i + 1);
      groups.pop();
    }
  };
  place(0);
  return least;
}

function materialOf(steps: { thickness: number; areaM2: number; growth: number }[], ends: number[]): number {
  let from = 0;
  return ends.reduce((sum, end) => {
    const band = steps.slice(from, end + 1);
    from = end + 1;
    return sum + bandMaterial(steps[end]!.thickness, band.reduce((a, s) => a + s.areaM2, 0), band.reduce((a, s) => a + s.growth, 0));
  }, 0);
}

const stepsArbitrary = fc.uniqueArray(
  fc.record({ thickness: fc.integer({ min: 1, max: 60 }), areaM2: fc.double({ min: 0.1, max: 100, noNaN: true }), growth: fc.double({ min: 0, max: 2, noNaN: true }) }),
  { minLength: 1, maxLength: 8, selector: (s) => s.thickness },
).map((steps) => steps.sort((a, b) => a.thickness - b.thickness));

const item = (id: string, requiredThickness: number, areaM2: number, change: Partial<TargetItem> = {}): TargetItem => ({
  id, mark: id.toUpperCase(), requiredThickness, layers: null, sectionFactorPerM: 150, criticalTemperatureC: 550, areaM2, girthGrowth: 0, lengthM: 10, ...change,
});

describe('bands', () => {
  it('need as little as the best of all partitions', () => {
    fc.assert(fc.property(stepsArbitrary, fc.integer({ min: 1, max: 5 }), (steps, bands) => {
      const ends = bestBands(steps, bands);
      expect(ends.length).toBeLessThanOrEqual(bands);
      expect(ends[ends.length - 1]).toBe(steps.length - 1);
      const least = leastByTryingAll(steps, bands);
      expect(Math.abs(materialOf(steps, ends) - least)).toBeLessThanOrEqual(1e-9 * least);
    }), { numRuns: 150 });
  });

  it('are one for one band and own for as many as there are thicknesses', () => {
    const steps = [1, 2, 5, 9].map((thickness) => ({ thickness, areaM2: 1, growth: 0 }));
    expect(bestBands(steps, 1)).toEqual([3]);
    expect(bestBands(steps, 9)).toEqual([0, 1, 2, 3]);
    expect(bestBands([], 3)).toEqual([]);
  });
});

describe('zone target', () => {
  const items = [
    item('a', 300, 100), item('b', 500, 10, { criticalTemperatureC: 520 }), item('c', 900, 50, { criticalTemperatureC: 600, sectionFactorPerM: 280 }),
    item('d', 900, 1, { criticalTemperatureC: 580 }),
  ];

  it('shows every policy beside the others', () => {
    const target = zoneTarget(items, { policy: 'bands', bands: 2 }, 'coating', supply);
    const [own, bands, one] = target.policies;
    // 2 bands: 500 µm on 110 m² and 900 µm on 51 m² against 300 on 100 and 900 on 61; µm × m² = 55 000 + 45 900 against 30 000 + 54 900
    expect(bands?.thicknesses).toEqual([300, 900]);
    expect(bands?.volumeM3).toBeCloseTo(0.0849, 10);
    expect(own?.thicknesses).toEqual([300, 500, 900]);
    expect(own?.volumeM3).toBeCloseTo(0.0809, 10);
    expect(one?.volumeM3).toBeCloseTo(0.1449, 10);
    // litres = m³ × 1000/0.70/0.80
    expect(one?.material).toBeCloseTo(258.75, 8);
    expect(one?.materialUnit).toBe('L');
    expect(target.applied.map((a) => a.thickness)).toEqual([300, 900, 900, 900]);
  });

  it('names the governing member: greatest thickness, ties by lowest critical temperature', () => {
    const target = zoneTarget(items, { policy: 'own' }, 'coating', supply);
    expect(target.governing).toEqual({ memberId: 'd', mark: 'D', requiredThickness: 900 });
    expect(target.lowestCriticalTemperatureC).toBe(520);
    expect(target.highestSectionFactorPerM).toBe(280);
  });

  it('lets the girth of boards grow with the thickness applied', () => {
    // box 1.0 m of girth, 10 m long: at 20 mm all round 1.16 m × 10 m
    const boards = [item('a', 15, 10, { girthGrowth: 8, layers: [15] }), item('b', 20, 10, { girthGrowth: 8, layers: [20] })];
    const target = zoneTarget(boards, { policy: 'one' }, 'board', supply);
    expect(target.areaM2).toBeCloseTo(23.2, 10);
    expect(target.policies[2]?.volumeM3).toBeCloseTo(0.464, 10);
    expect(target.applied[0]).toEqual({ id: 'a', thickness: 20, layers: [20] });
  });

  it('says nothing of an empty zone and no litres without volume solids', () => {
    expect(zoneTarget([], { policy: 'one' }, 'coating', supply)).toMatchObject({ governing: null, lowestCriticalTemperatureC: null, highestSectionFactorPerM: null, applied: [] });
    expect(zoneTarget(items, { policy: 'own' }, 'coating', productSupplySchema.parse({})).policies[0]?.material).toBeNull();
  });

  it('never gives less than is required, and more freedom never needs more material', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.integer({ min: 200, max: 3000 }), fc.double({ min: 0.1, max: 80, noNaN: true })), { minLength: 1, maxLength: 60 }), fc.integer({ min: 1, max: 12 }), (pairs, bands) => {
      const all = pairs.map(([t, a], i) => item(`m${i}`, t, a));
      const target = zoneTarget(all, { policy: 'bands', bands }, 'coating', supply);
      target.applied.forEach((a, i) => expect(a.thickness).toBeGreaterThanOrEqual(all[i]!.requiredThickness));
      const [own, banded, one] = target.policies.map((p) => p.volumeM3) as [number, number, number];
      expect(own).toBeLessThanOrEqual(banded * (1 + 1e-12));
      expect(banded).toBeLessThanOrEqual(one * (1 + 1e-12));
    }), { numRuns: 60 });
  });
});
