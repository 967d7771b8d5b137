import { Link } from 'react-router-dom';
import type { MemberRowDto } from '@mantlet/common';
import { memberTypeNames } from '@mantlet/common';
import { Quantity } from '../../../ui/quantity.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import type { MemberFilter } from '../member-filter.js';
import { openReason, rowState } from '../member-words.js';

const whyNone = (row: MemberRowDto) => (row.verdict === null ? 'not assessed yet' : row.sentence);

function CriticalTemperature({ row }: { row: MemberRowDto }) {
  return (
    <>
      <Quantity value={row.criticalTemperatureC === null ? null : Math.floor(row.criticalTemperatureC)} unit="°C" bare what="Critical temperature" reason={whyNone(row)} />
      {row.assumed && <div className="mt-attention mt-small">assumed</div>}
    </>
  );
}

function Result({ row, aboveC }: { row: MemberRowDto; aboveC: number }) {
  const why = openReason(row, aboveC);
  return <StatusWord kind={rowState(row)}>{row.sentence}{why && <span className="mt-small mt-why">{why}</span>}</StatusWord>;
}

/** The schedule of members. Keys of sortable columns are the server's sort keys; the sorter's state comes from the address. */
export function memberColumns(projectId: string, filter: MemberFilter, search: string, secondSignatureAboveC: number): ScheduleColumn<MemberRowDto>[] {
  const sorted = (key: NonNullable<MemberFilter['sort']>) => ({
    key, sorter: true, showSorterTooltip: false,
    sortOrder: (filter.sort ?? 'mark') === key ? (filter.direction === 'desc' ? ('descend' as const) : ('ascend' as const)) : null,
  });
  return [
    { ...sorted('mark'), title: 'Mark', width: 112, render: (_, r) => <Link className="mt-strong" to={`/projects/${projectId}/members/${r.id}`} state={{ list: search }}>{r.mark}</Link> },
    { ...sorted('level'), title: 'Level', width: 72, render: (_, r) => r.levelCode },
    { ...sorted('zone'), title: 'Zone', width: 68, render: (_, r) => r.zoneCode },
    { ...sorted('type'), title: 'Type', width: 112, render: (_, r) => memberTypeNames[r.memberType] },
    { ...sorted('section'), title: 'Section', width: 172, render: (_, r) => <>{r.section} <span className="mt-sub">{r.grade}</span></> },
    { ...sorted('length'), title: 'Length, m', foldLabel: 'Length, m', numeric: true, width: 90, render: (_, r) => <Quantity value={r.lengthMm / 1000} decimals={3} unit="m" bare what="Length" /> },
    { ...sorted('quantity'), title: 'No.', foldLabel: 'Number off', numeric: true, width: 58, render: (_, r) => r.quantity },
    { ...sorted('sectionFactor'), title: <>A/V, m<sup>−1</sup></>, foldLabel: 'A/V, 1/m', numeric: true, width: 84, render: (_, r) => <Quantity value={r.sectionFactorPerM} unit="1/m" bare what="Section factor" reason={whyNone(r)} /> },
    { ...sorted('criticalTemperature'), title: <>θ<sub>cr</sub>, °C</>, foldLabel: 'Critical temperature, °C', numeric: true, width: 82, render: (_, r) => <CriticalTemperature row={r} /> },
    { ...sorted('verdict'), title: 'Result', render: (_, r) => <Result row={r} aboveC={secondSignatureAboveC} /> },
  ];
}
