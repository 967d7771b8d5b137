import { productKindNames } from '@mantlet/common';
import type { SiteMaterialDto } from '@mantlet/common';
import { formatNumber } from '../../../lib/format.js';
import { materialWords } from '../site-words.js';

interface MaterialsProps { materials: readonly SiteMaterialDto[]; caption: string; currency: string; prices: boolean }

/** Materials of a floor or of the whole job, a line each. */
export function Materials({ materials, caption, currency, prices }: MaterialsProps) {
  return (
    <table className="mt-site-table mt-site-materials">
      <caption className="mt-sr">{caption}</caption>
      <thead><tr><th scope="col">Product</th><th scope="col">Kind</th><th scope="col">Take</th><th scope="col" className="mt-num">Area m²</th>{prices && <th scope="col" className="mt-num">{currency}</th>}</tr></thead>
      <tbody>
        {materials.map((m) => (
          <tr key={`${m.productName} ${m.thickness ?? ''}`}>
            <th scope="row">{m.productName}{m.thickness && `, ${m.thickness}`}</th>
            <td>{productKindNames[m.kind]}</td>
            <td>{materialWords(m)}{m.wastePercent !== null && <span className="mt-sub">, {m.wastePercent} % waste</span>}</td>
            <td className="mt-num" data-unit="m²">{formatNumber(m.areaM2, 1)}</td>
            {prices && <td className="mt-num" data-unit={currency}>{m.money === null ? '' : formatNumber(m.money, 2)}</td>}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
