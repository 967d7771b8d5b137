import { message } from '@mantlet/common';
import type { CriticalTemperatureBasis, DesignBasis } from '@mantlet/common';
import { citation, explain } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import { utilisationFromAmbientFormula } from '../standards/en-1993-1-2/clause-2-4-2-reduction-factor.js';
import { LEAST_UTILISATION, criticalTemperatureFormula } from '../standards/en-1993-1-2/clause-4-2-4-critical-temperature.js';
import type { Loading, SectionClass } from '../standards/en-1993-1-1/table-5-2.js';
import { kE, kY, table31Source, temperatureOfKe, temperatureOfKy } from '../standards/en-1993-1-2/table-3-1.js';
import type { CriticalTemperature, CriticalTemperatureCase, Determined } from '../types.js';
import { bendingColdShare, bucklingColdShare } from './cold-resistance.js';
import { loadingByType } from './critical-temperature-scope.js';

type UtilisationBasis = Extract<CriticalTemperatureBasis, { way: 'utilisation' | 'ambient-utilisation' }>;
/** A temperature, how it was read, and the line of working. */
interface Reading {
  temperatureC: number;
  method: string;
  step: () => WorkingStep;
}
/** How a temperature was read from μ0, as the result names it. */
const methods = { equation: 'equation (4.22)', strength: 'inversion of k_y', stability: 'inversion of the smaller of k_y and k_E, safe where buckling may govern' } as const;
type Classify = (loading: Loading | null) => Determined<SectionClass | null>;

/** μ0, from what was given. */
function degreeOfUtilisation(basis: UtilisationBasis, design: DesignBasis, working: WorkingStep[] | null): number {
  if (basis.way === 'utilisation') return basis.mu0;
  const input = { etaFi: basis.etaFi ?? design.etaFi, ambientUtilisation: basis.utilisation, gammaMFi: design.gammaMFi };
  if (working) working.push(explain(utilisationFromAmbientFormula, input).step);
  return utilisationFromAmbientFormula.evaluate(input);
}

/**
 * Where buckling may govern, (4.22) does not apply. R is homogeneous of degree 1 in (k_y, k_E) and rises with both, so
 * R(θ) ≥ min(k_y,θ ; k_E,θ)·R(20 °C) whatever the slenderness: the temperature at which the smaller is μ0 is on the safe side.
 */
function stabilityBound(mu0: number): Reading {
  const temperatureC = Math.min(temperatureOfKy(mu0), temperatureOfKe(mu0));
  return {
    temperatureC, method: methods.stability,
    step: () => ({
      what: 'Critical temperature of a member that may buckle', equation: 'θ_cr: min(k_y,θ ; k_E,θ) = μ0', inputs: [{ symbol: 'μ0', value: mu0, unit: '' }],
      note: 'R_fi,d,θ ≥ min(k_y,θ ; k_E,θ)·R_fi,d,0 for every slenderness; the full calculation from actions gives as much or more',
      value: temperatureC, unit: '°C', source: `EN 1993-1-2:2005 4.2.3.2 with ${citation(table31Source)}`,
    }),
  };
}

const heldNote = 'for a member that is held against buckling, and whose deflection does not govern';

function byMethod(mu0: number, method: DesignBasis['utilisationMethod']): Reading {
  if (method === 'equation-4.22') {
    return { temperatureC: criticalTemperatureFormula.evaluate({ utilisation: mu0 }), method: methods.equation, step: () => ({ ...explain(criticalTemperatureFormula, { utilisation: mu0 }).step, note: heldNote }) };
  }
  const temperatureC = temperatureOfKy(mu0);
  return {
    temperatureC, method: methods.strength,
    step: () => ({
      what: 'Critical temperature from the degree of utilisation', equation: 'θ_cr: k_y,θ = μ0', inputs: [{ symbol: 'μ0', value: mu0, unit: '' }],
      note: heldNote, value: temperatureC, unit: '°C', source: citation(table31Source),
    }),
  };
}

/**
 * μ0 against the resistance by the fire rules at 20 °C. A utilisation in fire already is; one of the cold design rests on the
 * resistance of EN 1993-1-1, which is the greater where buckling or the class of the section differ.
 */
