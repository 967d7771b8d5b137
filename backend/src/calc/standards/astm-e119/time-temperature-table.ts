import { defineFormula } from '../../formula.js';
import type { Source } from '../../formula.js';

export const astmE119Source: Source = { standard: 'ASTM E119 / CAN/ULC-S101', clause: 'time-temperature table', memory: true };

/** Minutes and °C. The table governs, not the fits that are in use for it. */
export const astmE119Rows: readonly (readonly [number, number])[] = [
  [0, 20], [5, 538], [10, 704], [15, 760], [20, 795], [25, 821], [30, 843], [35, 862], [40, 878], [45, 892], [50, 905], [55, 916], [60, 927],
  [65, 937], [70, 946], [75, 955], [80, 963], [85, 971], [90, 978], [95, 985], [100, 991], [105, 996], [110, 1001], [115, 1006], [120, 1010],
  [130, 1017], [140, 1024], [150, 1031], [160, 1038], [170, 1045], [180, 1052], [190, 1059], [200, 1066], [210, 1072], [220, 1079], [230, 1086],
  [240, 1093], [480, 1260],
];

/** Linear between rows; beyond eight hours the last value stands. */
export const astmE119Curve = defineFormula<{ minutes: number }>({
  label: 'ASTM E119 fire',
  source: astmE119Source,
  expression: 'linear between the rows of the table: 5 min 538, 10 min 704, 30 min 843, 60 min 927, 120 min 1010, 240 min 1093, 480 min 1260 °C and those between',
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
