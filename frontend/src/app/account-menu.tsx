import { App, Button, Dropdown, Radio } from 'antd';
import { useNavigate } from 'react-router-dom';
import type { MeDto } from '@mantlet/common';
import { useSignOut } from '../features/session/api/session.js';
import { draftsOf, forgetDraftsOf } from '../lib/drafts.js';
import { joinWords } from '../lib/format.js';
import { leaveUnsaved, unsavedForms } from '../ui/form/use-unsaved-changes.js';
import { themeChoices, useTheme } from '../ui/theme/theme-provider.js';
import type { ThemeChoice } from '../ui/theme/theme-provider.js';

const themeNames: Record<ThemeChoice, string> = { system: 'As the system', light: 'Light', dark: 'Dark' };

/** What signing out would lose: forms on this page, and what was left in this browser earlier. */
const unsavedTitles = (userId: string) => [...new Set([...unsavedForms(), ...draftsOf(userId)].map((form) => form.title))];

function useLeave(user: MeDto | null) {
  const signOut = useSignOut();
  const { message, modal } = App.useApp();
  // the document is loaded anew: whoever signs in next finds nothing of this session, not even the address that was open
  const leave = () => signOut.mutateAsync().then(() => {
    if (user) forgetDraftsOf(user.id);
    leaveUnsaved();
    window.location.replace('/sign-in');
  }, (error: Error) => { void message.error(error.message); });
  return () => {
    const titles = user ? unsavedTitles(user.id) : [];
    if (titles.length === 0) return void leave();
    modal.confirm({
      title: 'Sign out without saving?', icon: null, okText: 'Sign out and discard', cancelText: 'Stay here', onOk: leave,
      content: `Not saved yet: ${joinWords(titles)}. Signing out takes it from this browser, so that nobody after you finds it.`,
    });
  };
}

/** At the right of the strip: who is signed in, and what they may set for themselves. */
export function AccountMenu({ user, roles }: { user: MeDto | null; roles: string }) {
  const { choice, choose } = useTheme();
  const leave = useLeave(user);
  const navigate = useNavigate();
  if (!user) return null;
  return (
    <Dropdown
      trigger={['click']} placement="bottomRight" autoFocus
      menu={{
        selectable: true, selectedKeys: [choice],
        items: [
          { type: 'group', label: user.email, children: [{ key: 'account', label: 'Your account' }, { key: 'help', label: 'Help' }] },
          { type: 'group', label: 'Ground', children: themeChoices.map((c) => ({ key: c, label: `${themeNames[c]}${c === choice ? ' (chosen)' : ''}` })) },
          { type: 'divider' },
          { key: 'leave', label: 'Sign out' },
        ],
        onClick: ({ key }) => {
          if (key === 'leave') leave();
          else if (key === 'account') void navigate('/account');
          else if (key === 'help') void navigate('/help');
          else choose(key as ThemeChoice);
        },
      }}
    >
      <button type="button" className="mt-strip-who" aria-haspopup="menu" title={`${user.name}: ${roles}`}>
        <span className="mt-strip-label">{roles === user.name ? 'Signed in' : `Signed in: ${user.name}`}</span>
        <span className="mt-strip-value"><span className="mt-ellipsis">{roles}</span><span aria-hidden="true">▾</span></span>
      </button>
    </Dropdown>
  );
}

/** The same choices inside the menu drawer of small screens. */
export function AccountMenuItems({ user, roles, onDone }: { user: MeDto | null; roles: string; onDone: () => void }) {
  const { choice, choose } = useTheme();
  const leave = useLeave(user);
  const navigate = useNavigate();
  if (!user) return null;
  return (
    <div className="mt-menu-account">
      <div className="mt-sub">Signed in as {user.name}{roles && roles !== user.name ? `, ${roles.charAt(0).toLowerCase()}${roles.slice(1)}` : ''}</div>
      <Radio.Group aria-label="Ground" value={choice} onChange={(e) => choose(e.target.value as ThemeChoice)} options={themeChoices.map((c) => ({ value: c, label: themeNames[c] }))} className="mt-radios" />
      <div className="mt-actions">
        <Button onClick={() => { onDone(); void navigate('/account'); }}>Your account</Button>
        <Button onClick={() => { onDone(); leave(); }}>Sign out</Button>
      </div>
    </div>
  );
}
