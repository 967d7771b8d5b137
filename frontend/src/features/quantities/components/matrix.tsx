import type { QuantitiesDto, QuantityTotals, SplitKey } from '@mantlet/common';
import { splitKeyNames } from '@mantlet/common';
import { Quantity } from '../../../ui/quantity.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { labelOf, measureKeys, measures, reasonFor, unitOf } from '../measures.js';
import type { MeasureKey } from '../measures.js';
import { inOrder, keyName } from '../quantity-words.js';

interface Row { key: string; name: string; total: QuantityTotals; last: boolean }
interface TableProps { data: QuantitiesDto; rows: SplitKey; columns: SplitKey }

function Amount({ totals, measure, currency, where }: { totals: QuantityTotals | undefined; measure: MeasureKey; currency: string; where: string }) {
  const { field, places } = measures[measure];
  return <Quantity value={totals?.[field]} decimals={places} unit={unitOf(measure, currency)} bare what={`${measures[measure].name}, ${where}`} reason={reasonFor(totals, measure)} />;
}

function rowsOf({ split, names }: QuantitiesDto, by: SplitKey): Row[] {
  const totals = new Map(split.rows.map((r) => [r.key, r.totals]));
  const rows = inOrder(by, split.rows.map((r) => r.key)).flatMap((key): Row[] => {
    const total = totals.get(key);
    return total ? [{ key, name: keyName(by, key, names), total, last: false }] : [];
  });
  return [...rows, { key: 'total', name: 'Total', total: split.total, last: true }];
}

/** On a narrow screen a row is a list of named values, in which what a floor has none of need not be said. */
const foldsAway = (value: string | null | undefined, row: Row) => (value == null && !row.last ? { className: 'mt-num mt-fold-hide' } : {});
const totalClass = (row: Row) => (row.last ? 'mt-row-total' : '');

/** One measure over two splits. Each cell is a sum of the same printed lines, so both totals and every other split agree. */
export function Matrix({ data, rows, columns, measure }: TableProps & { measure: MeasureKey }) {
  const { split, names, currency } = data;
  const cells = new Map(split.cells.map((c) => [`${c.row}\n${c.column}`, c.totals]));
  const columnTotals = new Map(split.columns.map((c) => [c.key, c.totals]));
  const keys = inOrder(columns, split.columns.map((c) => c.key));
  const cellColumns = keys.map((key): ScheduleColumn<Row> => ({
    title: keyName(columns, key, names), key, numeric: true, width: 122,
    onCell: (row) => foldsAway((row.last ? columnTotals.get(key) : cells.get(`${row.key}\n${key}`))?.[measures[measure].field], row),
    render: (_, row) => <Amount totals={row.last ? columnTotals.get(key) : cells.get(`${row.key}\n${key}`)} measure={measure} currency={currency} where={`${row.name}, ${keyName(columns, key, names)}`} />,
  }));
  return (
    <ScheduleTable<Row>
      caption={`${labelOf(measure, currency)}, ${splitKeyNames[rows].toLowerCase()} by ${splitKeyNames[columns].toLowerCase()}`} rows={rowsOf(data, rows)} rowKey={(r) => r.key} rowClassName={totalClass} minWidth={320 + keys.length * 122} sticky={false}
      columns={[
        { title: splitKeyNames[rows], key: 'name', width: 200, className: 'mt-fold-head', foldLabel: '', render: (_, r) => r.name },
        ...cellColumns,
        { title: 'Total', key: 'sum', numeric: true, width: 120, render: (_, r) => <span className="mt-strong"><Amount totals={r.total} measure={measure} currency={currency} where={r.name} /></span> },
      ]}
    />
  );
}

/** Every measure by the row split. */
export function AllMeasures({ data, rows }: Pick<TableProps, 'data' | 'rows'>) {
  const { currency } = data;
  return (
    <ScheduleTable<Row>
      caption={`All quantities by ${splitKeyNames[rows].toLowerCase()}`} rows={rowsOf(data, rows)} rowKey={(r) => r.key} rowClassName={totalClass} minWidth={900} sticky={false}
      columns={[
        { title: splitKeyNames[rows], key: 'name', width: 200, className: 'mt-fold-head', foldLabel: '', render: (_, r) => r.name },
        { title: 'Pieces', key: 'pieces', numeric: true, width: 80, render: (_, r) => <Quantity value={r.total.pieces} what={`Pieces of steel, ${r.name}`} /> },
        ...measureKeys.map((measure): ScheduleColumn<Row> => ({ title: labelOf(measure, currency), key: measure, numeric: true, width: 118, onCell: (r) => foldsAway(r.total[measures[measure].field], r), render: (_, r) => <Amount totals={r.total} measure={measure} currency={currency} where={r.name} /> })),
      ]}
    />
  );
}
