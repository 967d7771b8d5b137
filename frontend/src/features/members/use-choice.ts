import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import type { FoundSummaryDto, MemberChoice, MemberRowDto } from '@mantlet/common';
import { useFound } from './api/member-list.js';
import type { GridChoice } from './components/member-grid.js';
import { narrowing } from './member-filter.js';
import type { MemberFilter } from './member-filter.js';
import { windowQuery, windowSize } from './use-member-windows.js';
import type { MemberWindows } from './use-member-windows.js';

/** chosen one by one as last seen, or all that a filter finds but a few */
type State = { kind: 'some'; rows: ReadonlyMap<string, MemberRowDto> } | { kind: 'all'; of: string; except: ReadonlySet<string> };
const none: State = { kind: 'some', rows: new Map() };
const mostInReach = 2000;

export interface Chosen {
  count: number;
  /** those chosen one by one; null where all that is found is meant */
  rows: readonly MemberRowDto[] | null;
  summary: FoundSummaryDto | null;
  /** what the server is told; null until it has said under which stamp it found them */
  choice: MemberChoice | null;
  error: unknown;
  clear: () => void;
  chooseAll: () => void;
  grid: GridChoice;
}

export function useChoice(projectId: string, filter: MemberFilter, windows: MemberWindows): Chosen {
  const client = useQueryClient();
  const of = JSON.stringify(narrowing(filter));
  const [state, setState] = useState<State>(none);
  const anchor = useRef(0);
  const { total, rowAt } = windows;
  // all that another filter found is not what is on screen now
  const standing: State = state.kind === 'all' && state.of !== of ? none : state;
  const query = standing.kind === 'all' ? { filter: narrowing(filter), except: [...standing.except] } : null;
  const found = useFound(projectId, query);
  const summary = query ? found.data ?? null : null;

  const setRows = (index: number, rows: readonly MemberRowDto[], on: boolean) => {
    anchor.current = index;
    setState((now) => {
      if (now.kind === 'all' && now.of === of) {
        const except = new Set(now.except);
        for (const row of rows) if (on) except.delete(row.id); else except.add(row.id);
        return except.size >= total || except.size > 500 ? none : { ...now, except };
      }
      const next = new Map(now.kind === 'some' ? now.rows : []);
      for (const row of rows) if (on) next.set(row.id, row); else next.delete(row.id);
      return { kind: 'some', rows: next };
    });
  };
  const has = (id: string) => (standing.kind === 'all' ? !standing.except.has(id) : standing.rows.has(id));
  const toggle = (index: number, reach: boolean) => {
    const row = rowAt(index);
    if (!row) return;
    if (!reach) return setRows(index, [row], !has(row.id));
    const [from, to] = [Math.min(anchor.current, index), Math.max(anchor.current, index)];
    if (to - from > mostInReach) return setRows(index, [row], true);
    // rows between that were never on screen are fetched
    const pages = Array.from({ length: Math.floor(to / windowSize) - Math.floor(from / windowSize) + 1 }, (_, i) => Math.floor(from / windowSize) + 1 + i);
    void Promise.all(pages.map((page) => client.fetchQuery({ ...windowQuery(projectId, filter, page), staleTime: 15_000 }))).then(
      (fetched) => setRows(index, fetched.flatMap((p) => p.items.map((item, i) => [item, (p.page - 1) * windowSize + i] as const)).filter(([, at]) => at >= from && at <= to).map(([item]) => item), true),
      () => setRows(index, [row], true));
  };
  const chooseAll = () => setState({ kind: 'all', of, except: new Set() });
  const clear = () => setState(none);
  const rows = standing.kind === 'some' ? [...standing.rows.values()] : null;
  // rows that came anew stand for those that were chosen, so that what is done is done to what is seen
  const fresh = new Map(Array.from({ length: Math.min(total, 500) }, (_, i) => rowAt(i)).filter((r) => r !== undefined).map((r) => [r.id, r]));
  const current = rows?.map((row) => fresh.get(row.id) ?? row) ?? null;
  const count = standing.kind === 'all' ? summary?.count ?? Math.max(total - standing.except.size, 0) : standing.rows.size;
  return {
    count, rows: current, summary, clear, chooseAll, error: query ? found.error : null,
    choice: current ? { members: current.map(({ id, version }) => ({ id, version })) } : summary && query ? { found: { ...query, count: summary.count, stamp: summary.stamp } } : null,
    grid: { has, all: total > 0 && count >= total, some: count > 0, toggle, toggleAll: () => (count > 0 ? clear() : chooseAll()) },
  };
}
