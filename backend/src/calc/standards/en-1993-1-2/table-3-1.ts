import type { Source } from '../../formula.js';

export const table31Source: Source = { standard: 'EN 1993-1-2:2005', clause: 'Table 3.1', note: 'linear between rows' };

/** θ_a, k_y,θ, k_p,θ, k_E,θ */
export const table31Rows: readonly (readonly [number, number, number, number])[] = [
  [20, 1, 1, 1], [100, 1, 1, 1], [200, 1, 0.807, 0.9], [300, 1, 0.613, 0.8], [400, 1, 0.42, 0.7], [500, 0.78, 0.36, 0.6],
  [600, 0.47, 0.18, 0.31], [700, 0.23, 0.075, 0.13], [800, 0.11, 0.05, 0.09], [900, 0.06, 0.0375, 0.0675],
  [1000, 0.04, 0.025, 0.045], [1100, 0.02, 0.0125, 0.0225], [1200, 0, 0, 0],
];
/** Carbon steel has no strength left here; no critical temperature lies above it. */
export const STRENGTH_ENDS_C = 1200;

type Column = 1 | 2 | 3;

function read(temperatureC: number, column: Column): number {
  if (temperatureC <= 100) return 1;
  if (temperatureC >= STRENGTH_ENDS_C) return 0;
  const index = Math.floor(temperatureC / 100); // rows from 100 °C on are 100 K apart
  const low = table31Rows[index]!;
  const high = table31Rows[index + 1]!;
  return low[column] + ((high[column] - low[column]) * (temperatureC - low[0])) / 100;
}

/** Effective yield strength relative to f_y at 20 °C */
export function kY(temperatureC: number): number {
  return read(temperatureC, 1);
}
/** Proportional limit relative to f_y at 20 °C */
export function kP(temperatureC: number): number {
  return read(temperatureC, 2);
}
/** Slope of the linear elastic range relative to E_a at 20 °C */
export function kE(temperatureC: number): number {
  return read(temperatureC, 3);
}

/** The highest temperature at which the column still is at least `factor`: its exact inverse. */
function invert(factor: number, column: Column): number {
  if (factor <= 0) return STRENGTH_ENDS_C;
  for (let i = table31Rows.length - 2; i > 0; i -= 1) {
    const low = table31Rows[i]!;
    if (factor <= low[column]) {
      const high = table31Rows[i + 1]!;
      return low[0] + (100 * (low[column] - factor)) / (low[column] - high[column]);
    }
  }
  return 20;
}

/** Highest θ with k_y,θ ≥ factor; 20 where factor is above 1 (never reached). */
export function temperatureOfKy(factor: number): number {
  return invert(factor, 1);
}
/** Highest θ with k_E,θ ≥ factor; 20 where factor is above 1 (never reached). */
export function temperatureOfKe(factor: number): number {
  return invert(factor, 3);
}
