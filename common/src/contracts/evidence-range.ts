import { z } from 'zod';
import type { Evidence } from './products.js';

const range = z.tuple([z.number(), z.number()]);
const openRange = z.tuple([z.number().nullable(), z.number()]);
/** The box within which the evidence gives a thickness at all; null where it names no lower limit. */
export const evidenceRangeSchema = z.object({ sectionFactorPerM: range, temperatureC: openRange, periodMin: openRange, thickness: range });
export type EvidenceRange = z.infer<typeof evidenceRangeSchema>;

const span = (values: readonly number[]): [number, number] => [Math.min(...values), Math.max(...values)];

/** The box within which the evidence gives a thickness at all; single tables may hold less. */
export function evidenceRange(evidence: Evidence): EvidenceRange {
  if (evidence.form === 'thermal') {
    const p = evidence.properties;
    return {
      sectionFactorPerM: [p.minSectionFactorPerM, p.maxSectionFactorPerM], temperatureC: [null, p.maxTemperatureC], periodMin: [null, p.maxPeriodMin],
      thickness: [p.minThicknessMm, p.maxThicknessMm],
    };
  }
  if (evidence.form === 'regression') {
    const f = evidence.fits;
    return {
      sectionFactorPerM: [Math.min(...f.map((x) => x.minSectionFactorPerM)), Math.max(...f.map((x) => x.maxSectionFactorPerM))],
      temperatureC: [Math.min(...f.map((x) => x.minTemperatureC)), Math.max(...f.map((x) => x.maxTemperatureC))],
      periodMin: [Math.min(...f.map((x) => x.minPeriodMin)), Math.max(...f.map((x) => x.maxPeriodMin))],
      thickness: [Math.min(...f.map((x) => x.minThickness)), Math.max(...f.map((x) => x.maxThickness))],
    };
  }
  const t = evidence.tables;
  return {
    sectionFactorPerM: span(t.flatMap((x) => x.sectionFactorsPerM)), temperatureC: span(t.flatMap((x) => x.temperaturesC)), periodMin: span(t.map((x) => x.periodMin)),
    thickness: span(t.flatMap((x) => x.thickness.flat().filter((v) => v !== null))),
  };
}
