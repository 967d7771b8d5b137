import { useMemo } from 'react';
import { useFormState } from 'react-hook-form';
import { takeoffSettingsUpdateSchema } from '@mantlet/common';
import type { ProjectDto, ProjectSettings } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { CheckField, NumberField, RadioField, SelectField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { Panel } from '../../../ui/panel.js';
import { Term } from '../../../ui/term.js';
import { useProject } from '../../projects/api/projects.js';
import { useMay } from '../../projects/project-context.js';
import { useSaveTakeoff } from '../api/team.js';
import { SettingsForm, useSavedMessage } from './settings-form.js';

const versionless = takeoffSettingsUpdateSchema.omit({ version: true });

/** How tables are read and quantities taken off; changed by the specifier. */
export function TakeoffSettingsPanel({ project, settings }: { project: ProjectDto; settings: ProjectSettings }) {
  const may = useMay()('edit-takeoff');
  const query = useProject(project.id);
  const save = useSaveTakeoff(project.id);
  const saved = useSavedMessage();
  const values = useMemo(() => {
    const { designBasis: _, ...rest } = settings;
    return rest;
  }, [settings]);
  const form = useContractForm(versionless, { values });
  const { isDirty } = useFormState({ control: form.control });
  useServerIssues(form, save.error);
  const submit = form.handleSubmit((body) => save.mutate({ ...body, version: project.version }, { onSuccess: () => { form.reset(body); saved(); } }));
  const { control } = form;
  const disabled = !may;
  return (
    <Panel title={<><Term name="takeoff">Takeoff</Term> and issue</>}>
      <SettingsForm
        onSubmit={(e) => { void submit(e); }} dirty={isDirty} saving={save.isPending} error={save.error} locked={may ? null : whyNot('edit-takeoff')}
        onReload={() => { void query.refetch(); }} onUndo={() => { form.reset(values); save.reset(); }}
      >
        <fieldset>
          <legend>Reading thickness tables</legend>
          <RadioField control={control} name="readingRules.sectionFactor" label="Between two section factors" disabled={disabled} options={[{ value: 'linear', label: 'Linear' }, { value: 'next-row-up', label: 'Next row up' }]} />
          <RadioField control={control} name="readingRules.temperature" label="Between two temperatures" disabled={disabled} options={[{ value: 'next-below', label: 'Next lower column' }, { value: 'linear', label: 'Linear' }]} help="Linear only where the product's assessment allows it." />
        </fieldset>
        <fieldset>
          <legend>Quantities</legend>
          <div className="mt-form-row">
            <NumberField control={control} name="deductions.endLapMm" label="Deduction at each end" term="deduction" unit="mm" disabled={disabled} />
            <NumberField control={control} name="deductions.openingThresholdM2" label="Openings deducted from" unit="m²" disabled={disabled} />
            <NumberField control={control} name="deductions.coatBackMm" label="Coat-back" term="coat-back" unit="mm" disabled={disabled} help="Common practice: 450 to 500 mm" />
          </div>
          <div className="mt-form-row">
            <NumberField control={control} name="markUpPercent" label="Overheads on printed lines" unit="%" text disabled={disabled} />
          </div>
          <CheckField control={control} name="contractorSeesPrices" label="The contractor sees prices" disabled={disabled} />
        </fieldset>
        <fieldset>
          <legend>Issue</legend>
          <SelectField control={control} name="distribution" label="Distribution list" tags options={[]} disabled={disabled} placeholder="name@example.org, then Enter" help="Each address is told when a revision is issued." />
        </fieldset>
      </SettingsForm>
    </Panel>
  );
}
