import { message } from '@mantlet/common';
import type { MemberDesign } from '@mantlet/common';
import type { WorkingStep } from '../formula.js';
import { explainedClass, sectionClass } from '../standards/en-1993-1-2/clause-4-2-2-classification.js';
import type { Loading, SectionClass } from '../standards/en-1993-1-1/table-5-2.js';
import type { CriticalTemperature, CriticalTemperatureCase, Determined, LimitStateResult } from '../types.js';
import { RESISTANCE_CURVE_ENDS_C } from './critical-temperature-limit-states.js';
import type { LimitState } from './critical-temperature-limit-states.js';
import { loadingByType } from './critical-temperature-scope.js';
import { governingStates } from './critical-temperature-states.js';
import { fromUtilisation } from './critical-temperature-utilisation.js';

/** Collects the working; null in the fast path. */
type Working = WorkingStep[] | null;
const scale = { kN: 1e3, kNm: 1e6, '': 1 } as const;

/**
 * The critical temperature of a member by whichever of the five ways it was given, or the reason why there is none.
 * Never throws on a member's data; temperatures in °C; `bareTemperatureC` uses κ1 of an unprotected beam.
 * Sources: EN 1993-1-2 4.2.2 to 4.2.4; each working step cites its clause.
 */
export function criticalTemperature(c: CriticalTemperatureCase): CriticalTemperature {
  return solve(c, null);
}

/** The same, with the working, clause by clause, numbers substituted. */
export function explainCriticalTemperature(c: CriticalTemperatureCase): { result: CriticalTemperature; working: WorkingStep[] } {
  const working: WorkingStep[] = [];
  return { result: solve(c, working), working };
}

function solve(c: CriticalTemperatureCase, working: Working): CriticalTemperature {
  const { basis } = c;
  switch (basis.way) {
    case 'none': return { kind: 'not-determined', way: 'none', reason: message('assessment.no-basis', {}) };
    case 'declared': return plain(c, basis.temperatureC, 'declared', false);
    case 'assumed': return assumed(c, working);
    case 'utilisation':
    case 'ambient-utilisation': return fromUtilisation(c, basis, working, (loading) => classified(c, loading, working));
    case 'calculated': return calculated(c, basis.design, working);
  }
}

function plain(c: CriticalTemperatureCase, temperatureC: number, method: string, isAssumed: boolean): CriticalTemperature {
  return {
    kind: 'determined', temperatureC, bareTemperatureC: temperatureC, way: c.basis.way, method,
    governing: null, utilisation: null, limitStates: [], assumed: isAssumed,
  };
}

/** The class for the loading, with its working; null loading (tension) has no class. */
function classified(c: CriticalTemperatureCase, loading: Loading | null, working: Working): Determined<SectionClass | null> {
  if (loading === null) return { ok: true, value: null };
  const found = sectionClass(c.shape, loading, c.steel.yieldStrengthMPa);
  if (found.ok) working?.push(...explainedClass(c.steel.yieldStrengthMPa, found.value, loading));
  return found;
}

/** The default of the member's type, or the class 4 default where the section is class 4 and that is lower. */
function assumed(c: CriticalTemperatureCase, working: Working): CriticalTemperature {
  const byType = c.design.assumedTemperatureC[c.memberType];
  const found = classified(c, loadingByType(c.memberType, c.shape), working);
  // a shape without a class keeps the default of its type: it is an assumption for somebody to accept either way
  if (found.ok && found.value === 4 && c.design.class4TemperatureC < byType) return plain(c, c.design.class4TemperatureC, 'class 4 default', !c.accepted);
  return plain(c, byType, 'assumed by member type', !c.accepted);
}

function resultOf(state: LimitState): LimitStateResult {
  const per = scale[state.unit];
  const cold = state.resistance(20, false);
  const utilisation = state.effect / cold;
  return {
    name: state.name, clause: `EN 1993-1-2 ${state.clause}`, effect: state.effect / per, resistanceCold: cold / per, unit: state.unit, utilisation,
    temperatureC: utilisation > 1 ? 20 : state.temperature(false),
  };
}

