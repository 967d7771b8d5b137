import { formatApart, formatLimitTemperature, formatNumber } from '../units/format.js';

/**
 * Reading of assessed product data. Codes that begin with `product.outside-` say that the assessment does not reach;
 * every other reason says that something is missing (see verdictOfReason).
 */
export const productMessages = {
  'product.outside-section-factor': (p: { sectionFactorPerM: number; limitPerM: number }) => {
    const [value, limit] = formatApart(p.sectionFactorPerM, p.limitPerM);
    return `Outside the assessment: A/V ${value} is above ${limit}.`;
  },
  'product.outside-temperature': (p: { temperatureC: number; limitC: number }) => {
    const [value, limit] = formatApart(p.temperatureC, p.limitC);
    return `Outside the assessment: critical temperature ${value} °C is below ${limit} °C.`;
  },
  'product.outside-period': (p: { periodMin: number; limitMin: number }) =>
    `Outside the assessment: R ${p.periodMin} is above R ${formatNumber(p.limitMin)}.`,
  'product.outside-cell': (p: { sectionFactorPerM: number; temperatureC: number; periodMin: number }) =>
    `Outside the assessment: no thickness is given at A/V ${formatNumber(p.sectionFactorPerM)}, ${formatLimitTemperature(p.temperatureC)}, R ${p.periodMin}.`,
  'product.outside-shape': (p: { group: string; orientation: string }) =>
    `Outside the assessment: no data for ${p.group} sections as ${p.orientation}s.`,
  'product.outside-curve': (p: { curve: string; covered: string }) =>
    `Outside the assessment: it covers ${p.covered || 'no curve'}, not ${p.curve}.`,
  'product.outside-thickness': (p: { greatest: number; unit: 'µm' | 'mm' }) =>
    `Outside the assessment: the greatest assessed thickness, ${formatNumber(p.greatest, Number.isInteger(p.greatest) ? 0 : 1)} ${p.unit}, does not hold the period.`,
  'product.outside-measured': (p: { measured: number; least: number; unit: 'µm' | 'mm' }) => {
    const [value, least] = formatApart(p.measured, p.least);
    return `Outside the assessment: ${value} ${p.unit} is below the least assessed thickness, ${least} ${p.unit}.`;
  },
  'product.no-solution': (p: { sectionFactorPerM: number; temperatureC: number }) =>
    `Not determined: the regression gives no thickness at A/V ${formatNumber(p.sectionFactorPerM)} and ${formatLimitTemperature(p.temperatureC)}.`,
  'product.form-not-for-kind': (p: { form: string; kind: string }) =>
    `Not determined: ${p.form} do not describe a ${p.kind}; upload its thickness table or regression.`,
  'product.no-stock': (_: Record<string, never>) =>
    'Not determined: no stocked thickness or stack of layers lies within the assessed range.',

  // said when evidence is uploaded
  'product.table-shape': (p: { table: string; problem: string }) => `${p.table}: ${p.problem}.`,
  'product.axis-not-rising': (p: { table: string; axis: string; index: number }) =>
    `${p.table}: ${p.axis} must rise; value ${p.index} does not.`,
  'product.falls-with-section-factor': (p: { table: string; temperatureC: number; fromPerM: number; toPerM: number; from: number; to: number }) =>
    `${p.table}, ${p.temperatureC} °C: thickness falls from ${p.from} at A/V ${p.fromPerM} to ${p.to} at A/V ${p.toPerM}; it must not fall with A/V.`,
  'product.rises-with-temperature': (p: { table: string; sectionFactorPerM: number; fromC: number; toC: number; from: number; to: number }) =>
    `${p.table}, A/V ${p.sectionFactorPerM}: thickness rises from ${p.from} at ${p.fromC} °C to ${p.to} at ${p.toC} °C; it must not rise with temperature.`,
  'product.falls-with-period': (p: { table: string; nextTable: string; sectionFactorPerM: number; temperatureC: number; from: number; to: number }) =>
    `${p.nextTable}, A/V ${p.sectionFactorPerM}, ${p.temperatureC} °C: ${p.to} is less than the ${p.from} of ${p.table}; thickness must not fall with the period.`,
  'product.table-empty': (p: { table: string }) => `${p.table}: every cell is empty.`,
  'product.table-twice': (p: { table: string }) => `${p.table} occurs twice.`,
  'product.range-turned': (p: { where: string; what: string; least: number; greatest: number }) =>
    `${p.where}: least ${p.what} ${p.least} is above the greatest, ${p.greatest}.`,
  'product.fit-not-monotonic': (p: { where: string; what: 'A/V' | 'temperature' | 'period' }) =>
    p.what === 'temperature'
      ? `${p.where}: the regression asks for more thickness at a higher temperature within its own range.`
      : `${p.where}: the regression asks for less thickness at a greater ${p.what} within its own range.`,
  'product.stock-outside-range': (p: { stockMm: number; leastMm: number; greatestMm: number }) =>
    `Stocked thickness ${p.stockMm} mm, in as many layers as are allowed, gives nothing between ${p.leastMm} and ${p.greatestMm} mm.`,

  // said when a table or an evidence file is read
  'product.no-file': (_: Record<string, never>) => 'No file came with the request. Choose one.',
  'product.evidence-file-kind': (p: { file: string; kind: string }) => `${p.file} is ${p.kind}. Evidence is kept as PDF, CSV or XLSX; save it as one of these.`,
  'product.no-evidence-file': (p: { product: string }) => `No evidence file was uploaded for ${p.product} yet.`,
  'product.table-no-temperatures': (p: { file: string }) =>
    `${p.file} has no row of temperatures. The first row must hold the design temperatures in °C, the first column the section factors in 1/m.`,
  'product.table-no-rows': (p: { file: string }) => `${p.file} has no rows below its temperatures. The first column must hold the section factors in 1/m.`,
  'product.table-cell': (p: { cell: string; text: string; wanted: string }) =>
    p.text ? `Cell ${p.cell}: "${p.text}" is not ${p.wanted}.` : `Cell ${p.cell} is empty; it must hold ${p.wanted}.`,
  'product.table-too-large': (p: { what: string; count: number; limit: number }) => `The table has ${p.count} ${p.what}; at most ${p.limit} are read.`,
  'product.table-row-left-out': (p: { row: number; text: string }) => `Row ${p.row}, "${p.text}", holds no numbers and was not read.`,

  // quantities
  'product.supply-missing': (p: { product: string; what: string }) => `Not determined: ${p.product} has no ${p.what}.`,
  'product.no-box': (p: { mark: string }) => `Not determined: member ${p.mark} has no box sides to cut boards for.`,
};
