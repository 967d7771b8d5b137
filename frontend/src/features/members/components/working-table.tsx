import type { WorkingStepDto } from '@mantlet/common';
import { SymbolText } from '../../../ui/drawing/symbol-text.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { resultText, workingLine } from '../working.js';

type Row = WorkingStepDto & { step: number };

function Equation({ row }: { row: Row }) {
  const { equation, numbers, rest } = workingLine(row);
  return (
    <>
      {equation && <span className="mt-working-equation"><SymbolText text={equation} /></span>}
      {numbers && <span className="mt-working-numbers">= <SymbolText text={numbers} /></span>}
      {rest.length > 0 && (
        <span className="mt-working-numbers">
          with {rest.map(({ symbol, text }, i) => <span key={symbol}>{i > 0 && ', '}<SymbolText text={symbol} /> = {text}</span>)}
        </span>
      )}
      {row.note && <span className="mt-working-note"><SymbolText text={row.note} /></span>}
    </>
  );
}

const columns: ScheduleColumn<Row>[] = [
  { title: 'Step', dataIndex: 'step', width: 56 },
  { title: 'What', dataIndex: 'what', width: 230 },
  { title: 'Working', key: 'working', render: (_, row) => <Equation row={row} /> },
  { title: 'Value', key: 'value', numeric: true, width: 120, render: (_, row) => <span className="mt-strong mt-quantity">{resultText(row)}</span> },
  { title: 'Source', dataIndex: 'source', width: 230, render: (source: string) => <span className="mt-sub">{source}</span> },
];

/** Every number of the result, clause by clause, with the figures put in. */
export function WorkingTable({ working }: { working: readonly WorkingStepDto[] }) {
  return (
    <Panel flush title="Working" className="mt-working">
      <ScheduleTable<Row> caption="Working, step by step" sticky={false} columns={columns} rows={working.map((w, i) => ({ ...w, step: i + 1 }))} rowKey={(r) => String(r.step)} empty="There is nothing to work out yet." />
    </Panel>
  );
}
