import { formatNumber } from '../lib/format.js';

interface QuantityProps {
  /** null: no justified number, shown as a dash */
  value: number | string | null | undefined;
  unit?: string;
  decimals?: number;
  /** what the number is, said on hover: "Section factor A/V" */
  what?: string;
  /** why there is no number */
  reason?: string | undefined;
  /** leave the unit to the column's head */
  bare?: boolean;
}

/** A number with its unit in tabular figures, and what it is on hover. */
export function Quantity({ value, unit, decimals = 0, what, reason, bare = false }: QuantityProps) {
  const missing = value == null || value === '';
  const text = formatNumber(missing ? null : value, decimals);
  const title = [what, missing ? reason ?? 'not determined' : unit && `${text} ${unit}`].filter(Boolean).join(': ');
  return (
    <span className="mt-quantity" title={title || undefined}>
      {missing ? <><span aria-hidden="true">–</span><span className="mt-sr">{reason ?? 'not determined'}</span></> : text}
      {unit && !bare && !missing ? <span className="mt-unit">{'\u00a0'}{unit}</span> : null}
    </span>
  );
}
