import { count } from '../../../lib/format.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { useOwnSessions } from '../api/own-sessions.js';
import { useSession } from '../api/session.js';
import { ChangePassword } from '../components/change-password.js';
import { OwnSessions } from '../components/own-sessions.js';

/** What is one's own whatever the project: name, password, and where one is signed in. */
export default function AccountPage() {
  const user = useSession().data?.user;
  const sessions = useOwnSessions();
  const here = sessions.data?.length;
  const heading = here === undefined ? 'Your account' : here === 1 ? 'You are signed in here only' : `You are signed in with ${count(here, 'browser')}`;
  return (
    <Page title="Your account" heading={heading} sub="A session ends by itself twelve hours after it was last used." width="narrow">
      <OwnSessions query={sessions} />
      <Panel title="You" sub="Wrong, or changed? The administrator sets the name. The address is what you sign in with, and stays.">
        <dl className="mt-facts">
          <dt>Name</dt><dd>{user?.name}</dd>
          <dt>E-mail</dt><dd>{user?.email}</dd>
          {user?.administrator && <><dt>Office</dt><dd>Administrator of this installation</dd></>}
        </dl>
      </Panel>
      <ChangePassword />
    </Page>
  );
}
