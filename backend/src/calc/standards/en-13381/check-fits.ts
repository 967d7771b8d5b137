import { message } from '@mantlet/common';
import type { Message, RegressionFit } from '@mantlet/common';
import { groupNames } from './coverage.js';
import { gainPerThickness, solvedThickness } from './regression.js';

export function turnedRange(where: string, what: string, least: number, greatest: number): Message[] {
  return least <= greatest ? [] : [message('product.range-turned', { where, what, least, greatest })];
}

function ranges(fit: RegressionFit, where: string): Message[] {
  return [
    ...turnedRange(where, 'thickness', fit.minThickness, fit.maxThickness),
    ...turnedRange(where, 'A/V', fit.minSectionFactorPerM, fit.maxSectionFactorPerM),
    ...turnedRange(where, 'temperature', fit.minTemperatureC, fit.maxTemperatureC),
    ...turnedRange(where, 'period', fit.minPeriodMin, fit.maxPeriodMin),
  ];
}

const gridPoints = 13;
const grid = (from: number, to: number): number[] => Array.from({ length: gridPoints }, (_, i) => from + ((to - from) * i) / (gridPoints - 1));

type Triple = [sectionFactorPerM: number, temperatureC: number, periodMin: number];

/** The thickness a fit asks for, held within the tested range as a reading would; null where it gives none. */
function held(fit: RegressionFit, [sectionFactorPerM, temperatureC, periodMin]: Triple): number | null {
  if (!(gainPerThickness(fit, sectionFactorPerM, temperatureC) > 0)) return null;
  const d = solvedThickness(fit, sectionFactorPerM, temperatureC, periodMin);
  return Math.min(Math.max(d, fit.minThickness), fit.maxThickness);
}

/**
 * Walks a grid over the fit's range along one axis and looks for a step the wrong way. A fit is smooth, so that a grid finds
 * reversals of any practical size; readings stay refused wherever the equation has no solution.
 */
function reverses(fit: RegressionFit, axis: 0 | 1 | 2, sign: 1 | -1): boolean {
  const axes = [
    grid(fit.minSectionFactorPerM, fit.maxSectionFactorPerM), grid(fit.minTemperatureC, fit.maxTemperatureC), grid(fit.minPeriodMin, fit.maxPeriodMin),
  ] as const;
  const [others1, others2] = ([0, 1, 2] as const).filter((a) => a !== axis) as [0 | 1 | 2, 0 | 1 | 2];
  for (const u of axes[others1]) {
    for (const v of axes[others2]) {
      let before: number | null = null;
      for (const w of axes[axis]) {
        const point: Triple = [0, 0, 0];
        point[others1] = u;
        point[others2] = v;
        point[axis] = w;
        const d = held(fit, point);
        if (d !== null && before !== null && sign * (d - before) < -1e-6 * fit.maxThickness) return true;
        if (d !== null) before = d;
      }
    }
  }
  return false;
}

export function checkFits(fits: readonly RegressionFit[]): Message[] {
  const seen = new Set<string>();
  return fits.flatMap((fit) => {
    const where = `Regression, ${groupNames[fit.shape]}, ${fit.orientation}`;
    const key = `${fit.shape}/${fit.orientation}`;
    if (seen.has(key)) return [message('product.table-twice', { table: where })];
    seen.add(key);
    const turned = ranges(fit, where);
    if (turned.length > 0) return turned;
    const faults: Message[] = [];
    if (reverses(fit, 0, 1)) faults.push(message('product.fit-not-monotonic', { where, what: 'A/V' }));
    if (reverses(fit, 1, -1)) faults.push(message('product.fit-not-monotonic', { where, what: 'temperature' }));
    if (reverses(fit, 2, 1)) faults.push(message('product.fit-not-monotonic', { where, what: 'period' }));
    return faults;
  });
}
