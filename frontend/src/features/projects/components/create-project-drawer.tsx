import type { z } from 'zod';
import { useNavigate } from 'react-router-dom';
import { projectCreateSchema } from '@mantlet/common';
import { CheckListField, SelectField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useCreateProject } from '../api/projects.js';
import { roleOptions } from './role-options.js';

const currencies = projectCreateSchema.shape.currency.unwrap().options.map((value) => ({ value, label: value }));

const blank = { values: { number: '', name: '', place: '', currency: 'EUR', note: '', roles: [] } as z.input<typeof projectCreateSchema>, version: null };

export function CreateProjectDrawer({ open, onClose }: { open: boolean; onClose: () => void }) {
  const navigate = useNavigate();
  const create = useCreateProject();
  const { form, edit } = useEditForm({
    schema: projectCreateSchema, name: 'new-project', title: 'Start a project', record: blank, save: create, body: (input) => input,
    onSaved: (project) => { onClose(); void navigate(`/projects/${project.id}`); },
  });
  return (
    <FormDrawer title="Start a project" open={open} onClose={onClose} edit={edit} saveText="Start the project">
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
