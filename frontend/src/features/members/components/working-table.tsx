import { App, Button } from 'antd';
import type { WorkingStepDto } from '@mantlet/common';
import { SymbolText } from '../../../ui/drawing/symbol-text.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import type { ScheduleColumn } from '../../../ui/schedule-table.js';
import { resultParts, workingAsText, workingLine } from '../working.js';

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

/** Figures stand under one another by their decimal mark, units under units. */
function Value({ row }: { row: Row }) {
  const parts = resultParts(row);
  if (!parts) return null;
  return <span className="mt-decimal"><span>{parts.whole}</span><span>{parts.fraction}</span><span className="mt-decimal-unit">{parts.unit}</span></span>;
}

const columns: ScheduleColumn<Row>[] = [
  { title: 'Step', dataIndex: 'step', width: 56 },
  { title: 'What', dataIndex: 'what', width: 230 },
  { title: 'Working', key: 'working', render: (_, row) => <Equation row={row} /> },
  { title: 'Value', key: 'value', numeric: true, width: 158, render: (_, row) => <Value row={row} /> },
  { title: 'Source', dataIndex: 'source', width: 230, render: (source: string) => <span className="mt-sub">{source}</span> },
];

/** Every number of the result, clause by clause, with the figures put in. */
export function WorkingTable({ working, heading }: { working: readonly WorkingStepDto[]; /** what the copied text is headed by */ heading: string }) {
  const { message } = App.useApp();
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(workingAsText(heading, working));
      void message.success('The working is copied as text');
    } catch {
      void message.error('Not copied: the browser does not allow it here. Select the table and copy it instead.');
    }
  };
  return (
    <Panel flush title="Working" className="mt-working" actions={working.length > 0 && <Button size="small" className="mt-noprint" onClick={() => { void copy(); }}>Copy as text</Button>}>
      <ScheduleTable<Row> caption="Working, step by step" sticky={false} columns={columns} rows={working.map((w, i) => ({ ...w, step: i + 1 }))} rowKey={(r) => String(r.step)} empty="There is nothing to work out yet." />
    </Panel>
  );
}
