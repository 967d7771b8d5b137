import type { FireCurve, ThermalProperties } from '@mantlet/common';
import { GREATEST_PROTECTED_STEP_S } from '../standards/en-1993-1-2/clause-4-2-5-2-protected.js';
import type { Stack } from '../standards/en-13381/stacks.js';
import { gasHistory } from './heating-gas.js';
import type { GasHistory } from './heating-gas.js';
import { START_C, conductivityLines, constantsOf, heldShare, riseOf } from './thermal-run.js';

/**
 * Under one nominal curve the temperature of steel behind a given thickness of one material depends on A_p/V and time alone, and
 * rises smoothly with A_p/V. The field runs (4.27) for a close geometric series of A_p/V, keeps the temperature at every 15 minutes,
 * and reads between. Each run is made when first needed. Thousands of members, some thousands of runs at most, none twice.
 */
export interface ThermalField {
  /**
   * Index of the least thickness that holds limitC; stacks.length where none does. `certain` only where the reading leaves no doubt
   * about it and its thinner neighbour; otherwise it is where to begin looking. Null outside the field.
   */
  leastThatHolds: (sectionFactorPerM: number, periodMin: number, limitC: number) => { index: number; certain: boolean } | null;
  /** °C behind one of the stacks at the end of the period, and how far it may be out, for 150 to 730 °C; null outside the field */
  temperature: (sectionFactorPerM: number, periodMin: number, index: number) => { temperatureC: number; doubtK: number } | null;
}

const STEP_S = GREATEST_PROTECTED_STEP_S;
const SLOT_MIN = 15;
const SLOT_STEPS = (SLOT_MIN * 60) / STEP_S;
const SLOTS = 240 / SLOT_MIN;
/** ln of the ratio between neighbours in the series */
const SPACING = 0.055;
/** A stock of more thicknesses than this is searched by running: its field would outgrow its use. */
const MOST_STACKS = 500;
const LEAST_PER_M = 5;
const GREATEST_PER_M = 2000;
/**
 * Doubt of every reading, K. Beside it counts twice what the cubic through four neighbours bends away from the straight line through
 * two: much where the specific heat begins to peak and where moisture holds the steel. The spec holds the error below the sum.
 */
const LEAST_DOUBT_K = 1;
/** Limits near the dwell at 100 °C and above the peak of the specific heat at 735 °C are left to the member's own runs. */
const LEAST_LIMIT_C = 150;
const GREATEST_LIMIT_C = 730;
/** The smooth curves. Under the others the steel follows every kink of the gas, closer set than any series of A_p/V. */
const smooth: readonly FireCurve['kind'][] = ['standard', 'external', 'hydrocarbon'];

class Field implements ThermalField {
  private readonly nodes: number;
  private readonly first: number;
  /** by slot of 15 min: °C of [stack × nodes]; NaN where not yet run */
  private readonly steelC: (Float64Array | undefined)[] = new Array<Float64Array | undefined>(SLOTS + 1);
  /** where each run stands: slots done and, at their end, the water left in steps of dwell; NaN before the first */
  private readonly done: Uint8Array;
  private readonly dwell: Float64Array;
  private readonly gas: GasHistory;
  /** of the last reading, so that none needs an object */
  private doubtK = 0;

  constructor(private readonly properties: ThermalProperties, private readonly stacks: readonly Stack[], curve: FireCurve) {
    this.gas = gasHistory(curve, STEP_S, SLOTS * SLOT_MIN);
    const least = Math.max(properties.minSectionFactorPerM, LEAST_PER_M);
    // one node more on either side, so that every reading has two neighbours each way
    this.first = Math.log(least) - SPACING;
    this.nodes = Math.max(Math.ceil((Math.log(Math.min(properties.maxSectionFactorPerM, GREATEST_PER_M)) - this.first) / SPACING), 2) + 2;
    this.done = new Uint8Array(stacks.length * this.nodes);
    this.dwell = new Float64Array(stacks.length * this.nodes);
  }

  private slotOf(slot: number): Float64Array {
    return (this.steelC[slot] ??= new Float64Array(this.stacks.length * this.nodes).fill(NaN));
  }

