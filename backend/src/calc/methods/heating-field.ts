import type { FireCurve, NominalCurve } from '@mantlet/common';
import { convectionCoefficient } from '../standards/gas-temperature.js';
import { FIRE_EMISSIVITY, STEFAN_BOLTZMANN_W_PER_M2K4 } from '../standards/en-1991-1-2/clause-3-1-net-heat-flux.js';
import { LEAST_SECTION_FACTOR_PER_M } from '../standards/en-1993-1-2/clause-4-2-5-1-unprotected.js';
import { STEEL_DENSITY_KG_PER_M3, steelSpecificHeat } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { START_C, bareMinutes, unprotectedTemperature } from './heating.js';
import { gasHistory } from './heating-gas.js';
import type { GasHistory } from './heating-gas.js';

/**
 * Under one nominal curve and emissivity the history of bare steel depends on k_sh·A_m/V alone. The field holds that
 * history for a fine geometric series of k_sh·A_m/V, integrated by (4.25) at 1 s, and reads between its rows and times
 * linearly: within 0.5 K of integrating the member itself at 1 s (held by its spec). Thousands of members, one integration.
 */
export interface BareField {
  /** °C after `minutes` ≤ horizon; sectionFactorPerM and shadowFactor as in UnprotectedHeating */
  temperatureC: (sectionFactorPerM: number, shadowFactor: number, minutes: number) => number;
  /** minutes until targetC; null where it is not reached within the horizon */
  minutesTo: (sectionFactorPerM: number, shadowFactor: number, targetC: number) => number | null;
}

const LEAST = 3;
const GREATEST = 1500;
const ROWS = 440;
const RATIO = Math.log(GREATEST / LEAST) / (ROWS - 1);
const STEP_S = 1;
const KEEP_EVERY = 3;
const NODE_MIN = (STEP_S * KEEP_EVERY) / 60;
export const FIELD_HORIZON_MIN = 240;

function fillRow(row: Float32Array, factor: number, gas: GasHistory, convection: number, radiation: number): void {
  const rate = (factor * STEP_S) / STEEL_DENSITY_KG_PER_M3;
  let steelC = START_C;
  row[0] = steelC;
  for (let node = 1, i = 0; node < row.length; node += 1) {
    for (let k = 0; k < KEEP_EVERY; k += 1, i += 1) {
      const kelvin = steelC + 273;
      const square = kelvin * kelvin;
      const flux = convection * (gas.middleC[i]! - steelC) + radiation * (gas.middle4[i]! - square * square);
      steelC += (rate * flux) / steelSpecificHeat(steelC);
    }
    row[node] = steelC;
  }
}

class Field implements BareField {
  private readonly rows: (Float32Array | undefined)[] = new Array<Float32Array | undefined>(ROWS);
  private readonly nodes = Math.round(FIELD_HORIZON_MIN / NODE_MIN) + 1;
  private readonly curve: FireCurve;
  private readonly gas: GasHistory;

  constructor(kind: NominalCurve, private readonly emissivity: number) {
    this.curve = { kind };
    this.gas = gasHistory(this.curve, STEP_S, FIELD_HORIZON_MIN);
  }

  /** integrated when first asked for: a few members under a rare curve do not pay for the whole field */
  private row(index: number): Float32Array {
    let row = this.rows[index];
    if (!row) {
      row = new Float32Array(this.nodes);
      const radiation = FIRE_EMISSIVITY * this.emissivity * STEFAN_BOLTZMANN_W_PER_M2K4;
      fillRow(row, LEAST * Math.exp(index * RATIO), this.gas, convectionCoefficient(this.curve), radiation);
      this.rows[index] = row;
    }
    return row;
  }

  /** the two rows about k_sh·A_m/V and the share of the second; null outside the series */
  private between(sectionFactorPerM: number, shadowFactor: number): { low: Float32Array; high: Float32Array; share: number } | null {
    const factor = shadowFactor * Math.max(sectionFactorPerM, LEAST_SECTION_FACTOR_PER_M);
    if (factor < LEAST || factor >= GREATEST) return null;
    const position = Math.log(factor / LEAST) / RATIO;
    const index = Math.min(Math.floor(position), ROWS - 2);
    return { low: this.row(index), high: this.row(index + 1), share: position - index };
  }

  temperatureC(sectionFactorPerM: number, shadowFactor: number, minutes: number): number {
    const b = minutes <= FIELD_HORIZON_MIN ? this.between(sectionFactorPerM, shadowFactor) : null;
    if (!b) return unprotectedTemperature({ sectionFactorPerM, shadowFactor, curve: this.curve, emissivity: this.emissivity, minutes, stepS: STEP_S });
    const position = minutes / NODE_MIN;
    const node = Math.min(Math.floor(position + 1e-9), this.nodes - 2);
    const at = (n: number) => b.low[n]! + (b.high[n]! - b.low[n]!) * b.share;
    const before = at(node);
    return before + (at(node + 1) - before) * (position - node);
  }

  minutesTo(sectionFactorPerM: number, shadowFactor: number, targetC: number): number | null {
    if (targetC <= START_C) return 0;
    const b = this.between(sectionFactorPerM, shadowFactor);
    if (!b) return bareMinutes({ sectionFactorPerM, shadowFactor, curve: this.curve, emissivity: this.emissivity, targetC, stepS: STEP_S });
    const at = (n: number) => b.low[n]! + (b.high[n]! - b.low[n]!) * b.share;
    let low = 0;
    let high = this.nodes - 1;
    if (at(high) < targetC) return null;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (at(middle) < targetC) low = middle;
      else high = middle;
    }
    const before = at(low);
    return (low + (targetC - before) / (at(high) - before)) * NODE_MIN;
  }
}

const MAX_KEPT = 8;
const kept = new Map<string, BareField>();

/** The field of a nominal curve and emissivity; kept, since the same inputs always give the same field. */
export function bareField(kind: NominalCurve, emissivity: number): BareField {
  const key = `${kind}|${emissivity}`;
  const found = kept.get(key);
  if (found) return found;
  if (kept.size >= MAX_KEPT) kept.delete(kept.keys().next().value as string);
  const made = new Field(kind, emissivity);
  kept.set(key, made);
  return made;
}
