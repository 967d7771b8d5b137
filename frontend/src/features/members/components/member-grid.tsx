import { Checkbox } from 'antd';
import { useEffect, useRef } from 'react';
import type { KeyboardEvent, MouseEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { memberTypeNames } from '@mantlet/common';
import type { MemberRowDto, MemberSortKey } from '@mantlet/common';
import { BehindTerm } from '../../../ui/term.js';
import type { MemberFilter } from '../member-filter.js';
import type { RowWindow } from '../use-row-window.js';
import { Result } from './member-columns.js';
import type { MemberColumn } from './member-columns.js';

export interface GridChoice { has: (id: string) => boolean; all: boolean; some: boolean; toggle: (index: number, reach: boolean) => void; toggleAll: () => void }
interface MemberGridProps {
  total: number;
  rowAt: (index: number) => MemberRowDto | undefined;
  stale: boolean;
  /** rows on screen could not be fetched */
  failed: boolean;
  columns: readonly MemberColumn[];
  filter: MemberFilter;
  sort: (key: MemberSortKey) => void;
  /** null where the reader may do nothing with many */
  choice: GridChoice | null;
  sheetOf: (id: string) => string;
  list: string;
  aboveC: number;
  rows: RowWindow;
  leave: (index: number) => void;
}

const stepOf = (key: string, pageRows: number, last: number): ((at: number) => number) | null => {
  switch (key) {
    case 'ArrowDown': return (at) => at + 1;
    case 'ArrowUp': return (at) => at - 1;
    case 'PageDown': return (at) => at + pageRows;
    case 'PageUp': return (at) => at - pageRows;
    case 'Home': return () => 0;
    case 'End': return () => last;
    default: return null;
  }
};

function SortButton({ column, on, down, sort }: { column: MemberColumn & { sort: MemberSortKey }; on: boolean; down: boolean; sort: (key: MemberSortKey) => void }) {
  const { term, name, head, sort: key } = column;
  const inside = <>{term ? <span className="mt-term">{head ?? name}</span> : head ?? name}<span aria-hidden="true" className="mt-grid-arrow">{on ? (down ? '▾' : '▴') : ''}</span></>;
  if (!term) return <button type="button" title={`Order by ${name}`} onClick={() => sort(key)}>{inside}</button>;
  return <BehindTerm name={term}>{(describedBy) => <button type="button" aria-describedby={describedBy} onClick={() => sort(key)}>{inside}</button>}</BehindTerm>;
}

function Head({ columns, filter, sort, choice, template, width }: Pick<MemberGridProps, 'columns' | 'filter' | 'sort' | 'choice'> & { template: string; width: string }) {
  const by = filter.sort ?? 'mark';
  return (
    <div role="rowgroup" className="mt-grid-head" style={{ width }}>
      <div role="row" aria-rowindex={1} className="mt-grid-row" style={{ gridTemplateColumns: template, width: '100%' }}>
        {choice && <span role="columnheader" className="mt-grid-check"><Checkbox aria-label="Choose all that are found" checked={choice.all} indeterminate={choice.some && !choice.all} onChange={choice.toggleAll} /></span>}
        {columns.map((column) => {
          const key = column.sort;
          const on = key !== undefined && by === key;
          const down = filter.direction === 'desc';
          return (
            <span key={column.key} role="columnheader" className={column.numeric ? 'mt-num' : undefined} aria-sort={on ? (down ? 'descending' : 'ascending') : undefined}>
              {key === undefined ? column.head ?? column.name : <SortButton column={{ ...column, sort: key }} on={on} down={down} sort={sort} />}
            </span>
          );
        })}
      </div>
    </div>
  );
}

/** The schedule of members as one long scroll. A row has the focus: arrows go on, Enter opens, Space chooses, with Shift from row to row. */
export function MemberGrid(props: MemberGridProps) {
  const { total, rowAt, stale, failed, columns, choice, sheetOf, list, aboveC, rows, leave } = props;
  const { narrow, virtualizer, scroller, active, setActive } = rows;
  const navigate = useNavigate();
  const wantsFocus = useRef(rows.restored);
  const body = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (!wantsFocus.current) return;
    const row = body.current?.querySelector<HTMLElement>(`[aria-rowindex="${active + 2}"]`);
    if (!row) return;
    wantsFocus.current = false;
    row.focus({ preventScroll: true });
  });
  // the row's own width: its longest text would otherwise widen the column that grows
  const width = `max(100%, ${columns.reduce((sum, c) => sum + c.width, choice ? 40 : 0)}px)`;
  const template = [choice ? '40px' : '', ...columns.map((c) => (c.grows ? `minmax(${c.width}px, 1fr)` : `minmax(${c.width}px, ${columns.some((x) => x.grows) ? `${c.width}px` : '1fr'})`))].join(' ');
  const goTo = (index: number) => {
    const next = Math.max(0, Math.min(total - 1, index));
    wantsFocus.current = true;
    setActive(next);
    virtualizer.scrollToIndex(next, { align: 'auto' });
    return next;
  };
  const open = (index: number) => {
    const row = rowAt(index);
    if (!row) return;
    leave(index);
    void navigate(sheetOf(row.id), { state: { list } });
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if ((event.target as HTMLElement).getAttribute('role') !== 'row' || event.altKey || event.metaKey) return;
    const step = stepOf(event.key, 15, total - 1);
    if (step) { const from = active; const to = goTo(step(active)); if (event.shiftKey && choice && to !== from) { if (!choice.has(rowAt(from)?.id ?? '')) choice.toggle(from, false); choice.toggle(to, true); } }
    else if (event.key === 'Enter') open(active);
    else if (event.key === ' ' && choice) choice.toggle(active, event.shiftKey);
    else return;
    event.preventDefault();
  };
  const onClick = (event: MouseEvent, index: number) => {
    setActive(index);
    if (event.shiftKey && choice) { event.preventDefault(); choice.toggle(index, true); }
  };
  const margin = narrow ? rows.margin : 0;
  const items = virtualizer.getVirtualItems();
  // the row with the focus stays in the tab order even while it is scrolled out of sight
  const focusable = items.some((item) => item.index === active) ? active : items[0]?.index ?? 0;
  return (
    <div ref={scroller} className={narrow ? 'mt-grid mt-grid-narrow' : 'mt-grid'} role="grid" aria-label="Members" aria-rowcount={total + 1} aria-multiselectable={choice ? true : undefined} aria-busy={stale} onKeyDown={onKeyDown}>
      {!narrow && <Head {...props} template={template} width={width} />}
      <div role="rowgroup" ref={body} className="mt-grid-body" style={{ height: virtualizer.getTotalSize() }}>
        {items.map(({ index, start, size }) => {
          const row = rowAt(index);
          const chosen = row !== undefined && choice !== null && choice.has(row.id);
          const box = choice && row && <Checkbox tabIndex={-1} aria-label={`Choose ${row.mark}`} checked={chosen} onChange={(e) => choice.toggle(index, (e.nativeEvent as unknown as MouseEvent).shiftKey)} onClick={(e) => e.stopPropagation()} />;
          const context = { to: row ? sheetOf(row.id) : '', open: () => leave(index), aboveC };
          return (
            <div key={index} role="row" aria-rowindex={index + 2} aria-selected={choice ? chosen : undefined} tabIndex={index === focusable ? 0 : -1} onFocus={(e) => { if (e.target === e.currentTarget) setActive(index); }}
              // a reach of rows is chosen, not the text between two clicks
              onMouseDown={(e) => { if (e.shiftKey && choice) e.preventDefault(); }} onClick={(e) => onClick(e, index)} onDoubleClick={() => open(index)}
              className={`mt-grid-row ${chosen ? 'mt-grid-chosen' : ''}`} style={{ top: start - margin, height: size, ...(narrow ? {} : { gridTemplateColumns: template, width }) }}>
              {row === undefined ? <span role="gridcell" className="mt-grid-wait">Row {index + 1} {failed ? 'did not arrive' : 'is being fetched'}</span>
                : narrow ? <NarrowCells row={row} box={box} columns={columns} context={context} />
                  : <>{choice && <span role="gridcell" className="mt-grid-check">{box}</span>}{columns.map((column) => <span key={column.key} role="gridcell" className={column.numeric ? 'mt-num' : 'mt-one-line'}>{column.cell(row, context)}</span>)}</>}
            </div>
          );
        })}
      </div>
    </div>
  );
}

function NarrowCells({ row, box, columns, context }: { row: MemberRowDto; box: React.ReactNode; columns: readonly MemberColumn[]; context: Parameters<MemberColumn['cell']>[1] }) {
  const mark = columns.find((c) => c.key === 'mark');
  return (
    <>
      {box && <span role="gridcell" className="mt-grid-check">{box}</span>}
      <span role="gridcell" className="mt-grid-entry">
        <span className="mt-grid-first">{mark?.cell(row, context)}<span>{row.section}</span><span className="mt-sub">{row.zoneCode}, {memberTypeNames[row.memberType].toLowerCase()}</span></span>
        <Result row={row} aboveC={context.aboveC} />
      </span>
    </>
  );
}
