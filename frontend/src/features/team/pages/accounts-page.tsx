import { App, Button } from 'antd';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { message as said, sentence } from '@mantlet/common';
import type { UserDto } from '@mantlet/common';
import { count, formatDateTime } from '../../../lib/format.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { QueryState, RefusedState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useSession } from '../../session/api/session.js';
import { useInviteAgain, useUsers } from '../api/users.js';
import { EditAccount, Invite } from '../components/account-drawer.js';
import './accounts-page.css';

/** "7 accounts in use, 2 invitations open" */
export function accountsHeading(users: readonly UserDto[]): string {
  const inState = (state: UserDto['state']) => users.filter((user) => user.state === state).length;
  const invited = inState('invited');
  return `${count(inState('active'), 'account')} in use${invited ? `, ${count(invited, 'invitation')} open` : ''}`;
}

export default function AccountsPage() {
  const session = useSession().data;
  const me = session?.user;
  const administrator = me?.administrator ?? false;
  const users = useUsers(administrator);
  const [inviting, setInviting] = useState(false);
  const [editing, setEditing] = useState<UserDto | null>(null);
  if (!administrator) {
    return (
      <Page title="Accounts" heading="Accounts are the administrator's">
        <RefusedState>{sentence(said('shared.forbidden', { who: 'the administrator', what: 'see and change accounts' }))}</RefusedState>
      </Page>
    );
  }
  return (
    <Page
      title="Accounts" heading={users.data ? accountsHeading(users.data) : 'Accounts'}
      sub={<>An account opens no project by itself; a project's fire engineer or specifier adds people to its team. You keep the <Link to="/products">product library</Link> of this installation as well.{session?.caughtMail && <> Mail does not leave this server: <Link to="/caught-mail">read it here</Link>.</>}</>}
      actions={<Button type="primary" onClick={() => setInviting(true)}>Invite somebody</Button>}
    >
      <QueryState query={users} what="the accounts">
        {(rows) => (
          <Panel flush label="Accounts">
            <ScheduleTable
              caption="Accounts" rows={rows} rowKey={(u) => u.id} minWidth={920}
              columns={[
                { title: 'Name', key: 'name', className: 'mt-fold-head', render: (_, u) => <><span className="mt-strong">{u.name}</span><div className="mt-sub">{u.email}</div>{u.administrator && <div className="mt-fold-only mt-sub">Administrator</div>}</> },
                { title: 'Administrator', key: 'administrator', width: 130, className: 'mt-fold-hide', render: (_, u) => (u.administrator ? 'Yes' : 'No') },
                { title: 'Last signed in', key: 'last', width: 180, render: (_, u) => (u.lastSignedInAt ? formatDateTime(u.lastSignedInAt) : 'Never') },
                { title: 'State', key: 'state', className: 'mt-fold-text', width: 320, render: (_, u) => <State user={u} /> },
                { title: <span className="mt-sr">Change</span>, key: 'edit', className: 'mt-fold-side', align: 'right', width: 90, render: (_, u) => <Button size="small" onClick={() => setEditing(u)} aria-label={`Edit ${u.name}`}>Edit</Button> },
              ]}
            />
          </Panel>
        )}
      </QueryState>
      {inviting && <Invite onClose={() => setInviting(false)} />}
      {editing && <EditAccount user={editing} self={editing.id === me?.id} onClose={() => setEditing(null)} />}
    </Page>
  );
}

/** How the account stands; what keeps its person out comes with the way to settle it. */
function State({ user }: { user: UserDto }) {
  const [now] = useState(() => Date.now());
  const expired = user.state === 'invited' && (user.invitationExpiresAt === null || Date.parse(user.invitationExpiresAt) < now);
  return (
    <>
      {user.state === 'active' && <StatusWord kind="settled">In use</StatusWord>}
      {user.state === 'disabled' && <StatusWord kind="neutral">Closed</StatusWord>}
      {user.state === 'invited' && (expired ? <StatusWord kind="attention">Invitation expired</StatusWord> : <StatusWord kind="neutral">{`Invited, until ${formatDateTime(user.invitationExpiresAt)}`}</StatusWord>)}
      {user.mailFailure && <div className="mt-attention">{user.mailFailure}</div>}
      {user.state === 'invited' && <SendAgain user={user} />}
    </>
  );
}

function SendAgain({ user }: { user: UserDto }) {
  const again = useInviteAgain();
  const { message } = App.useApp();
  const send = () => again.mutate(user.id, {
    onSuccess: () => { void message.success(`A new invitation to ${user.email} is on its way; the old link is dead.`); },
    onError: (error) => { void message.error(error.message); },
  });
  return <div><Button size="small" type="link" className="mt-inline-button" loading={again.isPending} onClick={send} aria-label={`Send the invitation to ${user.name} again`}>Send again</Button></div>;
}
