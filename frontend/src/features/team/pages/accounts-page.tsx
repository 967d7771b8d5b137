import { Button } from 'antd';
import { useState } from 'react';
import { message, sentence } from '@mantlet/common';
import type { UserDto } from '@mantlet/common';
import { count, formatDateTime } from '../../../lib/format.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { QueryState, RefusedState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useSession } from '../../session/api/session.js';
import { useUsers } from '../api/users.js';
import { EditAccount, NewAccount } from '../components/account-drawer.js';

export default function AccountsPage() {
  const me = useSession().data?.user;
  const administrator = me?.administrator ?? false;
  const users = useUsers(administrator);
  const [creating, setCreating] = useState(false);
  const [editing, setEditing] = useState<UserDto | null>(null);
  if (!administrator) {
    return (
      <Page title="Accounts" heading="Accounts are the administrator's">
        <RefusedState>{sentence(message('shared.forbidden', { who: 'the administrator', what: 'see and change accounts' }))}</RefusedState>
      </Page>
    );
  }
  const active = users.data?.filter((u) => !u.disabled).length ?? 0;
  const heading = users.data ? `${count(active, 'account')} in use` : 'Accounts';
  return (
    <Page title="Accounts" heading={heading} sub="An account opens no project by itself; a project's fire engineer or specifier adds people to its team." actions={<Button type="primary" onClick={() => setCreating(true)}>New account</Button>}>
      <QueryState query={users} what="the accounts">
        {(rows) => (
          <Panel flush label="Accounts">
            <ScheduleTable
              caption="Accounts" rows={rows} rowKey={(u) => u.id}
              columns={[
                { title: 'Name', key: 'name', className: 'mt-fold-head', render: (_, u) => <><span className="mt-strong">{u.name}</span><div className="mt-sub">{u.email}</div>{u.administrator && <div className="mt-fold-only mt-sub">Administrator</div>}</> },
                { title: 'Administrator', key: 'administrator', width: 140, className: 'mt-fold-hide', render: (_, u) => (u.administrator ? 'Yes' : 'No') },
                { title: 'Last signed in', key: 'last', width: 190, render: (_, u) => (u.lastSignedInAt ? formatDateTime(u.lastSignedInAt) : 'Never') },
                { title: 'State', key: 'state', width: 130, render: (_, u) => (u.disabled ? <StatusWord kind="neutral">Closed</StatusWord> : <StatusWord kind="settled">In use</StatusWord>) },
                { title: <span className="mt-sr">Change</span>, key: 'edit', className: 'mt-fold-side', align: 'right', width: 90, render: (_, u) => <Button size="small" onClick={() => setEditing(u)} aria-label={`Edit ${u.name}`}>Edit</Button> },
              ]}
            />
          </Panel>
        )}
      </QueryState>
      {creating && <NewAccount onClose={() => setCreating(false)} />}
      {editing && <EditAccount user={editing} self={editing.id === me?.id} onClose={() => setEditing(null)} />}
    </Page>
  );
}