  /** Carries one run on to the end of a slot, by the arithmetic of `thermalRuns`. */
  private run(stack: number, node: number, upToSlot: number): void {
    const at = stack * this.nodes + node;
    const { middleC, nodesC } = this.gas;
    const c = constantsOf(this.properties, Math.exp(this.first + node * SPACING), this.stacks[stack]!.thicknessMm);
    const { edges, intercepts, slopes } = conductivityLines(this.properties);
    let slot = this.done[at]!;
    let steelC = slot === 0 ? START_C : this.slotOf(slot)[at]!;
    let dwellSteps = slot === 0 ? c.dwellSteps : this.dwell[at]!;
    let line = 0;
    let i = slot * SLOT_STEPS;
    while (slot < upToSlot) {
      slot += 1;
      for (const end = slot * SLOT_STEPS; i < end; i += 1) {
        const gasC = middleC[i]!;
        const meanC = (gasC + steelC) / 2;
        while (line < edges.length && edges[line]! < meanC) line += 1;
        const lambda = intercepts[line]! + slopes[line]! * meanC;
        const rise = riseOf(gasC, nodesC[i + 1]! - nodesC[i]!, steelC, c.flow * lambda, c.third, c.tenth);
        const held = heldShare(dwellSteps, steelC, rise);
        dwellSteps -= held;
        steelC += rise * (1 - held);
      }
      this.slotOf(slot)[at] = steelC;
    }
    this.done[at] = slot;
    this.dwell[at] = dwellSteps;
  }

  /** °C behind one thickness: the cubic through the two nodes on either side; leaves its doubt in doubtK. */
  private read(stack: number, slot: number, node: number, share: number): number {
    const before = stack * this.nodes + node - 1;
    for (let k = 0; k < 4; k += 1) if (this.done[before + k]! < slot) this.run(stack, node - 1 + k, slot);
    const steelC = this.steelC[slot]!;
    const b = steelC[before + 1]!;
    const c = steelC[before + 2]!;
    const straight = b + (c - b) * share;
    const left = steelC[before]! - 2 * b + c;
    const right = b - 2 * c + steelC[before + 3]!;
    const bend = ((share * (1 - share)) / 6) * ((2 - share) * left + (1 + share) * right);
    this.doubtK = LEAST_DOUBT_K + 2 * Math.abs(bend);
    return straight - bend;
  }

  /** position of A_p/V in the series */
  private place(sectionFactorPerM: number): number {
    return (Math.log(sectionFactorPerM) - this.first) / SPACING;
  }

  private covers(node: number, slot: number): boolean {
    return node >= 1 && node <= this.nodes - 3 && slot >= 1 && slot <= SLOTS && Number.isInteger(slot);
  }

  temperature(sectionFactorPerM: number, periodMin: number, index: number): { temperatureC: number; doubtK: number } | null {
    const place = this.place(sectionFactorPerM);
    const node = Math.floor(place);
    const slot = periodMin / SLOT_MIN;
    return this.covers(node, slot) ? { temperatureC: this.read(index, slot, node, place - node), doubtK: this.doubtK } : null;
  }

  leastThatHolds(sectionFactorPerM: number, periodMin: number, limitC: number): { index: number; certain: boolean } | null {
    const place = this.place(sectionFactorPerM);
    const node = Math.floor(place);
    const slot = periodMin / SLOT_MIN;
    if (!this.covers(node, slot)) return null;
    const share = place - node;
    let low = 0;
    let high = this.stacks.length;
    const readable = limitC >= LEAST_LIMIT_C && limitC <= GREATEST_LIMIT_C;
    let holdsSurely = readable;
    let failsSurely = readable;
    while (low < high) {
      const middle = (low + high) >> 1;
      const over = this.read(middle, slot, node, share) - limitC;
      const sure = readable && Math.abs(over) > this.doubtK;
      if (over > 0) {
        low = middle + 1;
        failsSurely = sure;
      } else {
        high = middle;
        holdsSurely = sure;
      }
    }
    return { index: low, certain: holdsSurely && failsSurely };
  }
}

const fields = new WeakMap<ThermalProperties, Map<FireCurve['kind'], ThermalField>>();

/**
 * The field of a material under a curve; null where the curve is not smooth, or the material comes in too many thicknesses.
 * `stacks` must be those of `properties`. Kept as long as the properties are: the same inputs always give the same field.
 */
export function thermalField(properties: ThermalProperties, stacks: readonly Stack[], curve: FireCurve): ThermalField | null {
  if (!smooth.includes(curve.kind) || stacks.length > MOST_STACKS) return null;
  let byCurve = fields.get(properties);
  if (!byCurve) fields.set(properties, (byCurve = new Map()));
  let field = byCurve.get(curve.kind);
  if (!field) byCurve.set(curve.kind, (field = new Field(properties, stacks, curve)));
  return field;
}
