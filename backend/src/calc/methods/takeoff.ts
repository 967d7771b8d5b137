import { Decimal, message, roundMoney, sumDecimals } from '@mantlet/common';
import type { Message, PurchaseDto, QuantityLineDto } from '@mantlet/common';
import { groupLines, lineOf } from './takeoff-lines.js';
import type { LineGroup } from './takeoff-lines.js';
import { orderSheets } from './takeoff-sheets.js';
import type { SheetOrder } from './takeoff-sheets.js';
import type { TakeoffMember, TakeoffOptions, TakeoffProduct } from './takeoff-types.js';

export { boxOf, girthGrowth, memberAreas } from './takeoff-area.js';
export { splitQuantities, totalOf } from './takeoff-split.js';
export { defaultKerfMm } from './takeoff-types.js';
export type { BoxSides, TakeoffMember, TakeoffOptions, TakeoffProduct } from './takeoff-types.js';

export interface Takeoff {
  lines: QuantityLineDto[];
  purchases: PurchaseDto[];
}

interface Delivery {
  product: TakeoffProduct;
  levelId: string | null;
  groups: LineGroup[];
}

function deliveriesOf(groups: readonly LineGroup[], by: TakeoffOptions['delivery']): Delivery[] {
  const deliveries = new Map<string, Delivery>();
  for (const group of groups) {
    const levelId = by === 'level' ? (group.members[0]?.levelId ?? null) : null;
    const key = `${group.product.id}|${levelId ?? ''}`;
    const delivery = deliveries.get(key);
    if (delivery) delivery.groups.push(group);
    else deliveries.set(key, { product: group.product, levelId, groups: [group] });
  }
  return [...deliveries.values()];
}

/** Whole containers or bags of a delivery: rounded up once, here. */
function packages(amounts: Decimal, each: number): number {
  return amounts.div(each).ceil().toNumber();
}

function coatingPurchase(product: TakeoffProduct, lines: readonly QuantityLineDto[]): Pick<PurchaseDto, 'litres' | 'containers' | 'missing'> {
  const missing: Message[] = [];
  if (lines.some((l) => l.litres === null)) {
    return { litres: null, containers: null, missing: [message('product.supply-missing', { product: product.name, what: 'volume solids' })] };
  }
  const litres = sumDecimals(lines.map((l) => l.litres as string));
  const { containerL } = product.supply;
  if (containerL === null) missing.push(message('product.supply-missing', { product: product.name, what: 'container size' }));
  return { litres: litres.toFixed(2), containers: containerL === null ? null : packages(litres, containerL), missing };
}

function sprayPurchase(product: TakeoffProduct, lines: readonly QuantityLineDto[]): Pick<PurchaseDto, 'bags' | 'missing'> {
  const { bagYieldM3, lossFraction } = product.supply;
  if (bagYieldM3 === null) return { bags: null, missing: [message('product.supply-missing', { product: product.name, what: 'bag yield' })] };
  const practical = sumDecimals(lines.map((l) => l.volumeM3)).div(new Decimal(1).minus(lossFraction));
  return { bags: packages(practical, bagYieldM3), missing: [] };
}

function purchaseOf(delivery: Delivery, lines: readonly QuantityLineDto[], sheets: SheetOrder | null): PurchaseDto {
  const { product, levelId } = delivery;
  const { supply, kind } = product;
  const none = {
    productId: product.id, levelId, kind, litres: null, containers: null, containerL: null, bags: null, bagKg: null, boards: [], missing: [],
  };
  if (kind === 'coating') return { ...none, containerL: supply.containerL, ...coatingPurchase(product, lines) };
  if (kind === 'spray') return { ...none, bagKg: supply.bagKg, ...sprayPurchase(product, lines) };
  return { ...none, boards: sheets?.plans ?? [], missing: sheets?.missing ?? [] };
}

/**
 * Quantities of protected members: printed lines, and what to order. Lines are decimals of fixed places; every total and split is a sum
 * of them (see takeoff-split), so that all agree to the last digit. What the product's supply data lack is null, with the reason.
 * @throws RangeError where a member names a product that is not given
 */
export function takeoff(members: readonly TakeoffMember[], products: readonly TakeoffProduct[], options: TakeoffOptions): Takeoff {
  const groups = groupLines(members, new Map(products.map((p) => [p.id, p])));
  const lines: QuantityLineDto[] = [];
  const purchases: PurchaseDto[] = [];
  for (const delivery of deliveriesOf(groups, options.delivery)) {
    const sheets = delivery.product.kind === 'board' ? orderSheets(delivery.product, delivery.groups, options) : null;
    const printed = delivery.groups.map((g, i) => lineOf(g, sheets?.lines[i] ?? { sheetM2: null, missing: [] }, options));
    lines.push(...printed);
    purchases.push(purchaseOf(delivery, printed, sheets));
  }
  return { lines, purchases };
}

/** The mark-up on a printed total, itself printed, and both together. */
export function withMarkUp(cost: string | null, markUpPercent: string, places: number): { markUp: string | null; total: string | null } {
  if (cost === null) return { markUp: null, total: null };
  const markUp = roundMoney(new Decimal(cost).times(markUpPercent).div(100), places);
  return { markUp: markUp.toFixed(places), total: markUp.plus(cost).toFixed(places) };
}
