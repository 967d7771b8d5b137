import { useMemo } from 'react';
import { useFormState } from 'react-hook-form';
import { projectInputSchema } from '@mantlet/common';
import type { ProjectDto, ProjectInput } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { SelectField, TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { Panel } from '../../../ui/panel.js';
import { useProject } from '../../projects/api/projects.js';
import { useMay } from '../../projects/project-context.js';
import { useUpdateProject } from '../api/team.js';
import { SettingsForm, useSavedMessage } from './settings-form.js';

const currencies = projectInputSchema.shape.currency.unwrap().options.map((value) => ({ value, label: value }));

export function ProjectParticulars({ project }: { project: ProjectDto }) {
  const may = useMay()('edit-project');
  const query = useProject(project.id);
  const save = useUpdateProject(project.id);
  const saved = useSavedMessage();
  const { number, name, place, currency, note } = project;
  const values = useMemo(() => ({ number, name, place, currency: currency as ProjectInput['currency'], note }), [number, name, place, currency, note]);
  const form = useContractForm(projectInputSchema, { values });
  const { isDirty } = useFormState({ control: form.control });
  useServerIssues(form, save.error);
  const submit = form.handleSubmit((body) => save.mutate({ ...body, version: project.version }, { onSuccess: () => { form.reset(body); saved(); } }));
  const { control } = form;
  return (
    <Panel title="Project">
      <SettingsForm
        onSubmit={(e) => { void submit(e); }} dirty={isDirty} saving={save.isPending} error={save.error} locked={may ? null : whyNot('edit-project')}
        onReload={() => { void query.refetch(); }} onUndo={() => { form.reset(values); save.reset(); }}
      >
        <div className="mt-form-row">
          <TextField control={control} name="number" label="Number" disabled={!may} />
          <SelectField control={control} name="currency" label="Currency" options={currencies} disabled={!may} />
        </div>
        <TextField control={control} name="name" label="Name" disabled={!may} />
        <TextField control={control} name="place" label="Place" disabled={!may} />
        <TextField control={control} name="note" label="Note" rows={2} disabled={!may} />
      </SettingsForm>
    </Panel>
  );
}
