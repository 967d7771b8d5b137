import { Link } from 'react-router-dom';
import type { BuildingLevelDto } from '@mantlet/common';
import { fireCurveNames } from '@mantlet/common';
import { formatLevel } from '../../../lib/format.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';

/** The drawing's numbers as a table, for those who cannot or would rather not read the drawing. */
export function ZoneList({ levels, zoneHref }: { levels: readonly BuildingLevelDto[]; zoneHref: (zone: { id: string }) => string }) {
  const rows = [...levels].sort((a, b) => b.elevationM - a.elevationM).flatMap((level) => level.zones.map((zone) => ({ level, zone })));
  return (
    <details className="mt-details">
      <summary>The drawing as a table</summary>
      <ScheduleTable
        caption="Zones by level" rows={rows} rowKey={(r) => r.zone.id} sticky={false}
        columns={[
          { title: 'Zone', key: 'zone', render: (_, r) => <Link to={zoneHref(r.zone)}>{r.zone.code} {r.zone.name}</Link> },
          { title: 'Level', key: 'level', render: (_, r) => `${r.level.code} ${formatLevel(r.level.elevationM)} m` },
          { title: 'Period', key: 'period', render: (_, r) => `R ${r.zone.periodMin}, ${fireCurveNames[r.zone.curve]}` },
          { title: 'Area m²', key: 'area', numeric: true, render: (_, r) => <Quantity value={r.zone.unassessed ? null : r.zone.protectedAreaM2} decimals={1} unit="m²" bare what="Protected area" reason="being recalculated" /> },
          { title: 'Members', key: 'members', numeric: true, render: (_, r) => <Quantity value={r.zone.members} /> },
          { title: 'Settled', key: 'settled', numeric: true, render: (_, r) => <Quantity value={r.zone.settled} /> },
          { title: 'Open', key: 'open', numeric: true, render: (_, r) => <span className={r.zone.open ? 'mt-attention' : ''}><Quantity value={r.zone.open} /></span> },
          { title: 'Issued', key: 'issued', numeric: true, render: (_, r) => <Quantity value={r.zone.issuedMembers} /> },
        ]}
      />
    </details>
  );
}
