import type { ProductKind, ThermalProperties } from '@mantlet/common';

/** A thickness that can be bought or applied, and the layers that make it up (boards). */
export interface Stack {
  thicknessMm: number;
  layers: number[] | null;
}

const stacksByProperties = new WeakMap<ThermalProperties, readonly Stack[]>();

/** Totals agree when they differ by less than a thousandth of a millimetre. */
const key = (mm: number): number => Math.round(mm * 1000);

/** All stacks of up to maxLayers stocked boards within the tested range; for one total the fewest layers, thickest first. */
function boardStacks(p: ThermalProperties): Stack[] {
  const stock = [...new Set(p.stockThicknessesMm)].sort((a, b) => b - a);
  const found = new Map<number, Stack>();
  let layersBefore: number[][] = [[]];
  for (let n = 1; n <= p.maxLayers; n += 1) {
    const next: number[][] = [];
    for (const layers of layersBefore) {
      for (const board of stock) {
        const last = layers[layers.length - 1];
        if (last !== undefined && board > last) continue;
        const stack = [...layers, board];
        const total = stack.reduce((a, b) => a + b, 0);
        if (total > p.maxThicknessMm + 1e-9) continue;
        next.push(stack);
        if (total >= p.minThicknessMm - 1e-9 && !found.has(key(total))) found.set(key(total), { thicknessMm: total, layers: stack });
      }
    }
    layersBefore = next;
  }
  return [...found.values()].sort((a, b) => a.thicknessMm - b.thicknessMm);
}

function sprayThicknesses(p: ThermalProperties): Stack[] {
  const first = Math.ceil(p.minThicknessMm / p.thicknessStepMm - 1e-9);
  const last = Math.floor(p.maxThicknessMm / p.thicknessStepMm + 1e-9);
  const count = Math.max(0, last - first + 1);
  return Array.from({ length: count }, (_, i) => ({ thicknessMm: Number(((first + i) * p.thicknessStepMm).toFixed(6)), layers: null }));
}

/** Thicknesses a product comes in, rising: stacks of stocked boards, or steps of a spray. A board without a stock list steps like a spray. */
export function stacksOf(p: ThermalProperties, kind: ProductKind): readonly Stack[] {
  let stacks = stacksByProperties.get(p);
  if (!stacks) {
    stacks = p.stockThicknessesMm.length > 0 ? boardStacks(p) : sprayThicknesses(p);
    if (kind === 'board') stacks = stacks.map((s) => ({ ...s, layers: s.layers ?? [s.thicknessMm] }));
    stacksByProperties.set(p, stacks);
  }
  return stacks;
}
