import type { BuildingDto } from '@mantlet/common';
import { Panel } from '../../../ui/panel.js';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';

type Line = BuildingDto['protection'][number];
const attention = (line: Line) => (line.kind === 'open' && line.members > 0 ? 'mt-attention' : '');

export function ProtectionTotals({ lines }: { lines: readonly Line[] }) {
  if (lines.length === 0) return null;
  return (
    <Panel flush label="Protection">
      <ScheduleTable
        caption="Protection totals" rows={lines} rowKey={(l) => `${l.kind} ${l.label}`} sticky={false} fold={false} className="mt-tight"
        columns={[
          { title: 'Protection', key: 'label', render: (_, l) => <span className={attention(l)}>{l.label}</span> },
          { title: 'Members', key: 'members', numeric: true, width: 70, render: (_, l) => <span className={attention(l)}><Quantity value={l.members} what="Members" /></span> },
          { title: 'Area m²', key: 'area', numeric: true, width: 72, render: (_, l) => <Quantity value={l.areaM2} decimals={1} unit="m²" bare what="Net area" reason={l.kind === 'bare' ? 'bare steel is not covered' : 'not determined'} /> },
          { title: 'Net', key: 'net', numeric: true, width: 104, render: (_, l) => l.net?.replaceAll(' ', '\u00a0') ?? <span aria-hidden="true">–</span> },
        ]}
      />
    </Panel>
  );
}
