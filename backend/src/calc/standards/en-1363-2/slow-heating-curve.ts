import { defineFormula } from '../../formula.js';

const STANDARD_PART_FROM_MIN = 20;

/** Smouldering start to 20 min, then the standard fire begun at 20 min. */
export const slowHeatingCurve = defineFormula<{ minutes: number }>({
  label: 'Slow heating fire',
  source: { standard: 'EN 1363-2:1999', clause: 'slow heating curve', note: 'the two parts do not meet at 20 min: the first ends at 345.7 °C, the second starts at 20 °C. As a test curve the second takes over; here the gas never falls below where the first part left it' },
  expression: '154·t^0.25 + 20 for t ≤ 20; 345·log₁₀(8·(t − 20) + 1) + 20 after, not below 345.7',
  result: { symbol: 'θ_g', meaning: 'gas temperature', unit: '°C' },
  symbols: { minutes: { symbol: 't', meaning: 'time from ignition', unit: 'min' } },
  evaluate: ({ minutes }) => {
    if (minutes <= STANDARD_PART_FROM_MIN) return 154 * minutes ** 0.25 + 20;
    const reached = 154 * STANDARD_PART_FROM_MIN ** 0.25 + 20;
    return Math.max(reached, 345 * Math.log10(8 * (minutes - STANDARD_PART_FROM_MIN) + 1) + 20);
  },
});
