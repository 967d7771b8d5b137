import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';
import { Button } from 'antd';
import type { ReactNode } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import type { MemberRowDto, MemberSortKey, MemberValuesDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { formatNumber } from '../../../lib/format.js';
import { EmptyState } from '../../../ui/states.js';
import { useMay } from '../../projects/project-context.js';
import { chipWords, chosenFields, without } from '../filter-fields.js';
import { addressOfFilter, cleared, isNarrowed } from '../member-filter.js';
import type { MemberFilter } from '../member-filter.js';
import { useChoice } from '../use-choice.js';
import { windowQuery, windowSize } from '../use-member-windows.js';
import type { MemberWindows } from '../use-member-windows.js';
import { useRowWindow } from '../use-row-window.js';
import { ChoiceBar } from './choice-bar.js';
import { columnsOf } from './member-columns.js';
import type { MemberColumn } from './member-columns.js';
import { MemberGrid } from './member-grid.js';
import { NarrowOrder } from './narrow-order.js';

const mostOnPaper = 1000;

/** whole: as many as paper takes, not only those that were at hand */
interface PaperRows { rows: readonly MemberRowDto[]; whole: boolean }
const paperPages = (total: number) => Array.from({ length: Math.ceil(Math.min(total, mostOnPaper) / 500) }, (_, i) => i + 1);

/**
 * Rows for paper: all that are found, up to a limit that is said. The key for printing fetches what was never on screen.
 * The browser's own menu cannot be made to wait: it prints what is at hand, says so, and has the rest fetched for the next try.
 */
function usePrint(projectId: string, filter: MemberFilter, total: number) {
  const client = useQueryClient();
  const [paper, setPaper] = useState<PaperRows | null>(null);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key.toLowerCase() !== 'p' || !(event.ctrlKey || event.metaKey) || total === 0) return;
      event.preventDefault();
      void Promise.all(paperPages(total).map((page) => client.fetchQuery(windowQuery(projectId, filter, page, 500)))).then((fetched) => {
        flushSync(() => setPaper({ rows: fetched.flatMap((p) => p.items), whole: true }));
        window.print();
      }, () => window.print());
    };
    const before = () => {
      const pages = paperPages(total);
      const at = (page: number, size?: number) => client.getQueryData(windowQuery(projectId, filter, page, size).queryKey)?.items;
      const whole = pages.flatMap((page) => at(page, 500) ?? []);
      const arrived = whole.length >= Math.min(total, mostOnPaper);
      const shown = Array.from({ length: Math.ceil(Math.min(total, mostOnPaper) / windowSize) }, (_, i) => at(i + 1) ?? []).flat();
      flushSync(() => setPaper((standing) => standing ?? { rows: arrived ? whole : shown, whole: arrived || shown.length >= Math.min(total, mostOnPaper) }));
      if (!arrived) for (const page of pages) void client.prefetchQuery(windowQuery(projectId, filter, page, 500));
    };
    const after = () => setPaper(null);
    window.addEventListener('keydown', onKey);
    window.addEventListener('beforeprint', before);
    window.addEventListener('afterprint', after);
    return () => { window.removeEventListener('keydown', onKey); window.removeEventListener('beforeprint', before); window.removeEventListener('afterprint', after); };
  }, [client, projectId, filter, total]);
  return paper;
}

function Paper({ paper: { rows, whole }, total, columns, aboveC }: { paper: PaperRows; total: number; columns: readonly MemberColumn[]; aboveC: number }) {
  return (
    <div className="mt-paper">
      {rows.length < total && (
        <p>{whole ? `The first ${formatNumber(rows.length)} of ${formatNumber(total)} members: narrow the list to print the others.`
          : `${formatNumber(rows.length)} of ${formatNumber(total)} members, those that were on screen. Print once more, or with Ctrl and P, for ${total > mostOnPaper ? `the first ${formatNumber(mostOnPaper)}` : 'all'}.`}</p>
      )}
      <table>
        <thead><tr>{columns.map((c) => <th key={c.key} className={c.numeric ? 'mt-num' : undefined}>{c.head ?? c.name}</th>)}</tr></thead>
        <tbody>{rows.map((row) => <tr key={row.id}>{columns.map((c) => <td key={c.key} className={c.numeric ? 'mt-num' : undefined}>{c.key === 'mark' ? row.mark : c.cell(row, { to: '', open: () => undefined, aboveC })}</td>)}</tr>)}</tbody>
      </table>
    </div>
  );
}

function NothingFits({ filter, values, setFilter }: { filter: MemberFilter; values: MemberValuesDto | undefined; setFilter: (next: MemberFilter) => void }) {
  return (
    <EmptyState
      title="No member fits all of these"
      action={<>{filter.search && <Button onClick={() => setFilter({ ...filter, search: '' })}>Without the search for “{filter.search}”</Button>}
        {chosenFields(filter).map((field) => <Button key={field.key} onClick={() => setFilter(without(filter, field))}>Without {chipWords(field, filter, values)}</Button>)}
        <Button type="primary" onClick={() => setFilter(cleared(filter))}>Show all</Button></>}
    >
      Take one of them out, or look for another mark.
    </EmptyState>
  );
}

interface MemberListProps {
  projectId: string; windows: MemberWindows; filter: MemberFilter; setFilter: (next: MemberFilter) => void; columnKeys: readonly string[]; aboveC: number; firstStep: ReactNode;
  values: MemberValuesDto | undefined; address: string;
}

/** The schedule in one scroll, what is chosen of it, and what it says where there is nothing. */
export function MemberList({ projectId, windows, filter, setFilter, columnKeys, aboveC, firstStep, values, address }: MemberListProps) {
  const { total, rowAt, stale, failed, show } = windows;
  const may = useMay();
  const rows = useRowWindow(`members:${projectId}`, addressOfFilter(filter).toString(), total);
  const chosen = useChoice(projectId, filter, windows);
  const columns = columnsOf(columnKeys);
  const paper = usePrint(projectId, filter, total);
  const items = rows.virtualizer.getVirtualItems();
  const [from, to] = [items[0]?.index ?? 0, items.at(-1)?.index ?? 0];
  useEffect(() => show(from, to), [show, from, to]);
  const mayChoose = may('edit-members') || may('accept-temperatures') || may('edit-structural');
  const sort = (key: MemberSortKey) => setFilter({ ...filter, sort: key, direction: (filter.sort ?? 'mark') === key && filter.direction !== 'desc' ? 'desc' : 'asc' });
  if (total === 0) return isNarrowed(filter) ? <NothingFits filter={filter} values={values} setFilter={setFilter} /> : firstStep;
  return (
    <>
      <ChoiceBar projectId={projectId} chosen={chosen} found={total} />
      {rows.narrow && <NarrowOrder filter={filter} setFilter={setFilter} />}
      {failed && <p className="mt-choice mt-noprint" role="alert"><strong>▲ Some rows did not arrive. {failed.error instanceof ApiError ? failed.error.message : ''}</strong><Button onClick={failed.again}>Fetch them again</Button></p>}
      <div className={paper ? 'mt-members mt-noprint' : 'mt-members'}>
        <MemberGrid
          total={total} rowAt={rowAt} stale={stale} failed={failed !== null} columns={columns} filter={filter} sort={sort} choice={mayChoose ? chosen.grid : null} aboveC={aboveC}
          sheetOf={(id) => `/projects/${projectId}/members/${id}`} list={address} rows={rows} leave={rows.leave}
        />
      </div>
      {paper && <Paper paper={paper} total={total} columns={columns} aboveC={aboveC} />}
    </>
  );
}
