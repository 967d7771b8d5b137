import { memberTypeNames } from '@mantlet/common';
import type { SiteItemDto, SiteZoneDto } from '@mantlet/common';
import { count, formatNumber } from '../../../lib/format.js';
import { Term } from '../../../ui/term.js';
import { groupItems } from '../site-words.js';
import type { ApplyGroup } from '../site-words.js';

function Item({ item, litres }: { item: SiteItemDto; litres: boolean }) {
  return (
    <tr>
      <th scope="row">{item.mark}</th>
      <td className="mt-num" data-of="pieces"><span className="mt-site-times">×</span>{item.quantity}</td>
      <td>{item.section}</td>
      <td>{memberTypeNames[item.memberType]}</td>
      <td>{item.faces}</td>
      <td className="mt-num" data-unit="m long">{formatNumber(item.lengthMm / 1000, 2)}</td>
      <td className="mt-num" data-unit="m²">{formatNumber(item.areaM2, 2)}</td>
      {litres && <td className="mt-num" data-unit="L">{item.litres === null ? '' : formatNumber(item.litres, 1)}</td>}
    </tr>
  );
}

/** One product at one thickness, and every member that gets it. An own table: its head repeats on every printed page. */
function Group({ group, zone }: { group: ApplyGroup; zone: SiteZoneDto }) {
  const litres = group.items.some((i) => i.kind === 'coating');
  return (
    <section className="mt-site-group" aria-label={`${group.how} of ${group.productName} in ${zone.code}`}>
      <header>
        <h4><span className="mt-site-how">{group.how}</span> <span>{group.productName}</span></h4>
        <p className="mt-sub">{count(group.items.reduce((n, i) => n + i.quantity, 0), 'piece')}, {formatNumber(group.areaM2, 1)} m²{group.litres === null ? '' : `, ${formatNumber(group.litres, 1)} L`}</p>
      </header>
      <table className="mt-site-table">
        <caption className="mt-sr">{group.how} of {group.productName}, zone {zone.code} {zone.name}</caption>
        <thead>
          <tr><th scope="col"><Term name="mark" /></th><th scope="col" className="mt-num">No.</th><th scope="col">Section</th><th scope="col">Member</th><th scope="col"><Term name="exposure">Sides to protect</Term></th><th scope="col" className="mt-num">Length m</th><th scope="col" className="mt-num">Area m²</th>{litres && <th scope="col" className="mt-num">Litres</th>}</tr>
        </thead>
        <tbody>{group.items.map((item) => <Item key={item.mark} item={item} litres={litres} />)}</tbody>
      </table>
    </section>
  );
}

export function ZoneWork({ zone }: { zone: SiteZoneDto }) {
  const groups = groupItems(zone.items);
  return (
    <section className="mt-site-zone" id={`zone-${zone.id}`} aria-labelledby={`zone-${zone.id}-name`}>
      <h3 id={`zone-${zone.id}-name`}>{zone.code} {zone.name} <span className="mt-sub">R {zone.periodMin}</span></h3>
      {groups.length === 0 && <p className="mt-sub">Nothing to apply in this zone.</p>}
      {groups.map((group) => <Group key={group.key} group={group} zone={zone} />)}
      {zone.bare.length > 0 && (
        <p className="mt-site-bare">
          <span className="mt-strong">Stays bare, leave uncoated: </span>
          {zone.bare.map((b) => `${b.mark}${b.quantity > 1 ? ` ×${b.quantity}` : ''} (${b.section})`).join(', ')}
        </p>
      )}
    </section>
  );
}
