import { Button } from 'antd';
import type { ReactNode } from 'react';
import { Link, useLocation, useNavigate } from 'react-router-dom';
import { accountLinkUseSchema } from '@mantlet/common';
import type { AccountLink, AccountLinkDto, LinkPurpose, MeDto } from '@mantlet/common';
import { message, sentence } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { formatDateTime } from '../../../lib/format.js';
import { LinkButton } from '../../../ui/link-button.js';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { ErrorState, LoadingState } from '../../../ui/states.js';
import { useAccountLink, useUseLink } from '../api/account-links.js';
import { useSession, useSignOut } from '../api/session.js';
import { Gate, GateError } from './gate.js';

interface Words { title: string; heading: (link: AccountLinkDto) => string; sub: (link: AccountLinkDto) => string; button: string; ended: string; next: ReactNode }
const words: Record<LinkPurpose, Words> = {
  invitation: {
    title: 'Invitation', heading: (link) => `Welcome, ${link.name}`, sub: (link) => `Choose a password to begin. You sign in with it and ${link.email}.`, button: 'Begin', ended: 'This invitation is over',
    next: <LinkButton to="/sign-in">Go to sign in</LinkButton>,
  },
  'password-reset': {
    title: 'Another password', heading: () => 'Choose another password', sub: (link) => `For ${link.name}, ${link.email}. It ends every session of this account, on all devices.`, button: 'Save and sign in', ended: 'This link is over',
    next: <LinkButton to="/forgotten-password" type="primary">Ask for a new link</LinkButton>,
  },
};

/** The page that a mailed link opens. The link's token is in the fragment of the address, which is sent to nobody. */
export function ChoosePassword({ purpose }: { purpose: LinkPurpose }) {
  const token = useLocation().hash.slice(1);
  const use = useUseLink();
  const link = useAccountLink({ purpose, token }, use.isPending || use.isSuccess);
  const session = useSession();
  const { title, heading, sub, ended, next } = words[purpose];
  const over = token === '' || (link.error instanceof ApiError && [400, 410].includes(link.error.status));
  if (over) {
    return (
      <Gate title={title} heading={ended} sub={sentence(message('account.link-ended', { purpose }))}>
        <div className="mt-actions">{next}</div>
      </Gate>
    );
  }
  if (link.error) return <Gate title={title} heading="This link cannot be looked up now" sub=""><ErrorState error={link.error} retry={() => { void link.refetch(); }} /></Gate>;
  if (!link.data || session.isPending) return <LoadingState what="Mantlet" />;
  const user = session.data?.user;
  if (user && user.email !== link.data.email) return <SomebodyElse user={user} link={link.data} title={title} />;
  return (
    <Gate title={title} heading={heading(link.data)} sub={sub(link.data)}>
      <PasswordForm key={token} link={{ purpose, token }} dto={link.data} use={use} />
    </Gate>
  );
}

/** Whoever follows a link for one account while signed in to another is told, before anything changes. */
function SomebodyElse({ user, link, title }: { user: MeDto; link: AccountLinkDto; title: string }) {
  const signOut = useSignOut();
  return (
    <Gate title={title} heading={`You are signed in as ${user.name}`} sub={`This link is for ${link.name}, ${link.email}. Sign ${user.name} out on this device to go on with it; what is saved stays saved.`}>
      <GateError error={signOut.error} />
      <div className="mt-actions">
        <Button type="primary" loading={signOut.isPending} onClick={() => signOut.mutate(undefined, { onSuccess: () => window.location.reload() })}>Sign out and go on</Button>
        <LinkButton to="/projects">Stay signed in</LinkButton>
      </div>
    </Gate>
  );
}

const passwordOnly = accountLinkUseSchema.pick({ password: true });
function PasswordForm({ link, dto, use }: { link: AccountLink; dto: AccountLinkDto; use: ReturnType<typeof useUseLink> }) {
  const navigate = useNavigate();
  const form = useContractForm(passwordOnly, { defaultValues: { password: '' } });
  useServerIssues(form, use.error);
  const submit = form.handleSubmit(({ password }) => use.mutate({ ...link, password }, { onSuccess: () => { void navigate('/projects', { replace: true }); } }));
  return (
    <form className="mt-form" noValidate onSubmit={(event) => { void submit(event); }}>
      <GateError error={use.error} />
      {/* so that a password manager keeps the two together */}
      <input type="email" name="email" autoComplete="username" value={dto.email} readOnly hidden />
      <TextField control={form.control} name="password" label="Password" type="password" autoComplete="new-password" autoFocus help="At least 12 characters. A few unrelated words are easier to keep than signs." />
      <Button type="primary" htmlType="submit" loading={use.isPending} block>{words[link.purpose].button}</Button>
      <p className="mt-sub">The link works once, until {formatDateTime(dto.expiresAt)}. <Link to="/sign-in">Sign in instead</Link></p>
    </form>
  );
}
