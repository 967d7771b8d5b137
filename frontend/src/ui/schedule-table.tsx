import { Table } from 'antd';
import type { TableProps } from 'antd';
import type { ColumnType } from 'antd/es/table';
import type { ReactNode } from 'react';
import type { TermName } from '../lib/terms.js';
import { Term } from './term.js';
import { usePrinting } from './use-printing.js';

export interface ScheduleColumn<T> extends ColumnType<T> {
  /** right-aligned, tabular figures */
  numeric?: boolean;
  /** name of the cell when the table folds on a narrow screen; the title if that is text */
  foldLabel?: string;
  /** the trade word that the title is, explained on it */
  term?: TermName;
}

interface ScheduleTableProps<T> extends Omit<TableProps<T>, 'columns' | 'dataSource' | 'rowKey' | 'caption' | 'title'> {
  /** accessible name of the table */
  caption: string;
  columns: ScheduleColumn<T>[];
  rows: readonly T[];
  rowKey: (row: T) => string;
  /** below 640 px each row becomes a block of named values; false keeps columns and scrolls sideways */
  fold?: boolean;
  empty?: ReactNode;
  /** below this the table scrolls sideways instead of squeezing its columns (wider than the fold only) */
  minWidth?: number;
}

function withSchedule<T>(column: ScheduleColumn<T>): ColumnType<T> {
  const { numeric, foldLabel, term, ...rest } = column;
  const label = foldLabel ?? (typeof column.title === 'string' ? column.title : '');
  return {
    ...rest,
    ...(term && typeof rest.title !== 'function' ? { title: <Term name={term}>{rest.title}</Term> } : {}),
    ...(numeric ? { align: 'right' as const } : {}),
    className: `${numeric ? 'mt-num ' : ''}${column.className ?? ''}`,
    // the fold shows cells as blocks; explicit roles keep the table a table for assistive technology
    onCell: (row, index) => ({ role: 'cell', 'data-label': label, ...column.onCell?.(row, index) }) as React.TdHTMLAttributes<HTMLElement>,
  };
}

/** antd's table set like a drawing schedule: hairlines, small head, sticky below the title strip, folding on a phone. */
export function ScheduleTable<T extends object>({ caption, columns, rows, rowKey, fold = true, empty, minWidth, onRow, className, ...rest }: ScheduleTableProps<T>) {
  // a head that stands still while the page scrolls is a table of its own; on paper it heads every sheet
  const printing = usePrinting();
  return (
    <div className={`mt-schedule ${fold ? 'mt-schedule-fold' : ''} ${className ?? ''}`} role="group" aria-label={caption}>
      <Table<T>
        size="small"
        pagination={false}
        sticky={printing || rest.virtual || rest.scroll?.y ? false : { offsetHeader: 54 }}
        {...(minWidth && !printing ? { scroll: { x: minWidth } } : {})}
        columns={columns.map(withSchedule)}
        dataSource={rows as T[]}
        rowKey={rowKey}
        {...(empty ? { locale: { emptyText: empty } } : {})}
        onRow={(row, index) => ({ role: 'row', ...onRow?.(row, index) })}
        {...rest}
        {...(printing ? { sticky: false } : {})}
      />
    </div>
  );
}
