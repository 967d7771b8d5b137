import { formatDecimal, formatFilmThickness, formatNumber, formatThickness, memberTypeNames, productKindNames, sentence } from '@mantlet/common';
import type { PurchaseDto, QuantityLineDto, QuantityTotals, ScheduleSnapshot } from '@mantlet/common';
import type { Content } from 'pdfmake/interfaces.js';
import { heading, paragraph, schedule } from './layout.js';

interface QuantityRow { level: string; product: string; totals: QuantityTotals }

const amounts = [
  { head: 'Pieces', width: 40, right: true, value: (r: QuantityRow) => formatNumber(r.totals.pieces) },
  { head: 'Gross m²', width: 58, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.grossM2) },
  { head: 'Deducted m²', width: 62, right: true, value: (r: QuantityRow) => formatNumber(Number(r.totals.endLapM2) + Number(r.totals.openingM2), 2) },
  { head: 'Coat-back m²', width: 62, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.coatBackM2) },
  { head: 'Net m²', width: 58, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.netM2) },
  { head: 'In place m³', width: 58, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.volumeM3) },
  { head: 'Litres', width: 58, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.litres) },
  { head: 'kg', width: 58, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.kg) },
  { head: 'Sheet m²', width: 58, right: true, value: (r: QuantityRow) => formatDecimal(r.totals.sheetM2) },
];

/** Quantities by floor and system; every figure is a sum of printed lines. */
export function quantitiesSection(snapshot: ScheduleSnapshot): Content[] {
  const { byLevelAndProduct: split } = snapshot.quantities;
  const names = new Map(snapshot.products.map((p) => [p.id, p.name]));
  const rows = snapshot.levels.flatMap((level) => split.cells.filter((cell) => cell.row === level.id)
    .map((cell): QuantityRow => ({ level: `${level.code} ${level.name}`, product: names.get(cell.column) ?? '', totals: cell.totals })));
  const perProduct = split.columns.map((column): QuantityRow => ({ level: 'All levels', product: names.get(column.key) ?? '', totals: column.totals }));
  const columns = [{ head: 'Level', width: '*' as const, value: (r: QuantityRow) => r.level }, { head: 'System', width: 130, value: (r: QuantityRow) => r.product }, ...amounts];
  if (rows.length === 0) return [heading('5  Quantities by floor', { pageBreak: 'before' }), paragraph('Nothing is to be protected.')];
  return [
    heading('5  Quantities by floor', { pageBreak: 'before' }),
    paragraph('Areas are what is coated, sprayed or boxed, not what is heated: gross, less end laps and openings, plus coat-back, is net. Litres and kg include the loss stated with the system; sheets include cutting waste.'),
    schedule(columns, rows, { totals: [...perProduct, { level: 'Total', product: '', totals: split.total }] }),
    ...purchaseSection(snapshot, names),
    ...applicationSection(snapshot, names),
  ];
}

function thicknessOf(line: QuantityLineDto): string {
  const layers = line.layers && line.layers.length > 1 ? ` (${line.layers.join(' + ')})` : '';
  return line.kind === 'coating' ? `DFT ${formatFilmThickness(line.thickness)}` : formatThickness(line.thickness, line.thicknessUnit) + layers;
}

/** What the applicator works from: zone by zone, one row for each thickness. */
function applicationSection(snapshot: ScheduleSnapshot, names: ReadonlyMap<string, string>): Content[] {
  const zones = new Map(snapshot.zones.map((zone) => [zone.id, `${zone.code} ${zone.name}`]));
  const levels = new Map(snapshot.levels.map((level) => [level.id, level.code]));
  return [
    schedule<QuantityLineDto>([
      { head: 'Level', width: 40, value: (l) => levels.get(l.levelId) ?? '' },
      { head: 'Zone', width: '*', value: (l) => zones.get(l.zoneId) ?? '' },
      { head: 'System', width: 100, value: (l) => names.get(l.productId) ?? '' },
      { head: 'Members', width: 84, value: (l) => `${memberTypeNames[l.memberType]}${l.profile === 'hollow' ? ', hollow' : ''}` },
      { head: 'Applied', width: 44, value: (l) => (l.onSite ? 'on site' : 'off site') },
      { head: 'Thickness', width: 82, right: true, value: thicknessOf },
      { head: 'WFT in all', width: 50, right: true, value: (l) => formatFilmThickness(l.wetFilmUm === null ? null : Number(l.wetFilmUm)) },
      { head: 'Coats', width: 28, right: true, value: (l) => formatNumber(l.coats) },
      { head: 'Pieces', width: 32, right: true, value: (l) => formatNumber(l.pieces) },
      { head: 'Net m²', width: 48, right: true, value: (l) => formatDecimal(l.netM2) },
      { head: 'Litres', width: 44, right: true, value: (l) => formatDecimal(l.litres) },
    ], snapshot.quantities.lines, { title: 'Application by zone, system and thickness' }),
  ];
}

interface PurchaseRow { product: string; kind: string; what: string; count: string; note: string }

function purchaseRows(purchase: PurchaseDto, product: string): PurchaseRow[] {
  const lead = { product, kind: productKindNames[purchase.kind] };
  const missing = purchase.missing.map(sentence).join('; ');
  if (purchase.kind === 'coating') {
    const count = purchase.containers === null ? '–' : `${formatNumber(purchase.containers)} × ${purchase.containerL} L`;
    return [{ ...lead, what: purchase.litres ? `${formatDecimal(purchase.litres)} L` : '–', count, note: missing }];
  }
  if (purchase.kind === 'spray') return [{ ...lead, what: 'Bags', count: purchase.bags === null ? '–' : `${formatNumber(purchase.bags)}${purchase.bagKg ? ` × ${purchase.bagKg} kg` : ''}`, note: missing }];
  if (purchase.boards.length === 0) return [{ ...lead, what: '–', count: '–', note: missing }];
  return purchase.boards.map((plan) => ({
    ...lead, what: `${plan.thicknessMm} mm board, ${plan.sheetLengthMm} × ${plan.sheetWidthMm} mm`, count: `${formatNumber(plan.sheets)} sheets`,
    note: [`cutting waste ${formatNumber(plan.wasteFraction * 100, 1)} %, no plan can do with fewer than ${formatNumber(plan.leastSheets)}`, missing].filter(Boolean).join('; '),
  }));
}

function purchaseSection({ quantities }: ScheduleSnapshot, names: ReadonlyMap<string, string>): Content[] {
  return [
    schedule([
      { head: 'System', width: 150, value: (r) => r.product }, { head: 'Kind', width: 90, value: (r) => r.kind },
      { head: 'Material', width: 170, value: (r) => r.what }, { head: 'Whole units', width: 90, right: true, value: (r) => r.count },
      { head: 'Note', width: '*', value: (r) => r.note || '–' },
    ], quantities.purchases.flatMap((p) => purchaseRows(p, names.get(p.productId) ?? '')), { title: 'To buy, rounded up once for the whole project' }),
  ];
}
