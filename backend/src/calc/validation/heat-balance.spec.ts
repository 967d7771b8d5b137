import type { FireCurve } from '@mantlet/common';
import { bareField } from '../methods/heating-field.js';
import { protectedTemperature, unprotectedTemperature } from '../methods/heating.js';

interface OdexSolver {
  absoluteTolerance: number;
  relativeTolerance: number;
  maxStepSize: number;
  solve: (rate: (x: number, y: number[]) => number[], from: number, start: number[], to: number) => { y: number[] };
}
// loaded untyped: the package ships sources that do not compile under this project's stricter options
const { Solver } = jest.requireActual<{ Solver: new (unknowns: number) => OdexSolver }>('odex');

/*
 * The heat balance a second way: the differential equation that (4.25) and (4.27) step through, written here from the
 * standard's clauses and integrated by the Gragg-Bulirsch-Stoer method of the general-purpose package odex.
 */
const gas = (s: number) => 20 + 345 * Math.log10((8 * s) / 60 + 1);
const gasRate = (s: number) => (345 / Math.LN10) * (8 / 60 / ((8 * s) / 60 + 1));
function specificHeat(t: number): number {
  if (t < 600) return 425 + 7.73e-1 * t - 1.69e-3 * t ** 2 + 2.22e-6 * t ** 3;
  if (t < 735) return 666 + 13002 / (738 - t);
  if (t < 900) return 545 + 17820 / (t - 731);
  return 650;
}

function integrate(rate: (s: number, t: number) => number, minutes: number): number {
  const solver = new Solver(1);
  solver.absoluteTolerance = 1e-7;
  solver.relativeTolerance = 1e-9;
  solver.maxStepSize = 10; // the specific heat has kinks at 600, 735 and 900 °C
  let steelC = 20;
  for (let minute = 0; minute < minutes; minute += 1) {
    const part = solver.solve((s, y) => [rate(s, y[0]!)], minute * 60, [steelC], (minute + 1) * 60);
    steelC = part.y[0]!;
  }
  return steelC;
}
const curve: FireCurve = { kind: 'standard' };

describe('heat balance integrated by odex', () => {
  it.each([
    [50, 30], [50, 60], [100, 15], [100, 30], [200, 15], [200, 20], [300, 60],
  ])('unprotected, A_m/V %d, %d min', (sectionFactorPerM, minutes) => {
    const reference = integrate((s, t) => {
      const flux = 25 * (gas(s) - t) + 0.7 * 5.67e-8 * ((gas(s) + 273) ** 4 - (t + 273) ** 4);
      return (sectionFactorPerM * flux) / (specificHeat(t) * 7850);
    }, minutes);
    const at = (stepS: number) => unprotectedTemperature({ sectionFactorPerM, minutes, stepS, shadowFactor: 1, curve, emissivity: 0.7 });
    expect(Math.abs(at(1) - reference)).toBeLessThan(0.5);
    expect(Math.abs(at(5) - reference)).toBeLessThan(2);
    expect(Math.abs(bareField('standard', 0.7).temperatureC(sectionFactorPerM, 1, minutes) - reference)).toBeLessThan(0.8);
  });

  it.each([
    [0.12, 350, 1200, 20, 100, 60], [0.12, 350, 1200, 20, 100, 120], [0.2, 800, 1700, 20, 150, 60], [0.2, 800, 1700, 35, 250, 120],
  ])('protected, λ %d, ρ %d, c %d, %d mm, A_p/V %d, %d min', (lambda, rho, c, thicknessMm, sectionFactorPerM, minutes) => {
    const d = thicknessMm / 1000;
    const reference = integrate((s, t) => {
      const phi = (c * rho * d * sectionFactorPerM) / (specificHeat(t) * 7850);
      const flow = (lambda * sectionFactorPerM * (gas(s) - t)) / (d * specificHeat(t) * 7850 * (1 + phi / 3));
      return Math.max(0, flow - (Math.exp(phi / 10) - 1) * gasRate(s));
    }, minutes);
    const at = (stepS: number) => protectedTemperature({
      conductivityWPerMK: lambda, densityKgPerM3: rho, specificHeatJPerKgK: c, moisturePercent: 0, thicknessMm, sectionFactorPerM, curve, minutes, stepS,
    });
    expect(Math.abs(at(1) - reference)).toBeLessThan(0.5);
    expect(Math.abs(at(30) - reference)).toBeLessThan(2);
  });
});
