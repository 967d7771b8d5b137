import { userInputSchema, userUpdateSchema } from '@mantlet/common';
import type { UserDto } from '@mantlet/common';
import { CheckField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useCreateUser, useUpdateUser } from '../api/users.js';

const administratorHelp = 'Keeps accounts and the shared product library. Sees a project only if on its team.';

export function NewAccount({ onClose }: { onClose: () => void }) {
  const create = useCreateUser();
  const form = useContractForm(userInputSchema, { defaultValues: { name: '', email: '', password: '', administrator: false } });
  useServerIssues(form, create.error);
  const submit = form.handleSubmit((body) => create.mutate(body, { onSuccess: onClose }));
  return (
    <FormDrawer title="New account" open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !create.isSuccess} saving={create.isPending} error={create.error} saveText="Make the account" size={440}>
      <TextField control={form.control} name="name" label="Name" />
      <TextField control={form.control} name="email" label="E-mail" type="email" />
      <TextField control={form.control} name="password" label="First password" type="password" autoComplete="new-password" help="At least 12 characters. Hand it over yourself; the person changes it under their name in the title strip." />
      <CheckField control={form.control} name="administrator" label="Administrator" help={administratorHelp} />
    </FormDrawer>
  );
}

export function EditAccount({ user, self, onClose }: { user: UserDto; self: boolean; onClose: () => void }) {
  const update = useUpdateUser(user.id);
  const form = useContractForm(userUpdateSchema, { defaultValues: { name: user.name, administrator: user.administrator, disabled: user.disabled } });
  useServerIssues(form, update.error);
  const submit = form.handleSubmit((body) => update.mutate(body, { onSuccess: onClose }));
  return (
    <FormDrawer title={user.name} open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !update.isSuccess} saving={update.isPending} error={update.error} size={440}>
      <p className="mt-sub">{user.email}</p>
      <TextField control={form.control} name="name" label="Name" />
      <CheckField control={form.control} name="administrator" label="Administrator" disabled={self} help={self ? 'You cannot take this from yourself.' : administratorHelp} />
      <CheckField control={form.control} name="disabled" label="Account closed" disabled={self} help="A closed account cannot sign in. What the person did stays in the audit trail." />
    </FormDrawer>
  );
}
