import type { Evidence, EvidenceRange, ProductKind, ProductSummaryDto, RegressionFit, ThicknessTable } from '@mantlet/common';
import { evidenceRange, productKindNames } from '@mantlet/common';
import { count, countWord, formatNumber } from '../../lib/format.js';
import type { StatusKind } from '../../ui/status-word.js';

export const thicknessUnitOf = (kind: ProductKind): 'µm' | 'mm' => (kind === 'coating' ? 'µm' : 'mm');
export const shapeNames: Record<ThicknessTable['shape'], string> = { open: 'Open section', 'hollow-rectangular': 'Rectangular hollow', 'hollow-circular': 'Circular hollow' };
export const orientationNames: Record<ThicknessTable['orientation'], string> = { beam: 'Beam', column: 'Column' };
export const formNames: Record<Evidence['form'], string> = { table: 'Thickness tables', regression: 'Regression', thermal: 'Thermal properties' };

/** "Open section, beam, R 60" */
export const tableName = (t: Pick<ThicknessTable, 'shape' | 'orientation' | 'periodMin'>): string =>
  `${shapeNames[t.shape]}, ${orientationNames[t.orientation].toLowerCase()}, R ${t.periodMin}`;
/** A product's parts where two versions of it are compared: a table is named and measured, not written out. */
export const productEditWords = {
  label: (path: string): string | undefined => /^evidence\.tables\./.test(path) ? 'Thickness table' : /^evidence\.fits\./.test(path) ? 'Regression' : path === 'evidence' ? 'Assessed data' : undefined,
  value: (path: string, value: unknown): string | undefined => {
    if (/^evidence\.tables(\.|$)/.test(path) && value) {
      const tables = (Array.isArray(value) ? value : [value]) as ThicknessTable[];
      return tables.map((t) => `${tableName(t)}: ${count(t.sectionFactorsPerM.length, 'section factor')} × ${count(t.temperaturesC.length, 'temperature')}, ${t.thickness.flat().join(' ')}`).join('\n');
    }
    return path === 'evidence' && value ? formNames[(value as Evidence).form] : undefined;
  },
};
/** "Open section, beam" */
export const fitName = (f: Pick<RegressionFit, 'shape' | 'orientation'>): string => `${shapeNames[f.shape]}, ${orientationNames[f.orientation].toLowerCase()}`;

const dayMs = 86_400_000;
/** An assessment is valid through its last day; in its last 90 days it says so, because a schedule may outlive it. */
export function expiryWords(product: { evidenceExpiresOn: string; expired: boolean }, today = new Date()): { word: string; kind: StatusKind } {
  if (product.expired) return { word: 'Expired', kind: 'attention' };
  const left = Math.ceil((Date.parse(`${product.evidenceExpiresOn}T23:59:59Z`) - today.getTime()) / dayMs);
  if (left <= 90) return { word: left <= 1 ? 'Expires today' : `Expires in ${left} days`, kind: 'attention' };
  return { word: 'Valid', kind: 'settled' };
}

const whole = (value: number) => formatNumber(value, Number.isInteger(value) ? 0 : 1);
const between = ([from, to]: readonly [number | null, number], unit = '') =>
  from === null ? `up to ${whole(to)}${unit}` : from === to ? `${whole(to)}${unit}` : `${whole(from)} to ${whole(to)}${unit}`;

export interface RangeWords { sectionFactor: string; temperature: string; period: string; thickness: string }
export function rangeWords(range: EvidenceRange, kind: ProductKind): RangeWords {
  return {
    sectionFactor: `A/V ${between(range.sectionFactorPerM)}`,
    temperature: between(range.temperatureC, ' °C'),
    period: range.periodMin[0] === null ? `up to R ${whole(range.periodMin[1])}` : range.periodMin[0] === range.periodMin[1] ? `R ${whole(range.periodMin[1])}` : `R ${whole(range.periodMin[0])} to R ${whole(range.periodMin[1])}`,
    thickness: between(range.thickness, ` ${thicknessUnitOf(kind)}`),
  };
}

/** The product page's heading: what the evidence reaches. */
export function productHeading(evidence: Evidence): string {
  const range = evidenceRange(evidence);
  return `Assessed for ${whole(range.periodMin[1])} minutes, up to A/V ${whole(range.sectionFactorPerM[1])}`;
}

export function libraryWords(products: readonly ProductSummaryDto[], shared: boolean): { heading: string; sub: string } {
  if (products.length === 0) {
    return { heading: 'No products yet', sub: shared ? 'Products with their assessed data, for every project.' : 'A zone’s system is chosen from the products here.' };
  }
  // names of kinds hold commas of their own
  const kinds = [...new Set(products.map((p) => productKindNames[p.kind].toLowerCase()))].join('; ');
  const expired = products.filter((p) => p.expired);
  const used = products.filter((p) => p.usedByZones > 0).length;
  return {
    heading: expired.length === 0
      ? `${count(products.length, 'product')}, ${products.length === 1 ? 'its assessment is' : 'all assessments'} valid`
      : `${count(products.length, 'product')}, ${expired.length} with an expired assessment`,
    sub: `${kinds.charAt(0).toUpperCase()}${kinds.slice(1)}. ${used === 0 ? 'No zone uses any yet' : `${countWord(used)} ${used === 1 ? 'is' : 'are'} in use`}.`,
  };
}
