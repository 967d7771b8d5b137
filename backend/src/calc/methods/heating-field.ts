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
/** nodes integrated at a time when looking for a temperature: 10 min */
const FILL_AHEAD = 200;
export const FIELD_HORIZON_MIN = 240;

/** marks of the search for a temperature, K apart */
const MARK_K = 10;
const MARKS = 140;
const NEVER = 0xffff;

/** The history of one k_sh·A_m/V, integrated only as far as anybody has asked. */
interface Row {
  rate: number;
  /** °C at each node; known up to and including `filled` */
  nodesC: Float64Array;
  filled: number;
  /** first node at or above each multiple of MARK_K; NEVER where none is filled yet */
  reached: Uint16Array;
  /** the next mark to be reached */
  mark: number;
}

class Field implements BareField {
  private readonly rows: (Row | undefined)[] = new Array<Row | undefined>(ROWS);
  private readonly nodes = Math.round(FIELD_HORIZON_MIN / NODE_MIN) + 1;
  private readonly curve: FireCurve;
  private readonly gas: GasHistory;
  private readonly convection: number;
  private readonly radiation: number;

  constructor(kind: NominalCurve, private readonly emissivity: number) {
    this.curve = { kind };
    this.gas = gasHistory(this.curve, STEP_S, FIELD_HORIZON_MIN);
    this.convection = convectionCoefficient(this.curve);
    this.radiation = FIRE_EMISSIVITY * emissivity * STEFAN_BOLTZMANN_W_PER_M2K4;
  }

  private row(index: number): Row {
    let row = this.rows[index];
    if (!row) {
      const rate = (LEAST * Math.exp(index * RATIO) * STEP_S) / STEEL_DENSITY_KG_PER_M3;
      row = { rate, nodesC: new Float64Array(this.nodes), filled: 0, reached: new Uint16Array(MARKS).fill(NEVER), mark: 0 };
      row.nodesC[0] = START_C;
      this.rows[index] = row;
    }
    return row;
  }

  private fill(row: Row, upTo: number): void {
    const { middleC, middle4 } = this.gas;
    const { rate, nodesC } = row;
    const { convection, radiation } = this;
    let steelC = nodesC[row.filled]!;
    if (row.filled === 0) for (; row.mark * MARK_K <= steelC; row.mark += 1) row.reached[row.mark] = 0;
    for (let node = row.filled + 1, i = row.filled * KEEP_EVERY; node <= upTo; node += 1) {
      for (let k = 0; k < KEEP_EVERY; k += 1, i += 1) {
        const kelvin = steelC + 273;
        const square = kelvin * kelvin;
        steelC += (rate * (convection * (middleC[i]! - steelC) + radiation * (middle4[i]! - square * square))) / steelSpecificHeat(steelC);
      }
      nodesC[node] = steelC;
      for (; row.mark * MARK_K <= steelC; row.mark += 1) row.reached[row.mark] = node;
    }
    row.filled = Math.max(row.filled, upTo);
  }

  /** position of k_sh·A_m/V among the rows; null outside them */
  private position(sectionFactorPerM: number, shadowFactor: number): number | null {
    const factor = shadowFactor * Math.max(sectionFactorPerM, LEAST_SECTION_FACTOR_PER_M);
    return factor < LEAST || factor >= GREATEST ? null : Math.log(factor / LEAST) / RATIO;
  }

  temperatureC(sectionFactorPerM: number, shadowFactor: number, minutes: number): number {
    const place = minutes <= FIELD_HORIZON_MIN ? this.position(sectionFactorPerM, shadowFactor) : null;
    if (place === null) return unprotectedTemperature({ sectionFactorPerM, shadowFactor, curve: this.curve, emissivity: this.emissivity, minutes, stepS: STEP_S });
    const index = Math.min(Math.floor(place), ROWS - 2);
    const low = this.row(index);
    const high = this.row(index + 1);
    const when = minutes / NODE_MIN;
    const node = Math.min(Math.floor(when + 1e-9), this.nodes - 2);
    if (low.filled <= node) this.fill(low, node + 1);
    if (high.filled <= node) this.fill(high, node + 1);
    const before = between(low, high, node, place - index);
    return before + (between(low, high, node + 1, place - index) - before) * (when - node);
  }

  minutesTo(sectionFactorPerM: number, shadowFactor: number, targetC: number): number | null {
    if (targetC <= START_C) return 0;
    const place = this.position(sectionFactorPerM, shadowFactor);
    if (place === null) return bareMinutes({ sectionFactorPerM, shadowFactor, curve: this.curve, emissivity: this.emissivity, targetC, stepS: STEP_S });
    const index = Math.min(Math.floor(place), ROWS - 2);
    const low = this.row(index);
    const high = this.row(index + 1);
    const share = place - index;
    let until = Math.min(low.filled, high.filled);
    while (until < this.nodes - 1 && between(low, high, until, share) < targetC) {
      until = Math.min(until + FILL_AHEAD, this.nodes - 1);
      if (low.filled < until) this.fill(low, until);
      if (high.filled < until) this.fill(high, until);
    }
    if (between(low, high, until, share) < targetC) return null;
    // the hotter row has passed the mark below before both together do, and the cooler one passes the mark above after them
    const mark = Math.floor(targetC / MARK_K);
    let from = Math.max(high.reached[mark]! - 1, 0);
    until = Math.min(until, low.reached[mark + 1]!);
    while (until - from > 1) {
      const middle = (from + until) >> 1;
      if (between(low, high, middle, share) < targetC) from = middle;
      else until = middle;
    }
    const before = between(low, high, from, share);
    return (from + (targetC - before) / (between(low, high, until, share) - before)) * NODE_MIN;
  }
}

function between(low: Row, high: Row, node: number, share: number): number {
  const a = low.nodesC[node]!;
  return a + (high.nodesC[node]! - a) * share;
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
