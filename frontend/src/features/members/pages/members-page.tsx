import { App, Button } from 'antd';
import { useCallback, useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { defaultDesignBasis } from '@mantlet/common';
import { formatNumber } from '../../../lib/format.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { RequireRight, useCurrentProject, useMay } from '../../projects/project-context.js';
import { useSession } from '../../session/api/session.js';
import { useMemberValues } from '../api/member-list.js';
import { LinkButton } from '../../../ui/link-button.js';
import { ColumnsDrawer } from '../components/columns-drawer.js';
import { FilterBar } from '../components/filter-bar.js';
import { KeptLists } from '../components/kept-lists.js';
import { MemberList } from '../components/member-list.js';
import { NewMemberDrawer } from '../forms/member-drawer.js';
import { addressOfFilter, filterOfAddress, isNarrowed } from '../member-filter.js';
import type { MemberFilter } from '../member-filter.js';
import { listHeading } from '../member-words.js';
import { useColumns } from '../use-columns.js';
import { useMemberWindows } from '../use-member-windows.js';
import '../members.css';

/** The filter as it stands in the address: going back and sending a link both work. What is typed letter by letter leaves one step behind. */
function useFilter() {
  const [params, setParams] = useSearchParams();
  const filter = useMemo(() => filterOfAddress(params), [params]);
  const setFilter = useCallback((next: MemberFilter, how?: 'typing') => setParams((now) => addressOfFilter(next, now), { replace: how === 'typing' }), [setParams]);
  const setColumns = (keys: readonly string[]) => setParams((now) => { const next = new URLSearchParams(now); next.set('columns', keys.join(',')); return next; }, { replace: true });
  return { filter, setFilter, setColumns, address: params.toString(), columns: params.get('columns') };
}

function FirstStep({ importAt, add }: { importAt: string; add: () => void }) {
  const may = useMay();
  if (!may('edit-members')) return <EmptyState title="No members yet">The specifier imports the steel schedule or adds members one by one.</EmptyState>;
  return (
    <EmptyState title="Bring in the steel schedule" action={<><LinkButton to={importAt} type="primary">Import members</LinkButton><Button onClick={add}>Add a member</Button></>}>
      A CSV or XLSX file with one row a mark. Zones must be there first.
    </EmptyState>
  );
}

function Members() {
  const project = useCurrentProject();
  const may = useMay();
  const me = useSession().data?.user?.id ?? '';
  const { message } = App.useApp();
  const { filter, setFilter, setColumns, address, columns } = useFilter();
  const [keys, remember] = useColumns(me, columns);
  const [open, setOpen] = useState<'add' | 'columns' | null>(null);
  const windows = useMemberWindows(project.id, filter);
  const values = useMemberValues(project.id).data;
  const aboveC = (project.settings?.designBasis ?? defaultDesignBasis).secondSignatureAboveC;
  const whole = windows.first.data?.project;
  const words = listHeading(whole?.members, whole?.open);
  const importAt = `/projects/${project.id}/members/import`;
  const [onlyZone] = filter.zoneIds?.length === 1 ? filter.zoneIds : [null];
  const found = whole ? (isNarrowed(filter) ? `${formatNumber(windows.total)} of ${formatNumber(whole.members)}` : `All ${formatNumber(whole.members)}`) : '';
  const actions = (
    <>
      <Button onClick={() => setOpen('columns')}>Columns</Button>
      {may('edit-members') && <Button onClick={() => setOpen('add')}>Add a member</Button>}
      {may('edit-members') && <LinkButton to={importAt} type="primary">Import members</LinkButton>}
    </>
  );
  return (
    <Page title="Members" projectName={project.name} heading={words.heading} sub={words.sub} actions={actions}>
      <Panel flush label="Members">
        {whole?.members !== 0 && <KeptLists projectId={project.id} query={address} aboveC={aboveC} />}
        {whole?.members !== 0 && <FilterBar filter={filter} values={values} found={found} onChange={setFilter} />}
        <QueryState query={windows.first} what="the members">
          {() => (
            <MemberList
              projectId={project.id} windows={windows} filter={filter} setFilter={setFilter} columnKeys={keys} aboveC={aboveC} values={values} address={address}
              firstStep={<FirstStep importAt={importAt} add={() => setOpen('add')} />}
            />
          )}
        </QueryState>
      </Panel>
      {open === 'columns' && <ColumnsDrawer keys={keys} onChange={(next) => { remember(next); setColumns(next); }} onClose={() => setOpen(null)} />}
      {open === 'add' && (
        <NewMemberDrawer
          projectId={project.id} zoneId={onlyZone ?? null} onClose={() => setOpen(null)}
          onAdded={(mark) => { setOpen(null); void message.success(`${mark} added`); }}
        />
      )}
    </Page>
  );
}

export default function MembersPage() {
  return <RequireRight right="see-design"><Members /></RequireRight>;
}
