import type { ThicknessUnit } from './thickness.js';

const formatters = new Map<number, Intl.NumberFormat>();
function fixed(decimals: number): Intl.NumberFormat {
  let f = formatters.get(decimals);
  if (!f) {
    f = new Intl.NumberFormat('en-GB', { minimumFractionDigits: decimals, maximumFractionDigits: decimals });
    formatters.set(decimals, f);
  }
  return f;
}

/** What stands where there is no number. */
export const noValue = '–';
/** Thousands are set apart by a narrow space that does not break (ISO 80000-1 7.3.1): a comma would read as a decimal mark to many. */
export const thousandsMark = '\u202f';

/** A number with a fixed count of decimals and grouped thousands; a dash where there is none, never NaN. */
export function formatNumber(value: number | null | undefined, decimals = 0): string {
  if (value == null || !Number.isFinite(value)) return noValue;
  const text = fixed(decimals).format(value);
  return (/^-[0.,]+$/.test(text) ? text.slice(1) : text).replaceAll(',', thousandsMark);
}

function withUnit(value: number | null | undefined, decimals: number, unit: string): string {
  const text = formatNumber(value, decimals);
  return text === noValue ? text : `${text} ${unit}`;
}

/** Rounds up at the given decimals, forgiving the last bits of binary arithmetic. A requirement is never shown smaller than it is. */
export function roundUp(value: number, decimals: number): number {
  const scale = 10 ** decimals;
  return Math.ceil(value * scale - 1e-6) / scale;
}

/**
 * A required or applied thickness. Film thickness is kept in µm and shown in mm to 2 decimals, or 3 where 2 would hide something:
 * 620 µm → 0.62 mm, 623 µm → 0.623 mm. Boards and sprays: whole mm, or one decimal rounded up.
 */
export function formatThickness(value: number | null | undefined, unit: ThicknessUnit): string {
  if (value == null || !Number.isFinite(value)) return noValue;
  if (unit === 'µm') {
    const um = roundUp(value, 0);
    return withUnit(um / 1000, um % 10 === 0 ? 2 : 3, 'mm');
  }
  const mm = roundUp(value, 1);
  return withUnit(mm, Number.isInteger(mm) ? 0 : 1, 'mm');
}

/** Dry or wet film thickness the way an applicator reads a gauge: 620 µm. */
export function formatFilmThickness(valueUm: number | null | undefined): string {
  return valueUm == null || !Number.isFinite(valueUm) ? noValue : withUnit(roundUp(valueUm, 0), 0, 'µm');
}

/** Critical and design temperatures to 1 °C, downwards: a limit is never shown higher than it is. */
export function formatLimitTemperature(temperatureC: number | null | undefined): string {
  return withUnit(temperatureC == null ? null : Math.floor(temperatureC + 1e-6), 0, '°C');
}

export function formatTemperature(temperatureC: number | null | undefined, decimals = 0): string {
  return withUnit(temperatureC, decimals, '°C');
}

/** Reported to 1 1/m; tables are read with the unrounded value. */
export function formatSectionFactor(sectionFactorPerM: number | null | undefined): string {
  return withUnit(sectionFactorPerM, 0, '1/m');
}

export function formatArea(areaM2: number | null | undefined, decimals = 1): string {
  return withUnit(areaM2, decimals, 'm²');
}

export function formatVolume(volumeM3: number | null | undefined, decimals = 2): string {
  return withUnit(volumeM3, decimals, 'm³');
}

export function formatLitres(litres: number | null | undefined, decimals = 1): string {
  return withUnit(litres, decimals, 'L');
}

export function formatMass(massKg: number | null | undefined, decimals = 0): string {
  return withUnit(massKg, decimals, 'kg');
}

export function formatLength(lengthMm: number | null | undefined, unit: 'mm' | 'm' = 'mm'): string {
  return unit === 'm' ? withUnit(lengthMm == null ? null : lengthMm / 1000, 3, 'm') : withUnit(lengthMm, 0, 'mm');
}

export function formatForce(forceKn: number | null | undefined, decimals = 1): string {
  return withUnit(forceKn, decimals, 'kN');
}

export function formatMoment(momentKnm: number | null | undefined, decimals = 1): string {
  return withUnit(momentKnm, decimals, 'kNm');
}

export function formatMinutes(minutes: number | null | undefined, decimals = 0): string {
  return withUnit(minutes, decimals, 'min');
}

/** A fire resistance period as the trade writes it: R 60. */
export function formatPeriod(periodMin: number): string {
  return `R ${periodMin}`;
}

export function formatPercent(fraction: number | null | undefined, decimals = 0): string {
  const text = formatNumber(fraction == null ? null : fraction * 100, decimals);
  return text === noValue ? text : `${text} %`;
}

function commonDivisor(a: number, b: number): number {
  return b === 0 ? a : commonDivisor(b, a % b);
}

/** Feet and inches to the nearest sixteenth: 3810 mm → 12 ft 6 in, 165 mm → 6 1/2 in. */
export function formatFeetInches(lengthMm: number | null | undefined): string {
  if (lengthMm == null || !Number.isFinite(lengthMm)) return noValue;
  const total = Math.round((Math.abs(lengthMm) / 25.4) * 16);
  const feet = Math.floor(total / 192);
  const inches = Math.floor((total % 192) / 16);
  const sixteenths = total % 16;
  const divisor = commonDivisor(sixteenths, 16);
  const fraction = sixteenths === 0 ? '' : `${sixteenths / divisor}/${16 / divisor}`;
  const inchText = [inches > 0 || !fraction ? String(inches) : '', fraction].filter(Boolean).join(' ');
  const sign = lengthMm < 0 && total > 0 ? '-' : '';
  return `${sign}${feet > 0 ? `${feet} ft ` : ''}${inchText} in`;
}

/** Two numbers that are not equal shown with as many decimals as it takes to tell them apart: 300.3 against 300. */
export function formatApart(value: number, limit: number, decimals = 0): [string, string] {
  for (let d = decimals; d < 6; d += 1) {
    const pair: [string, string] = [formatNumber(value, d), formatNumber(limit, d)];
    if (pair[0] !== pair[1]) return pair;
  }
  return [String(value), String(limit)];
}
