/**
 * Conversions to and from the units of the calculation core (mm, N, MPa, °C, 1/m).
 * Factors are exact by definition: 1 in = 25.4 mm, 1 lb = 0.45359237 kg, g = 9.80665 m/s² (international yard and pound agreement, 1959; ISO 80000).
 */
export const lengthUnits = ['mm', 'cm', 'm', 'in', 'ft'] as const;
export type LengthUnit = (typeof lengthUnits)[number];

const mmPer: Record<LengthUnit, number> = { mm: 1, cm: 10, m: 1000, in: 25.4, ft: 304.8 };

export function lengthToMm(value: number, unit: LengthUnit): number {
  return value * mmPer[unit];
}

export function lengthFromMm(lengthMm: number, unit: LengthUnit): number {
  return lengthMm / mmPer[unit];
}

const newtonPerPoundForce = 0.45359237 * 9.80665;

export const forceUnits = ['N', 'kN', 'MN', 'lbf', 'kip'] as const;
export type ForceUnit = (typeof forceUnits)[number];
const kiloNewtonPer: Record<ForceUnit, number> = { N: 1e-3, kN: 1, MN: 1000, lbf: newtonPerPoundForce / 1000, kip: newtonPerPoundForce };

export function forceToKn(value: number, unit: ForceUnit): number {
  return value * kiloNewtonPer[unit];
}

export const momentUnits = ['Nm', 'kNm', 'MNm', 'kip-ft', 'kip-in'] as const;
export type MomentUnit = (typeof momentUnits)[number];
const kiloNewtonMetrePer: Record<MomentUnit, number> = {
  Nm: 1e-3, kNm: 1, MNm: 1000, 'kip-ft': newtonPerPoundForce * 0.3048, 'kip-in': newtonPerPoundForce * 0.0254,
};

export function momentToKnm(value: number, unit: MomentUnit): number {
  return value * kiloNewtonMetrePer[unit];
}

export const stressUnits = ['MPa', 'N/mm²', 'ksi'] as const;
export type StressUnit = (typeof stressUnits)[number];

export function stressToMPa(value: number, unit: StressUnit): number {
  return unit === 'ksi' ? (value * newtonPerPoundForce * 1000) / 25.4 ** 2 : value;
}

export function fahrenheitToCelsius(temperatureF: number): number {
  return ((temperatureF - 32) * 5) / 9;
}

export function celsiusToFahrenheit(temperatureC: number): number {
  return (temperatureC * 9) / 5 + 32;
}

/** 1 mil is a thousandth of an inch, the North American unit of film thickness. */
export function micrometresToMils(thicknessUm: number): number {
  return thicknessUm / 25.4;
}

export const steelDensityKgPerM3 = 7850;

/** W/D: mass per length over heated perimeter, the reciprocal view of A/V. Result in kg/m per m. */
export function massPerHeatedPerimeter(sectionFactorPerM: number): number {
  return steelDensityKgPerM3 / sectionFactorPerM;
}

/** The same in lb/ft per in, as North American listings print it. */
export function weightToHeatedPerimeterLbFtIn(sectionFactorPerM: number): number {
  return (massPerHeatedPerimeter(sectionFactorPerM) * 0.3048 * 0.0254) / 0.45359237;
}
