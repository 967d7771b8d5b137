import { useMemo } from 'react';
import { projectInputSchema } from '@mantlet/common';
import type { ProjectDto, ProjectInput } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { SelectField, TextField } from '../../../ui/form/fields.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { Panel } from '../../../ui/panel.js';
import { useMay } from '../../projects/project-context.js';
import { useUpdateProject } from '../api/team.js';
import { SettingsForm, useSavedMessage } from './settings-form.js';

const currencies = projectInputSchema.shape.currency.unwrap().options.map((value) => ({ value, label: value }));

const standing = ({ number, name, place, currency, note, version }: Pick<ProjectDto, 'number' | 'name' | 'place' | 'currency' | 'note' | 'version'>) => ({
  values: { number, name, place, currency: currency as ProjectInput['currency'], note }, version,
});

export function ProjectParticulars({ project }: { project: ProjectDto }) {
  const may = useMay()('edit-project');
  const save = useUpdateProject(project.id);
  const saved = useSavedMessage();
  const { form, edit } = useEditForm({
    schema: projectInputSchema, name: `project/${project.id}`, title: 'Project', read: standing, save, onSaved: saved,
    record: useMemo(() => standing(project), [project]), body: (input, { version }) => ({ ...input, version: version ?? project.version }),
  });
  const { control } = form;
  return (
    <Panel title="Project">
      <SettingsForm edit={edit} locked={may ? null : whyNot('edit-project')}>
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
