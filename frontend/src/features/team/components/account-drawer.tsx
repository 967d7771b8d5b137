import { App } from 'antd';
import { invitationInputSchema, userUpdateSchema } from '@mantlet/common';
import type { UserDto } from '@mantlet/common';
import { formatDateTime } from '../../../lib/format.js';
import { DeleteButton } from '../../../ui/form/delete-button.js';
import { CheckField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useInvite, useUpdateUser, useWithdraw } from '../api/users.js';

const administratorHelp = 'Keeps accounts and the shared product library. Sees a project only if on its team.';

export function Invite({ onClose }: { onClose: () => void }) {
  const invite = useInvite();
  const { message } = App.useApp();
  const form = useContractForm(invitationInputSchema, { defaultValues: { name: '', email: '', administrator: false } });
  useServerIssues(form, invite.error);
  const submit = form.handleSubmit((body) => invite.mutate(body, { onSuccess: (user) => { void message.success(`An invitation to ${user.email} is on its way.`); onClose(); } }));
  return (
    <FormDrawer title="Invite somebody" open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !invite.isSuccess} saving={invite.isPending} error={invite.error} saveText="Send the invitation" size={440}>
      <p className="mt-sub">They are mailed a link by which they choose a password. It works once, within seven days.</p>
      <TextField control={form.control} name="name" label="Name" />
      <TextField control={form.control} name="email" label="E-mail" type="email" />
      <CheckField control={form.control} name="administrator" label="Administrator" help={administratorHelp} />
    </FormDrawer>
  );
}

export function EditAccount({ user, self, onClose }: { user: UserDto; self: boolean; onClose: () => void }) {
  const update = useUpdateUser(user.id);
  const withdraw = useWithdraw();
  const { message } = App.useApp();
  const form = useContractForm(userUpdateSchema, { defaultValues: { name: user.name, administrator: user.administrator, disabled: user.state === 'disabled' } });
  useServerIssues(form, update.error);
  const submit = form.handleSubmit((body) => update.mutate(body, { onSuccess: onClose }));
  const takeBack = () => withdraw.mutate(user.id, { onSuccess: () => { void message.success(`The invitation to ${user.email} is withdrawn.`); onClose(); } });
  const invited = user.state === 'invited';
  return (
    <FormDrawer
      title={user.name} open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !update.isSuccess} saving={update.isPending} error={update.error ?? withdraw.error} size={440}
      extra={invited && <DeleteButton what={`the invitation to ${user.name}`} consequence="The link that was mailed leads nowhere from then on, and the address can be invited anew." busy={withdraw.isPending} onDelete={takeBack} verb="Withdraw" />}
    >
      <p className="mt-sub">{user.email}{invited && `, invited until ${formatDateTime(user.invitationExpiresAt)}`}</p>
      <TextField control={form.control} name="name" label="Name" />
      <CheckField control={form.control} name="administrator" label="Administrator" disabled={self} help={self ? 'You cannot take this from yourself.' : administratorHelp} />
      {!invited && <CheckField control={form.control} name="disabled" label="Account closed" disabled={self} help="A closed account cannot sign in, and its sessions end at once. What the person did stays in the audit trail." />}
    </FormDrawer>
  );
}
