import { defineFormula } from '../../formula.js';
import type { Source } from '../../formula.js';

export const astmE119Source: Source = { standard: 'ASTM E119 / CAN/ULC-S101', clause: 'time-temperature table', memory: true };

/** Minutes and °C. The table governs, not the fits that are in use for it. */
export const astmE119Rows: readonly (readonly [number, number])[] = [
  [0, 20], [5, 538], [10, 704], [30, 843], [60, 927], [120, 1010], [240, 1093], [480, 1260],
];

/** Linear between rows; beyond eight hours the last value stands. */
export const astmE119Curve = defineFormula<{ minutes: number }>({
  label: 'ASTM E119 fire',
  source: astmE119Source,
  expression: 'linear between 0 min 20, 5 min 538, 10 min 704, 30 min 843, 60 min 927, 120 min 1010, 240 min 1093, 480 min 1260 °C',
  result: { symbol: 'θ_g', meaning: 'gas temperature', unit: '°C' },
  symbols: { minutes: { symbol: 't', meaning: 'time from ignition', unit: 'min' } },
  evaluate: ({ minutes }) => {
    let before = astmE119Rows[0]!;
    for (const row of astmE119Rows) {
      if (minutes < row[0]) return before[1] + ((row[1] - before[1]) * (minutes - before[0])) / (row[0] - before[0]);
      before = row;
    }
    return before[1];
  },
});
