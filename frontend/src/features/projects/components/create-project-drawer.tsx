import { useNavigate } from 'react-router-dom';
import { projectCreateSchema, roleNames, roles } from '@mantlet/common';
import { CheckListField, SelectField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useCreateProject } from '../api/projects.js';

const currencies = projectCreateSchema.shape.currency.unwrap().options.map((value) => ({ value, label: value }));
const roleOptions = roles.map((value) => ({ value, label: roleNames[value] }));

export function CreateProjectDrawer({ open, onClose }: { open: boolean; onClose: () => void }) {
  const navigate = useNavigate();
  const create = useCreateProject();
  const form = useContractForm(projectCreateSchema, { defaultValues: { number: '', name: '', place: '', currency: 'EUR', note: '', roles: [] } });
  useServerIssues(form, create.error);
  const close = () => { form.reset(); create.reset(); onClose(); };
  const save = form.handleSubmit((body) => create.mutate(body, { onSuccess: (project) => { close(); void navigate(`/projects/${project.id}`); } }));
  return (
    <FormDrawer title="Start a project" open={open} onClose={close} onSubmit={(e) => { void save(e); }} dirty={form.formState.isDirty && !create.isSuccess} saving={create.isPending} error={create.error} saveText="Start the project">
      <div className="mt-form-row">
        <TextField control={form.control} name="number" label="Number" help="As your office files it, e.g. 24-017." />
        <SelectField control={form.control} name="currency" label="Currency" options={currencies} />
      </div>
      <TextField control={form.control} name="name" label="Name" />
      <TextField control={form.control} name="place" label="Place" />
      <CheckListField control={form.control} name="roles" label="Your roles on it" options={roleOptions} help="You can hold several, and change them later under Team and basis. Whoever prepares a schedule cannot check it." />
      <TextField control={form.control} name="note" label="Note" rows={3} />
    </FormDrawer>
  );
}
