import { message } from '@mantlet/common';
import type { CriticalTemperatureBasis, DesignBasis } from '@mantlet/common';
import { citation, explain } from '../formula.js';
import type { WorkingStep } from '../formula.js';
import { utilisationFromAmbientFormula } from '../standards/en-1993-1-2/clause-2-4-2-reduction-factor.js';
import { criticalTemperatureFormula } from '../standards/en-1993-1-2/clause-4-2-4-critical-temperature.js';
import type { Loading, SectionClass } from '../standards/en-1993-1-1/table-5-2.js';
import { table31Source, temperatureOfKe, temperatureOfKy } from '../standards/en-1993-1-2/table-3-1.js';
import type { CriticalTemperature, CriticalTemperatureCase, Determined } from '../types.js';
import { loadingByType } from './critical-temperature-scope.js';

type UtilisationBasis = Extract<CriticalTemperatureBasis, { way: 'utilisation' | 'ambient-utilisation' }>;
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
function stabilityBound(mu0: number): { temperatureC: number; method: string; step: WorkingStep } {
  const temperatureC = Math.min(temperatureOfKy(mu0), temperatureOfKe(mu0));
  return {
    temperatureC, method: 'inversion of the smaller of k_y and k_E, safe where buckling may govern',
    step: {
      what: 'Critical temperature of a member that may buckle', equation: 'θ_cr: min(k_y,θ ; k_E,θ) = μ0', inputs: [{ symbol: 'μ0', value: mu0, unit: '' }],
      note: 'R_fi,d,θ ≥ min(k_y,θ ; k_E,θ)·R_fi,d,0 for every slenderness; the full calculation from actions gives as much or more',
      value: temperatureC, unit: '°C', source: `EN 1993-1-2:2005 4.2.3.2 with ${citation(table31Source)}`,
    },
  };
}

function byMethod(mu0: number, method: DesignBasis['utilisationMethod']): { temperatureC: number; method: string; step: () => WorkingStep } {
  if (method === 'equation-4.22') {
    return { temperatureC: criticalTemperatureFormula.evaluate({ utilisation: mu0 }), method: 'equation (4.22)', step: () => explain(criticalTemperatureFormula, { utilisation: mu0 }).step };
  }
  const temperatureC = temperatureOfKy(mu0);
  return {
    temperatureC, method: 'inversion of k_y',
    step: () => ({
      what: 'Critical temperature from the degree of utilisation', equation: 'θ_cr: k_y,θ = μ0', inputs: [{ symbol: 'μ0', value: mu0, unit: '' }],
      value: temperatureC, unit: '°C', source: citation(table31Source),
    }),
  };
}

/** Ways 2 and 3. Above 1 the member is under-strength cold; class 4 has the project's default (4.2.3.6) unless in tension. */
export function fromUtilisation(c: CriticalTemperatureCase, basis: UtilisationBasis, working: WorkingStep[] | null, classify: Classify): CriticalTemperature {
  const mu0 = degreeOfUtilisation(basis, c.design, working);
  const given = basis.way === 'ambient-utilisation' ? Math.max(basis.utilisation, mu0) : mu0;
  if (given > 1) {
    return {
      kind: 'under-strength', way: basis.way, governing: null, utilisation: given, limitStates: [],
      reason: message('assessment.under-strength-utilisation', { utilisation: given }),
    };
  }
  const loading = loadingByType(c.memberType, c.shape);
  const found = classify(loading);
  if (!found.ok) return { kind: 'not-determined', way: basis.way, reason: found.reason };
  const determined = (temperatureC: number, method: string): CriticalTemperature => ({
    kind: 'determined', temperatureC, bareTemperatureC: temperatureC, way: basis.way, method,
    governing: null, utilisation: mu0, limitStates: [], assumed: false,
  });
  if (loading === 'compression') {
    const bound = stabilityBound(mu0);
    working?.push(bound.step);
    if (found.value === 4 && c.design.class4TemperatureC < bound.temperatureC) return determined(c.design.class4TemperatureC, 'class 4 default');
    return determined(bound.temperatureC, bound.method);
  }
  const direct = byMethod(mu0, c.design.utilisationMethod);
  working?.push(direct.step());
  if (found.value === 4 && c.design.class4TemperatureC < direct.temperatureC) return determined(c.design.class4TemperatureC, 'class 4 default');
  return determined(direct.temperatureC, direct.method);
}