function calculated(c: CriticalTemperatureCase, design: MemberDesign, working: Working): CriticalTemperature {
  const way = 'calculated';
  const loaded = governingStates(c, design, working);
  if (!loaded.ok) return { kind: 'not-determined', way, reason: loaded.reason };
  const { states, class4 } = loaded.value;
  const limitStates = states.map(resultOf);
  const worst = limitStates.reduce((a, b) => (b.utilisation > a.utilisation ? b : a));
  if (worst.utilisation > 1) {
    if (working) explainCold(states, limitStates, working);
    const reason = worst.unit === ''
      ? message('assessment.under-strength-together', { state: worst.name, utilisation: worst.utilisation })
      : message('assessment.under-strength', { state: worst.name, effect: worst.effect, resistance: worst.resistanceCold, unit: worst.unit, utilisation: worst.utilisation });
    return { kind: 'under-strength', governing: worst.name, utilisation: worst.utilisation, limitStates, reason, way };
  }
  const lowest = limitStates.reduce((a, b) => (b.temperatureC < a.temperatureC ? b : a));
  // only bending knows κ1, so only it differs for bare steel
  const bare = states.reduce((least, s, i) => Math.min(least, s.name === 'bending' ? s.temperature(true) : limitStates[i]!.temperatureC), Infinity);
  if (working) explainStates(states, limitStates, working);
  const cap = class4 ? c.design.class4TemperatureC : Infinity;
  const capped = cap < lowest.temperatureC;
  return {
    kind: 'determined', temperatureC: Math.min(lowest.temperatureC, cap), bareTemperatureC: Math.min(bare, cap), way,
    method: capped ? 'class 4 default' : 'limit states of EN 1993-1-2',
    governing: capped ? null : lowest.name, utilisation: capped ? null : lowest.utilisation, limitStates: capped ? [] : limitStates, assumed: false,
  };
}

function explainAt(state: LimitState, temperatureC: number, where: string, working: WorkingStep[]): void {
  const own: WorkingStep[] = [];
  state.explainAt(temperatureC, own);
  working.push(...own.map((step) => ({ ...step, what: `${step.what}, ${where}` })));
}

/** A member that fails cold: each resistance at 20 °C and how far the effect goes beyond it. */
function explainCold(states: LimitState[], results: LimitStateResult[], working: WorkingStep[]): void {
  states.forEach((state, i) => {
    const { effect, resistanceCold, utilisation, unit, name } = results[i]!;
    state.explainFirst?.(working);
    explainAt(state, 20, 'at 20 °C', working);
    const together = unit === '';
    working.push({
      what: `Degree of utilisation in ${name}`, equation: together ? 'μ_0 = 1/f, with f times every effect just carried' : 'μ_0 = E_fi,d/R_fi,d,0',
      inputs: together ? [{ symbol: 'f', value: resistanceCold, unit }] : [{ symbol: 'E_fi,d', value: effect, unit }, { symbol: 'R_fi,d,0', value: resistanceCold, unit }],
      value: utilisation, unit: '', source: `EN 1993-1-2:2005 4.2.4(3) with ${state.clause}`, ...(utilisation > 1 ? { note: 'above 1: fails before any fire' } : {}),
    });
  });
}

/** Per limit state: its resistance cold and at its own critical temperature, where it equals the effect. */
function explainStates(states: LimitState[], results: LimitStateResult[], working: WorkingStep[]): void {
  states.forEach((state, i) => {
    const result = results[i]!;
    state.explainFirst?.(working);
    explainAt(state, 20, 'at 20 °C', working);
    explainAt(state, result.temperatureC, 'at its critical temperature', working);
    const together = result.unit === '';
    working.push({
      what: `Critical temperature in ${state.name}`, equation: together ? 'highest θ with U ≤ 1' : 'highest θ with E_fi,d ≤ R_fi,d,θ',
      inputs: together ? [] : [{ symbol: 'E_fi,d', value: result.effect, unit: result.unit }], value: result.temperatureC, unit: '°C', source: `EN 1993-1-2:2005 4.2.4(1) with ${state.clause}`,
    });
  });
}

export interface ResistanceCurve {
  limitState: LimitStateResult['name'];
  unit: LimitStateResult['unit'];
  effect: number;
  /** with κ1 of a protected member */
  points: { temperatureC: number; resistance: number }[];
}

/** Resistance against temperature for the member's drawing; empty unless it is calculated from actions. */
export function resistanceCurve(c: CriticalTemperatureCase, everyK = 20): ResistanceCurve[] {
  if (c.basis.way !== 'calculated') return [];
  const loaded = governingStates(c, c.basis.design, null);
  if (!loaded.ok) return [];
  return loaded.value.states.map((state) => {
    const points: ResistanceCurve['points'] = [];
    for (let temperatureC = 20; temperatureC <= RESISTANCE_CURVE_ENDS_C; temperatureC += everyK) {
      points.push({ temperatureC, resistance: state.resistance(temperatureC, false) / scale[state.unit] });
    }
    return { limitState: state.name, unit: state.unit, effect: state.effect / scale[state.unit], points };
  });
}
