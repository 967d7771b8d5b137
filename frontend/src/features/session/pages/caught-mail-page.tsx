import { Link, useParams } from 'react-router-dom';
import type { CaughtMailTextDto } from '@mantlet/common';
import { count, formatDateTime } from '../../../lib/format.js';
import { Mark } from '../../../ui/mark.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { useCaughtMail, useCaughtMailText } from '../api/caught-mail.js';
import './caught-mail.css';

/** Stands alone, outside the session: whoever was only invited must be able to read it. */
export default function CaughtMailPage() {
  const { mailId } = useParams();
  const mails = useCaughtMail();
  return (
    <main className="mt-caught">
      <div className="mt-gate-brand"><Mark size={24} /><span>Mantlet</span></div>
      <Page
        title="Caught mail" width="narrow" heading={mails.data?.length ? `${count(mails.data.length, 'message')} caught, none sent` : 'Caught mail'}
        sub="This page exists on demonstration and development servers only, where mail does not leave the server: anybody who opens it reads everybody's mail."
        actions={<Link to="/sign-in">Go to sign in</Link>}
      >
        {mailId && <OneMail id={mailId} />}
        <QueryState query={mails} what="the mail">
          {(rows) => (
            <Panel flush label="Mail">
              <ScheduleTable
                caption="Mail, newest first" rows={rows} rowKey={(mail) => mail.id} sticky={false}
                empty={<EmptyState title="No mail yet">Invite somebody on the Accounts page, or ask for another password.</EmptyState>}
                columns={[
                  { title: 'Subject', key: 'subject', className: 'mt-fold-head', render: (_, mail) => <Link to={`/caught-mail/${mail.id}`} aria-current={mail.id === mailId ? 'true' : undefined}>{mail.subject}</Link> },
                  { title: 'To', key: 'to', className: 'mt-fold-text', render: (_, mail) => mail.to },
                  { title: 'At', key: 'at', width: 170, render: (_, mail) => formatDateTime(mail.at) },
                ]}
              />
            </Panel>
          )}
        </QueryState>
      </Page>
    </main>
  );
}

function OneMail({ id }: { id: string }) {
  const mail = useCaughtMailText(id);
  return <QueryState query={mail} what="the mail">{(one) => <MailText mail={one} />}</QueryState>;
}

function MailText({ mail }: { mail: CaughtMailTextDto }) {
  return (
    <Panel title={mail.subject} sub={`To ${mail.to}, ${formatDateTime(mail.at)}`}>
      <div className="mt-mail">
        {mail.text.split(/(https?:\/\/\S+)/).map((part, i) => (/^https?:\/\//.test(part) ? <a key={i} href={part}>{part}</a> : part))}
      </div>
    </Panel>
  );
}