function againstFireResistance(
  c: CriticalTemperatureCase, basis: UtilisationBasis, mu0: number, loading: Loading | null, found: SectionClass | null, working: WorkingStep[] | null,
): number {
  if (basis.way === 'utilisation' || loading === null) return mu0;
  const cold = loading === 'compression' ? bucklingColdShare(c) : bendingColdShare(c, found);
  if (!cold) return mu0;
  const value = mu0 / cold.share;
  working?.push(cold.step, {
    what: 'Degree of utilisation against the resistance in fire', equation: 'μ0 = η_fi·(E_d/R_d)/(R_fi,d,0/R_d)',
    inputs: [{ symbol: 'η_fi·(E_d/R_d)', value: mu0, unit: '' }, { symbol: 'R_fi,d,0/R_d', value: cold.share, unit: '' }],
    value, unit: '', source: 'EN 1993-1-2:2005 4.2.4 (4.24)',
  });
  return value;
}

const mayBuckle = (basis: UtilisationBasis, loading: Loading | null): boolean => loading === 'compression' || (loading === 'bending' && basis.mayBuckle === true);

/**
 * Ways 2 and 3. Above 1 the member is under-strength cold; class 4 has the project's default (4.2.3.6) unless in tension. A beam is
 * taken as held laterally unless it is said that it may buckle.
 */
export function fromUtilisation(c: CriticalTemperatureCase, basis: UtilisationBasis, working: WorkingStep[] | null, classify: Classify): CriticalTemperature {
  const given = degreeOfUtilisation(basis, c.design, working);
  const greatest = basis.way === 'ambient-utilisation' ? Math.max(basis.utilisation, given) : given;
  if (greatest > 1) {
    return {
      kind: 'under-strength', way: basis.way, governing: null, utilisation: greatest, limitStates: [],
      reason: message('assessment.under-strength-utilisation', { utilisation: greatest }),
    };
  }
  const loading = loadingByType(c.memberType, c.shape);
  const found = classify(loading);
  if (!found.ok) return { kind: 'not-determined', way: basis.way, reason: found.reason };
  if (loading === 'bending' && basis.way === 'ambient-utilisation' && basis.mayBuckle === true) {
    return { kind: 'not-determined', way: basis.way, reason: message('assessment.cold-utilisation-buckling', {}) };
  }
  const mu0 = againstFireResistance(c, basis, given, loading, found.value, working);
  if (mu0 > 1) {
    return { kind: 'not-determined', way: basis.way, reason: message('assessment.cold-utilisation-too-high', { utilisation: given, share: given / mu0 }) };
  }
  const read = mayBuckle(basis, loading) ? stabilityBound(mu0) : byMethod(mu0, c.design.utilisationMethod);
  working?.push(read.step());
  const capped = found.value === 4 && c.design.class4TemperatureC < read.temperatureC;
  const temperatureC = capped ? c.design.class4TemperatureC : read.temperatureC;
  return {
    kind: 'determined', temperatureC, bareTemperatureC: temperatureC, way: basis.way, method: capped ? 'class 4 default' : read.method,
    governing: null, utilisation: mu0, limitStates: [], assumed: false,
  };
}

const everyK = 20;
const tabulated = (share: (temperatureC: number) => number): [number, number][] =>
  Array.from({ length: (1200 - 20) / everyK + 1 }, (_, i) => [20 + i * everyK, share(20 + i * everyK)]);

/**
 * The relation μ0 was read from, as pairs of steel temperature and utilisation, for the drawing of the member; null where the
 * temperature came about otherwise (declared, calculated, capped for class 4). (4.22) is drawn over the utilisations it is made for.
 */
export function utilisationCurve(method: string | null): [number, number][] | null {
  switch (method) {
    case methods.equation: {
      const steps = 60;
      return Array.from({ length: steps + 1 }, (_, i) => 1 - ((1 - LEAST_UTILISATION) * i) / steps)
        .map((utilisation) => [criticalTemperatureFormula.evaluate({ utilisation }), utilisation]);
    }
    case methods.strength: return tabulated(kY);
    case methods.stability: return tabulated((t) => Math.min(kY(t), kE(t)));
    default: return null;
  }
}
