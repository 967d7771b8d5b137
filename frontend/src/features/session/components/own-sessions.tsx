import { App, Button } from 'antd';
import type { UseQueryResult } from '@tanstack/react-query';
import type { OwnSessionDto } from '@mantlet/common';
import { formatDateTime } from '../../../lib/format.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { QueryState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { useEndSession } from '../api/own-sessions.js';

/** Where one is signed in, so that what one does not know can be ended. */
export function OwnSessions({ query }: { query: UseQueryResult<OwnSessionDto[]> }) {
  const end = useEndSession();
  const { message, modal } = App.useApp();
  const failed = (error: Error) => { void message.error(error.message); };
  const endOne = (session: OwnSessionDto) => end.mutate(session.id, { onSuccess: () => { void message.success(`The session with ${session.device} has ended.`); }, onError: failed });
  const endOthers = () => modal.confirm({
    title: 'End all other sessions?', content: 'They have to sign in again. What was typed there and not saved may be lost.', icon: null, okText: 'End them', cancelText: 'Keep them',
    onOk: () => end.mutateAsync('others').then(() => { void message.success('Only this session is left.'); }, failed),
  });
  const others = (query.data?.length ?? 0) > 1;
  return (
    <Panel flush title="Signed in" sub="What a browser says of itself is a hint. A session you do not know: end it, then change your password." actions={others && <Button onClick={() => { endOthers(); }}>End all others</Button>}>
      <QueryState query={query} what="your sessions">
        {(rows) => (
          <ScheduleTable
            caption="Your sessions" rows={rows} rowKey={(session) => session.id} sticky={false}
            columns={[
              { title: 'With', key: 'device', className: 'mt-fold-head', render: (_, session) => <span className="mt-strong">{session.device}</span> },
              { title: 'Since', key: 'since', width: 170, render: (_, session) => formatDateTime(session.startedAt) },
              { title: 'Last seen', key: 'seen', width: 170, render: (_, session) => (session.current ? 'Now' : formatDateTime(session.lastSeenAt)) },
              {
                title: <span className="mt-sr">End</span>, key: 'end', className: 'mt-fold-side', align: 'right', width: 120,
                render: (_, session) => session.current ? <StatusWord kind="settled">This one</StatusWord>
                  : <Button size="small" loading={end.isPending && end.variables === session.id} onClick={() => endOne(session)} aria-label={`End the session with ${session.device}, since ${formatDateTime(session.startedAt)}`}>End</Button>,
              },
            ]}
          />
        )}
      </QueryState>
    </Panel>
  );
}
