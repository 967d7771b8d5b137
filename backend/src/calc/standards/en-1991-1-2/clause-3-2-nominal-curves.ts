import { defineFormula } from '../../formula.js';
import type { Formula } from '../../formula.js';

interface TimeInput {
  minutes: number;
}
const gas = { symbol: 'θ_g', meaning: 'gas temperature', unit: '°C' };
const time = { minutes: { symbol: 't', meaning: 'time from ignition', unit: 'min' } };

/** EN 1991-1-2 3.2.1 (3.4), the standard time-temperature curve; the same as ISO 834. α_c = 25 W/m²K. */
export const standardCurve: Formula<TimeInput> = defineFormula<TimeInput>({
  label: 'Standard fire',
  source: { standard: 'EN 1991-1-2:2002', clause: '3.2.1 (3.4)' },
  expression: '20 + 345·log₁₀(8·t + 1)',
  result: gas,
  symbols: time,
  evaluate: ({ minutes }) => 20 + 345 * Math.log10(8 * minutes + 1),
});

/** EN 1991-1-2 3.2.2 (3.5). α_c = 25 W/m²K. */
export const externalCurve: Formula<TimeInput> = defineFormula<TimeInput>({
  label: 'External fire',
  source: { standard: 'EN 1991-1-2:2002', clause: '3.2.2 (3.5)' },
  expression: '660·(1 − 0.687·e^(−0.32·t) − 0.313·e^(−3.8·t)) + 20',
  result: gas,
  symbols: time,
  evaluate: ({ minutes }) => 660 * (1 - 0.687 * Math.exp(-0.32 * minutes) - 0.313 * Math.exp(-3.8 * minutes)) + 20,
});

/** EN 1991-1-2 3.2.3 (3.6). α_c = 50 W/m²K. */
export const hydrocarbonCurve: Formula<TimeInput> = defineFormula<TimeInput>({
  label: 'Hydrocarbon fire',
  source: { standard: 'EN 1991-1-2:2002', clause: '3.2.3 (3.6)' },
  expression: '1080·(1 − 0.325·e^(−0.167·t) − 0.675·e^(−2.5·t)) + 20',
  result: gas,
  symbols: time,
  evaluate: ({ minutes }) => 1080 * (1 - 0.325 * Math.exp(-0.167 * minutes) - 0.675 * Math.exp(-2.5 * minutes)) + 20,
});
