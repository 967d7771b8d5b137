import { productSupplySchema } from '@mantlet/common';
import type { Evidence, ProductDto, ProductKind, RegressionFit, ThicknessTable } from '@mantlet/common';
import type { z } from 'zod';
import type { productInputSchema } from '@mantlet/common';

/** What the form holds: the contract's input, with null where a number is still to be typed. */
export type ProductForm = z.input<typeof productInputSchema>;
export type ProductFormOut = z.output<typeof productInputSchema>;

export const evidenceForms = (kind: ProductKind): Evidence['form'][] => (kind === 'coating' ? ['table', 'regression'] : ['table', 'regression', 'thermal']);

type Blank<T> = { [K in keyof T]: T[K] | null };
/** One fit with its coefficients and range still empty; the schema says what is missing. */
export const blankFit = (): RegressionFit => {
  const blank: Blank<RegressionFit> = {
    shape: 'open', orientation: 'beam', coefficients: Array.from({ length: 8 }, () => 0), minThickness: null, maxThickness: null,
    minSectionFactorPerM: null, maxSectionFactorPerM: null, minTemperatureC: null, maxTemperatureC: null, minPeriodMin: null, maxPeriodMin: null,
  };
  return blank as RegressionFit;
};

export function blankEvidence(form: Evidence['form']): ProductForm['evidence'] {
  if (form === 'table') return { form, tables: [] };
  if (form === 'regression') return { form, fits: [blankFit()] };
  const properties = {
    conductivityWPerMK: null, densityKgPerM3: null, specificHeatJPerKgK: null, moisturePercent: 0, minThicknessMm: null, maxThicknessMm: null, maxSectionFactorPerM: null,
    minSectionFactorPerM: null, maxTemperatureC: null, maxPeriodMin: null, stockThicknessesMm: [], maxLayers: 1, thicknessStepMm: 1, coversNaturalFire: false,
  };
  return { form, properties } as unknown as ProductForm['evidence'];
}

export const blankProduct = (): ProductForm => ({
  name: '', maker: '', kind: 'coating', invented: false, evidenceReference: '', evidenceEdition: '', evidenceExpiresOn: '', evidenceStandard: '',
  curves: ['standard'], environments: [], evidence: blankEvidence('table'), supply: productSupplySchema.parse({}), note: '',
});

export function formOf(product: ProductDto): ProductForm {
  const { id: _id, projectId: _project, version: _version, expired: _expired, evidenceFile: _file, ...input } = product;
  return input;
}

const sameTable = (a: ThicknessTable, b: Pick<ThicknessTable, 'shape' | 'orientation' | 'periodMin'>) =>
  a.shape === b.shape && a.orientation === b.orientation && a.periodMin === b.periodMin;
export const hasTable = (tables: readonly ThicknessTable[], key: Pick<ThicknessTable, 'shape' | 'orientation' | 'periodMin'>): boolean => tables.some((t) => sameTable(t, key));

const order = { open: 0, 'hollow-rectangular': 1, 'hollow-circular': 2, beam: 0, column: 1 } as const;
/** Puts a table into the list in the order of shape, orientation and period, in place of one for the same three. */
export function withTable(tables: readonly ThicknessTable[], table: ThicknessTable): ThicknessTable[] {
  return [...tables.filter((t) => !sameTable(t, table)), table]
    .sort((a, b) => order[a.shape] - order[b.shape] || order[a.orientation] - order[b.orientation] || a.periodMin - b.periodMin);
}

/** Numbers typed as "12, 15; 20" in a field that takes several; what is no number is dropped by the field, not guessed. */
export const numbersOf = (texts: readonly string[]): number[] => {
  const numbers = texts.map((text) => Number(text.replace(',', '.'))).filter((n) => Number.isFinite(n) && n > 0);
  return [...new Set(numbers)].sort((a, b) => a - b);
};
