import { sentence, sumDecimals } from '@mantlet/common';
import type { CuttingPlanDto, PurchaseDto, QuantitiesDto } from '@mantlet/common';
import { count, formatNumber } from '../../../lib/format.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';

/** One line of an order; a board product has one for each thickness. */
export interface OrderLine { key: string; product: string; delivery: string; what: string; net: { value: string | null; unit: string; decimals: number }; detail: string; reason: string }

const sheetWords = (plan: CuttingPlanDto) =>
  `${plan.sheetLengthMm} × ${plan.sheetWidthMm} mm, ${formatNumber(plan.wasteFraction * 100, 1)} % waste${plan.sheets > plan.leastSheets ? `; at least ${plan.leastSheets} by area` : ''}`;

type Order = Pick<OrderLine, 'what' | 'net' | 'detail'>;
/** Spray is bought by the bag; its net is the volume of the printed lines of that product and delivery. */
function ordersOf(p: PurchaseDto, lines: QuantitiesDto['lines']): Order[] {
  if (p.kind === 'board' && p.boards.length > 0) {
    return p.boards.map((plan) => ({ what: `${count(plan.sheets, 'sheet')} of ${plan.thicknessMm} mm`, net: { value: plan.sheetM2.toFixed(2), unit: 'm²', decimals: 0 }, detail: sheetWords(plan) }));
  }
  if (p.kind === 'coating') return [{ what: p.containers === null ? '' : count(p.containers, 'container'), net: { value: p.litres, unit: 'L', decimals: 1 }, detail: p.containerL === null ? '' : `${p.containerL} L each` }];
  const own = lines.filter((line) => line.productId === p.productId && (p.levelId === null || line.levelId === p.levelId));
  const net = { value: sumDecimals(own.map((line) => line.volumeM3)).toFixed(4), unit: 'm³', decimals: 1 };
  return [{ what: p.bags === null ? '' : count(p.bags, 'bag'), net, detail: p.bagKg === null ? '' : `${p.bagKg} kg each` }];
}

export function orderLines({ purchases, lines, names }: Pick<QuantitiesDto, 'purchases' | 'lines' | 'names'>): OrderLine[] {
  return purchases.flatMap((p) => ordersOf(p, lines).map((order): OrderLine => ({
    ...order, key: `${p.productId} ${p.levelId ?? ''} ${order.what}`, product: names[p.productId] ?? 'Product',
    delivery: p.levelId === null ? 'Whole project' : names[p.levelId] ?? 'Level', reason: p.missing.map(sentence).join(' '),
  })));
}

/** What to order: whole containers, bags and sheets, rounded up once for each product and delivery. */
export function Purchases({ data }: { data: QuantitiesDto }) {
  const lines = orderLines(data);
  const byLevel = data.purchases.some((p) => p.levelId !== null);
  return (
    <ScheduleTable<OrderLine>
      caption="What to order" rows={lines} rowKey={(l) => l.key} sticky={false}
      columns={[
        { title: 'Product', foldLabel: '', className: 'mt-fold-head', key: 'product', render: (_, l) => l.product },
        ...(byLevel ? [{ title: 'Delivery', key: 'delivery', render: (_: unknown, l: OrderLine) => l.delivery }] : []),
        { title: 'Order', key: 'what', render: (_, l) => l.what ? <span className="mt-strong">{l.what}</span> : <span className="mt-attention">{l.reason || 'Not determined'}</span> },
        { title: 'Net', key: 'net', numeric: true, render: (_, l) => <Quantity value={l.net.value} unit={l.net.unit} decimals={l.net.decimals} what="Net" reason={l.reason || 'not counted for this kind'} /> },
        { title: 'Each', key: 'detail', render: (_, l) => <span className="mt-sub">{l.detail}</span> },
      ]}
    />
  );
}
