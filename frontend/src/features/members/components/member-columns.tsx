import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { MemberRowDto, MemberSortKey } from '@mantlet/common';
import { exposureNames, formatLimitTemperature, formatThickness, memberTypeNames, wayNames } from '@mantlet/common';
import type { TermName } from '../../../lib/terms.js';
import { Quantity } from '../../../ui/quantity.js';
import { StatusWord } from '../../../ui/status-word.js';
import { openReason, rowResult, rowState } from '../member-words.js';

export interface MemberColumn {
  key: string;
  /** as it is called in lists and by screen readers */
  name: string;
  head?: ReactNode;
  /** the sentence behind its head */
  term?: TermName;
  sort?: MemberSortKey;
  numeric?: boolean;
  width: number;
  /** takes what is left of the width */
  grows?: boolean;
  cell: (row: MemberRowDto, context: { to: string; open: () => void; aboveC: number }) => ReactNode;
}

const whyNone = (row: MemberRowDto) => (row.verdict === null ? 'not assessed yet' : row.sentence);
const thickness = (row: MemberRowDto, value: number | null, what: string) => (
  <span className="mt-quantity" title={value === null || row.thicknessUnit === null ? `${what}: ${whyNone(row)}` : `${what}: ${formatThickness(value, row.thicknessUnit)}`}>
    {value === null || row.thicknessUnit === null ? '–' : formatThickness(value, row.thicknessUnit)}
  </span>
);

function CriticalTemperature({ row }: { row: MemberRowDto }) {
  const { criticalTemperatureC: at } = row;
  return <span className="mt-quantity" title={at === null ? `Critical temperature: ${whyNone(row)}` : `Critical temperature: ${formatLimitTemperature(at)}${row.assumed ? ', assumed' : ''}`}>{at === null ? '–' : formatLimitTemperature(at).replace(/ °C$/, '')}</span>;
}

/** The result and why it is open, in one line; the whole of it on hover, and always in the text that is read out. */
export function Result({ row, aboveC }: { row: MemberRowDto; aboveC: number }) {
  const why = openReason(row, aboveC);
  const words = why ? `${rowResult(row)}. ${why}` : rowResult(row);
  return <span className="mt-one-line" title={words}><StatusWord kind={rowState(row)}>{words}</StatusWord></span>;
}

export const memberColumns: readonly MemberColumn[] = [
  { key: 'mark', term: 'mark', name: 'Mark', sort: 'mark', width: 100, cell: (r, { to, open }) => <Link className="mt-strong" to={to} tabIndex={-1} onClick={open}>{r.mark}</Link> },
  { key: 'level', term: 'level', name: 'Level', sort: 'level', width: 62, cell: (r) => r.levelCode },
  { key: 'zone', term: 'zone', name: 'Zone', sort: 'zone', width: 66, cell: (r) => r.zoneCode },
  { key: 'type', name: 'Type', sort: 'type', width: 116, cell: (r) => memberTypeNames[r.memberType] },
  { key: 'section', name: 'Section', sort: 'section', width: 128, cell: (r) => r.section },
  { key: 'family', name: 'Section family', head: 'Family', sort: 'family', width: 80, cell: (r) => r.family },
  { key: 'grade', name: 'Steel grade', head: 'Grade', sort: 'grade', width: 68, cell: (r) => r.grade },
  { key: 'length', name: 'Length, m', sort: 'length', numeric: true, width: 84, cell: (r) => <Quantity value={r.lengthMm / 1000} decimals={3} unit="m" bare what="Length" /> },
  { key: 'quantity', name: 'Number off', head: 'No.', sort: 'quantity', numeric: true, width: 58, cell: (r) => r.quantity },
  { key: 'exposure', term: 'exposure', name: 'Exposure', sort: 'exposure', width: 180, cell: (r) => exposureNames[r.exposure] },
  { key: 'form', term: 'protection-form', name: 'Protection form', head: 'Form', sort: 'form', width: 80, cell: (r) => (r.protectionForm === 'boxed' ? 'Boxed' : 'Profile') },
  { key: 'sectionFactor', term: 'section-factor', name: 'A/V, 1/m', head: <>A/V, m<sup>−1</sup></>, sort: 'sectionFactor', numeric: true, width: 86, cell: (r) => <Quantity value={r.sectionFactorPerM} unit="1/m" bare what="Section factor" reason={whyNone(r)} /> },
  { key: 'criticalTemperature', term: 'critical-temperature', name: 'Critical temperature, °C', head: <>θ<sub>cr</sub>, °C</>, sort: 'criticalTemperature', numeric: true, width: 78, cell: (r) => <CriticalTemperature row={r} /> },
  { key: 'way', name: 'How its temperature came about', head: 'Temperature', sort: 'way', width: 170, cell: (r) => wayNames[r.way] },
  { key: 'utilisation', term: 'utilisation', name: 'Utilisation in fire', head: 'Utilisation', sort: 'utilisation', numeric: true, width: 92, cell: (r) => <Quantity value={r.utilisation} decimals={2} what="Utilisation in fire" reason="not calculated" /> },
  { key: 'period', term: 'period', name: 'Period, min', sort: 'period', numeric: true, width: 96, cell: (r) => r.periodMin },
  { key: 'required', term: 'required-thickness', name: 'Required thickness', head: 'Required', sort: 'thickness', numeric: true, width: 92, cell: (r) => thickness(r, r.requiredThickness, 'Required thickness') },
  { key: 'applied', term: 'target', name: 'Applied thickness', head: 'Applied', sort: 'applied', numeric: true, width: 92, cell: (r) => thickness(r, r.appliedThickness, 'Thickness by the zone’s policy') },
  { key: 'product', name: 'Product', sort: 'product', width: 150, cell: (r) => r.productName ?? '–' },
  { key: 'area', term: 'net-area', name: 'Protected area, m²', head: 'Area, m²', sort: 'area', numeric: true, width: 88, cell: (r) => <Quantity value={r.areaM2} decimals={1} unit="m²" bare what="Protected area" reason="nothing protected" /> },
  { key: 'note', name: 'Note', width: 200, cell: (r) => <span className="mt-one-line" title={r.note}>{r.note}</span> },
  { key: 'verdict', name: 'Result', sort: 'verdict', width: 225, grows: true, cell: (r, { aboveC }) => <Result row={r} aboveC={aboveC} /> },
];
export const usualColumns = ['mark', 'level', 'zone', 'type', 'section', 'grade', 'length', 'quantity', 'sectionFactor', 'criticalTemperature', 'verdict'];

const byKey = new Map(memberColumns.map((column) => [column.key, column]));
/** Columns as named in an address or kept: what is unknown or named twice is passed over; the mark is always there, first if it was left out. */
export function columnKeys(text: string | null): string[] | null {
  const keys = [...new Set((text ?? '').split(','))].filter((key) => byKey.has(key));
  return keys.length === 0 ? null : keys.includes('mark') ? keys : ['mark', ...keys];
}
export const columnsOf = (keys: readonly string[]): MemberColumn[] => keys.flatMap((key) => byKey.get(key) ?? []);
