import { Decimal } from 'decimal.js';
import { thousandsMark } from './format.js';

/** Decimal arithmetic for money and printed quantities: what is printed adds up to the last digit. */
export { Decimal };

export type DecimalLike = Decimal | string | number;

/** Rounds half away from zero, as invoices do. */
export function roundDecimal(value: DecimalLike, places: number): Decimal {
  return new Decimal(value).toDecimalPlaces(places, Decimal.ROUND_HALF_UP);
}

export function sumDecimals(values: Iterable<DecimalLike>): Decimal {
  let sum = new Decimal(0);
  for (const value of values) sum = sum.plus(value);
  return sum;
}

/** An amount in the currency's smallest printed unit; 2 places unless the currency says otherwise. */
export function roundMoney(amount: DecimalLike, places = 2): Decimal {
  return roundDecimal(amount, places);
}

/**
 * Shares a printed total out over lines in proportion to their weights, so that the printed shares sum to it exactly:
 * every share is rounded down and the remaining smallest units go to the largest remainders (ties to the earlier line).
 * @throws RangeError where a total above zero has no weight to go to
 */
export function allocateDecimal(total: Decimal, weights: readonly DecimalLike[], places: number): Decimal[] {
  const unit = new Decimal(10).pow(-places);
  const weightSum = sumDecimals(weights);
  if (weightSum.lte(0)) {
    if (total.isZero()) return weights.map(() => new Decimal(0));
    throw new RangeError('nothing to share the total over');
  }
  const exact = weights.map((w) => total.times(w).div(weightSum));
  const shares = exact.map((e) => e.toDecimalPlaces(places, Decimal.ROUND_FLOOR));
  let left = total.minus(sumDecimals(shares)).div(unit).round().toNumber();
  const order = exact.map((e, i) => ({ i, rest: e.minus(shares[i] ?? 0) })).sort((a, b) => b.rest.comparedTo(a.rest) || a.i - b.i);
  for (const { i } of order) {
    if (left <= 0) break;
    shares[i] = (shares[i] ?? new Decimal(0)).plus(unit);
    left -= 1;
  }
  return shares;
}

/** An amount with grouped thousands: 12345.6 and EUR → EUR 12,345.60 */
export function formatMoney(amount: DecimalLike | null | undefined, currency: string, places = 2): string {
  if (amount == null) return '–';
  const text = roundMoney(amount, places).toFixed(places);
  const negative = text.startsWith('-');
  const [whole = '0', fraction] = text.replace('-', '').split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, thousandsMark);
  return `${currency} ${negative ? '-' : ''}${grouped}${fraction ? `.${fraction}` : ''}`.trim();
}

/** A printed decimal quantity (a string from the server) with grouped thousands and its own decimals. */
export function formatDecimal(value: string | null | undefined): string {
  if (value == null) return '–';
  const [whole = '0', fraction] = value.split('.');
  return whole.replace(/\B(?=(\d{3})+$)/g, thousandsMark) + (fraction ? `.${fraction}` : '');
}
