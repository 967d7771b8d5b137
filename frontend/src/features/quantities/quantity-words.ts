import { memberTypeNames, roundDecimal, sumDecimals } from '@mantlet/common';
import type { MemberType, ProductKind, QuantitiesDto, SplitKey } from '@mantlet/common';
import { formatNumber } from '../../lib/format.js';

const own = (q: Pick<QuantitiesDto, 'lines'>, kind: ProductKind) => q.lines.filter((line) => line.kind === kind);
const rounded = (values: readonly string[], places: number) => formatNumber(roundDecimal(sumDecimals(values), places).toFixed(places), places);

/** "3118 m² of coating, 2846 L; 298 sheets of board; 21.4 m³ of spray" */
export function quantitiesHeading(q: Pick<QuantitiesDto, 'lines' | 'purchases'> & Partial<Pick<QuantitiesDto, 'unassessed'>>): string {
  if (q.unassessed) return `Not complete: ${formatNumber(q.unassessed)} ${q.unassessed === 1 ? 'member is' : 'members are'} being recalculated`;
  const parts: string[] = [];
  const coating = own(q, 'coating');
  if (coating.length > 0) {
    const litres = q.purchases.filter((p) => p.kind === 'coating').map((p) => p.litres);
    const known = litres.filter((l) => l !== null);
    // litres are bought in whole numbers, never fewer than are needed: as on the Building page and in the schedule
    const enough = formatNumber(sumDecimals(known).ceil().toNumber());
    parts.push(`${rounded(coating.map((l) => l.netM2), 0)} m² of coating${litres.length > 0 && known.length === litres.length ? `, ${enough} L` : ''}`);
  }
  const board = own(q, 'board');
  if (board.length > 0) {
    const bought = q.purchases.filter((p) => p.kind === 'board');
    const sheets = bought.reduce((sum, p) => sum + p.boards.reduce((n, plan) => n + plan.sheets, 0), 0);
    const known = bought.length > 0 && bought.every((p) => p.boards.length > 0 && p.missing.length === 0);
    parts.push(known ? `${formatNumber(sheets)} ${sheets === 1 ? 'sheet' : 'sheets'} of board` : `${rounded(board.map((l) => l.netM2), 0)} m² of board`);
  }
  const spray = own(q, 'spray');
  if (spray.length > 0) parts.push(`${rounded(spray.map((l) => l.volumeM3), 1)} m³ of spray`);
  return parts.length > 0 ? parts.join('; ') : 'Nothing to apply yet';
}

/** A split's key as people read it; ids by their names. */
export function keyName(split: SplitKey, key: string, names: Readonly<Record<string, string>>): string {
  if (split === 'member-type') return memberTypeNames[key as MemberType] ?? key;
  if (split === 'profile') return key === 'open' ? 'Open' : 'Hollow';
  if (split === 'application') return key === 'on-site' ? 'On site' : 'Off site';
  return split === 'thickness' ? key : names[key] ?? key;
}

/** Thicknesses rise, films before boards; every other split comes in the server's order, from the ground up. */
export function inOrder(split: SplitKey, keys: readonly string[]): string[] {
  if (split !== 'thickness') return [...keys];
  const unit = (key: string) => (key.endsWith('µm') ? 0 : 1);
  return [...keys].sort((a, b) => unit(a) - unit(b) || Number.parseFloat(a) - Number.parseFloat(b));
}
