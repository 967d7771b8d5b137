import { Button, Pagination } from 'antd';
import { useState } from 'react';
import type { ReactNode } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { defaultDesignBasis } from '@mantlet/common';
import type { MemberQuery, MemberRowDto, Page } from '@mantlet/common';
import { formatNumber } from '../../../lib/format.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { EmptyState } from '../../../ui/states.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { membersQuery } from '../api/members.js';
import { addressOfFilter, cleared, defaultPageSize, isNarrowed } from '../member-filter.js';
import type { MemberFilter } from '../member-filter.js';
import { ChoiceBar } from './choice-bar.js';
import { memberColumns } from './member-columns.js';

interface MemberListProps { projectId: string; page: Page<MemberRowDto>; stale: boolean; filter: MemberFilter; setFilter: (next: MemberFilter) => void; firstStep: ReactNode }
const gatherSize = 500;

/** One page of the schedule, ordered and paged by the server. Choosing reaches over pages. */
export function MemberList({ projectId, page, stale, filter, setFilter, firstStep }: MemberListProps) {
  const client = useQueryClient();
  const aboveC = (useCurrentProject().settings?.designBasis ?? defaultDesignBasis).secondSignatureAboveC;
  const may = useMay();
  const [chosen, setChosen] = useState<readonly MemberRowDto[]>([]);
  const mayChoose = may('edit-members') || may('accept-temperatures');
  // rows as last fetched stand for the chosen ones, so that an acceptance sees fresh values
  const fresh = new Map(page.items.map((r) => [r.id, r]));
  const current = chosen.map((r) => fresh.get(r.id) ?? r);
  const chooseAll = async () => {
    const all: MemberRowDto[] = [];
    for (let number = 1; all.length < page.total; number += 1) {
      const next = await client.fetchQuery(membersQuery(projectId, { ...filter, page: number, pageSize: gatherSize }));
      if (next.items.length === 0) break;
      all.push(...next.items);
    }
    setChosen(all);
  };
  const empty = isNarrowed(filter)
    ? <EmptyState title="No member fits" action={<Button onClick={() => setFilter(cleared(filter))}>Clear the filter</Button>}>Take something out of the filter, or look for another mark.</EmptyState>
    : firstStep;
  return (
    <>
      <ChoiceBar projectId={projectId} chosen={current} found={page.total} clear={() => setChosen([])} chooseAll={chooseAll} />
      <div className="mt-members" aria-busy={stale}>
        <ScheduleTable<MemberRowDto>
          caption="Members" rows={page.items} rowKey={(r) => r.id} columns={memberColumns(projectId, filter, addressOfFilter(filter).toString(), aboveC)} loading={stale} empty={empty} tableLayout="fixed"
          scroll={{ x: 1120 }}
          {...(mayChoose && {
            rowSelection: {
              selectedRowKeys: chosen.map((r) => r.id), preserveSelectedRowKeys: true, columnWidth: 40, getCheckboxProps: (r: MemberRowDto) => ({ 'aria-label': `Choose ${r.mark}` } as object),
              onChange: (keys: React.Key[]) => {
                const known = new Map([...chosen, ...page.items].map((r) => [r.id, r]));
                setChosen(keys.flatMap((key) => known.get(String(key)) ?? []));
              },
            },
          })}
          onChange={(_, __, sorter) => {
            const one = Array.isArray(sorter) ? sorter[0] : sorter;
            setFilter({ ...filter, page: 1, sort: (one?.order ? String(one.columnKey) : 'mark') as MemberQuery['sort'], direction: one?.order === 'descend' ? 'desc' : 'asc' });
          }}
        />
      </div>
      {page.total > 0 && (
        <div className="mt-list-foot">
          <span className="mt-sub">{formatNumber(page.total)} found</span>
          <Pagination
            size="small" current={page.page} pageSize={page.pageSize} total={page.total} showSizeChanger pageSizeOptions={[50, defaultPageSize, 250, 500]} showLessItems
            onChange={(number, pageSize) => setFilter({ ...filter, page: pageSize === page.pageSize ? number : 1, pageSize })}
          />
        </div>
      )}
    </>
  );
}
