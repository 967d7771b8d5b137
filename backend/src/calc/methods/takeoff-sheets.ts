import { Decimal, allocateDecimal, message, roundDecimal } from '@mantlet/common';
import type { CuttingPlanDto, Message } from '@mantlet/common';
import { cuttingPlan } from './cutting-plan.js';
import { PieceList, memberPieces } from './takeoff-boards.js';
import type { LineGroup, LineSheets } from './takeoff-lines.js';
import type { TakeoffOptions, TakeoffProduct } from './takeoff-types.js';

export interface SheetOrder {
  plans: CuttingPlanDto[];
  missing: Message[];
  /** by position of the line in the delivery */
  lines: LineSheets[];
}

function groupPieces(group: LineGroup, endLapMm: number, sheet: { lengthMm: number; widthMm: number }): PieceList | Message {
  const list = new PieceList();
  for (const m of group.members) {
    if (!m.box) return message('product.no-box', { mark: m.mark });
    list.addAll(memberPieces({ box: m.box, layers: m.layers ?? [m.thickness], lengthMm: m.lengthMm, quantity: m.quantity }, endLapMm, sheet));
  }
  return list;
}

/**
 * Cuts all board of one product and delivery from stock sheets, a plan for each thickness of sheet, and shares the sheets used over the
 * lines by the board they hold. The shares, waste included, sum to the sheets exactly.
 */
export function orderSheets(product: TakeoffProduct, groups: readonly LineGroup[], options: TakeoffOptions): SheetOrder {
  const { sheetLengthMm, sheetWidthMm } = product.supply;
  const refuse = (reason: Message): SheetOrder => ({ plans: [], missing: [reason], lines: groups.map(() => ({ sheetM2: null, missing: [reason] })) });
  if (sheetLengthMm === null || sheetWidthMm === null) return refuse(message('product.supply-missing', { product: product.name, what: 'sheet size' }));
  const sheet = { lengthMm: Math.max(sheetLengthMm, sheetWidthMm), widthMm: Math.min(sheetLengthMm, sheetWidthMm) };
  const lists: PieceList[] = [];
  for (const group of groups) {
    const pieces = groupPieces(group, options.deductions.endLapMm, sheet);
    if (!(pieces instanceof PieceList)) return refuse(pieces);
    lists.push(pieces);
  }
  const all = new PieceList();
  for (const list of lists) all.addAll(list);
  const shares = groups.map(() => new Decimal(0));
  const plans = all.entries().map(([thicknessMm, pieces]) => {
    const plan = cuttingPlan(pieces, thicknessMm, sheet, options.kerfMm);
    const weights = lists.map((list) => list.areaM2(thicknessMm));
    allocateDecimal(roundDecimal(plan.sheetM2, 2), weights, 2).forEach((share, i) => {
      shares[i] = (shares[i] as Decimal).plus(share);
    });
    return plan;
  });
  return { plans, missing: [], lines: shares.map((sheetM2) => ({ sheetM2, missing: [] })) };
}
