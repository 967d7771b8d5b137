import { App, Button } from 'antd';
import { useCallback, useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { RequireRight, useCurrentProject, useMay } from '../../projects/project-context.js';
import { useMembers } from '../api/members.js';
import { LinkButton } from '../../../ui/link-button.js';
import { MemberFilters } from '../components/member-filters.js';
import { MemberList } from '../components/member-list.js';
import { NewMemberDrawer } from '../forms/member-drawer.js';
import { addressOfFilter, defaultPageSize, filterOfAddress } from '../member-filter.js';
import type { MemberFilter } from '../member-filter.js';
import { listHeading } from '../member-words.js';
import '../members.css';

/** The filter as it stands in the address: going back and sending a link both work. */
function useFilter(): [MemberFilter, (next: MemberFilter) => void] {
  const [params, setParams] = useSearchParams();
  const filter = useMemo(() => filterOfAddress(params), [params]);
  const setFilter = useCallback((next: MemberFilter) => setParams((now) => addressOfFilter(next, now), { replace: true }), [setParams]);
  return [filter, setFilter];
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
  const { message } = App.useApp();
  const [filter, setFilter] = useFilter();
  const [adding, setAdding] = useState(false);
  const members = useMembers(project.id, { pageSize: defaultPageSize, ...filter });
  const all = useMembers(project.id, { pageSize: 1 });
  const open = useMembers(project.id, { open: 'true', pageSize: 1 });
  const words = listHeading(all.data?.total, open.data?.total);
  const importAt = `/projects/${project.id}/members/import`;
  const [onlyZone] = filter.zoneIds?.length === 1 ? filter.zoneIds : [null];
  const actions = may('edit-members') && (
    <>
      <Button onClick={() => setAdding(true)}>Add a member</Button>
      <LinkButton to={importAt} type="primary">Import members</LinkButton>
    </>
  );
  return (
    <Page title="Members" projectName={project.name} heading={words.heading} sub={words.sub} actions={actions}>
      <Panel flush label="Members">
        <MemberFilters projectId={project.id} filter={filter} onChange={setFilter} />
        <QueryState query={members} what="the members">
          {(page) => <MemberList projectId={project.id} page={page} stale={members.isPlaceholderData} filter={filter} setFilter={setFilter} firstStep={<FirstStep importAt={importAt} add={() => setAdding(true)} />} />}
        </QueryState>
      </Panel>
      {adding && (
        <NewMemberDrawer
          projectId={project.id} zoneId={onlyZone ?? null} onClose={() => setAdding(false)}
          onAdded={(mark) => { setAdding(false); void message.success(`${mark} added`); }}
        />
      )}
    </Page>
  );
}

export default function MembersPage() {
  return <RequireRight right="see-design"><Members /></RequireRight>;
}
