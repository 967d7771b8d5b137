import { Link } from 'react-router-dom';
import type { MemberRowDto } from '@mantlet/common';
import { formatLimitTemperature, memberTypeNames } from '@mantlet/common';
import { Quantity } from '../../../ui/quantity.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { StatusWord } from '../../../ui/status-word.js';
import type { MemberFilter } from '../member-filter.js';
import { openReason, rowResult, rowState } from '../member-words.js';

const whyNone = (row: MemberRowDto) => (row.verdict === null ? 'not assessed yet' : row.sentence);

function CriticalTemperature({ row }: { row: MemberRowDto }) {
  const { criticalTemperatureC: at } = row;
  return <span className="mt-quantity" title={at === null ? `Critical temperature: ${whyNone(row)}` : `Critical temperature: ${formatLimitTemperature(at)}${row.assumed ? ', assumed' : ''}`}>{at === null ? '–' : formatLimitTemperature(at).replace(/ °C$/, '')}</span>;
}

function Result({ row, aboveC }: { row: MemberRowDto; aboveC: number }) {
  const why = openReason(row, aboveC);
  return <StatusWord kind={rowState(row)}>{rowResult(row)}{why && <span className="mt-small mt-why">{why}</span>}</StatusWord>;
}

/** The schedule of members. Keys of sortable columns are the server's sort keys; the sorter's state comes from the address. */
export function memberColumns(projectId: string, filter: MemberFilter, search: string, secondSignatureAboveC: number): ScheduleColumn<MemberRowDto>[] {
  const sorted = (key: NonNullable<MemberFilter['sort']>) => ({
    key, sorter: true, showSorterTooltip: false,
    sortOrder: (filter.sort ?? 'mark') === key ? (filter.direction === 'desc' ? ('descend' as const) : ('ascend' as const)) : null,
  });
  return [
    { ...sorted('mark'), title: 'Mark', width: 96, render: (_, r) => <Link className="mt-strong" to={`/projects/${projectId}/members/${r.id}`} state={{ list: search }}>{r.mark}</Link> },
    { ...sorted('level'), title: 'Level', width: 66, render: (_, r) => r.levelCode },
    { ...sorted('zone'), title: 'Zone', width: 66, render: (_, r) => r.zoneCode },
    { ...sorted('type'), title: 'Type', width: 124, render: (_, r) => memberTypeNames[r.memberType] },
    { ...sorted('section'), title: 'Section', width: 134, render: (_, r) => r.section },
    { key: 'grade', title: 'Grade', width: 62, className: 'mt-sub', render: (_, r) => r.grade },
    { ...sorted('length'), title: 'Length, m', foldLabel: 'Length, m', numeric: true, width: 88, render: (_, r) => <Quantity value={r.lengthMm / 1000} decimals={3} unit="m" bare what="Length" /> },
    { ...sorted('quantity'), title: 'No.', foldLabel: 'Number off', numeric: true, width: 56, render: (_, r) => r.quantity },
    { ...sorted('sectionFactor'), title: <>A/V, m<sup>−1</sup></>, foldLabel: 'A/V, 1/m', numeric: true, width: 82, render: (_, r) => <Quantity value={r.sectionFactorPerM} unit="1/m" bare what="Section factor" reason={whyNone(r)} /> },
    { ...sorted('criticalTemperature'), title: <>θ<sub>cr</sub>, °C</>, foldLabel: 'Critical temperature, °C', numeric: true, width: 74, render: (_, r) => <CriticalTemperature row={r} /> },
    { ...sorted('verdict'), title: 'Result', render: (_, r) => <Result row={r} aboveC={secondSignatureAboveC} /> },
  ];
}
