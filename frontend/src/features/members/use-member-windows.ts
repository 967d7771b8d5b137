import { useQueries, useQuery } from '@tanstack/react-query';
import type { UseQueryResult } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { MemberPageDto, MemberRowDto } from '@mantlet/common';
import { membersQuery } from './api/members.js';
import type { MemberFilter } from './member-filter.js';

export const windowSize = 100;
export interface MemberWindows {
  first: UseQueryResult<MemberPageDto>;
  total: number;
  rowAt: (index: number) => MemberRowDto | undefined;
  /** the rows on screen answer to an earlier filter or order */
  stale: boolean;
  /** rows on screen that could not be fetched; null where all arrived or are on their way */
  failed: { error: unknown; again: () => void } | null;
  /** tells which rows are on screen */
  show: (from: number, to: number) => void;
}

export const windowQuery = (projectId: string, filter: MemberFilter, page: number, pageSize = windowSize) => membersQuery(projectId, { ...filter, page, pageSize });

/** All rows of the list as if they were here: windows are fetched as they come on screen, those passed over in a hurry are not. */
export function useMemberWindows(projectId: string, filter: MemberFilter): MemberWindows {
  const [seen, setSeen] = useState('1-1');
  const [wanted, setWanted] = useState('1-1');
  useEffect(() => {
    const timer = setTimeout(() => setWanted(seen), 70);
    return () => clearTimeout(timer);
  }, [seen]);
  const first = useQuery(windowQuery(projectId, filter, 1));
  const stale = first.isPlaceholderData;
  const [from = 1, to = 1] = wanted.split('-').map(Number);
  const pages = Array.from({ length: to - from + 1 }, (_, i) => from + i).filter((page) => page > 1);
  const further = useQueries({ queries: pages.map((page) => ({ ...windowQuery(projectId, filter, page), enabled: !stale, placeholderData: undefined })) });
  const lost = further.filter((query) => query.isError);
  const rows = new Map<number, MemberPageDto | undefined>([[1, first.data], ...pages.map((page, i) => [page, further[i]?.data] as const)]);
  return {
    failed: lost[0] ? { error: lost[0].error, again: () => { for (const query of lost) void query.refetch(); } } : null,
    first, stale, total: first.data?.total ?? 0,
    rowAt: (index) => rows.get(Math.floor(index / windowSize) + 1)?.items[index % windowSize],
    show: (a, b) => setSeen(`${Math.floor(a / windowSize) + 1}-${Math.floor(b / windowSize) + 1}`),
  };
}
