import { useMemo } from 'react';
import { takeoffSettingsUpdateSchema } from '@mantlet/common';
import type { ProjectDto, ProjectSettings } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { CheckField, NumberField, RadioField, SelectField } from '../../../ui/form/fields.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { Panel } from '../../../ui/panel.js';
import { Term } from '../../../ui/term.js';
import { useMay } from '../../projects/project-context.js';
import { useSaveTakeoff } from '../api/team.js';
import { SettingsForm, useSavedMessage } from './settings-form.js';

const words: Record<string, string> = {
  'readingRules.sectionFactor': 'Between two section factors', 'readingRules.temperature': 'Between two temperatures', 'deductions.endLapMm': 'Deduction at each end',
  'deductions.openingThresholdM2': 'Openings deducted from', 'deductions.coatBackMm': 'Coat-back', markUpPercent: 'Overheads on printed lines', contractorSeesPrices: 'The contractor sees prices', distribution: 'Distribution list',
};
const versionless = takeoffSettingsUpdateSchema.omit({ version: true });

const standing = ({ settings: { designBasis: _, ...values }, version }: { settings: ProjectSettings; version: number }) => ({ values, version });

/** How tables are read and quantities taken off; changed by the specifier. */
export function TakeoffSettingsPanel({ project, settings }: { project: ProjectDto; settings: ProjectSettings }) {
  const may = useMay()('edit-takeoff');
  const save = useSaveTakeoff(project.id);
  const saved = useSavedMessage();
  const { version } = project;
  const { form, edit } = useEditForm({
    schema: versionless, name: `takeoff/${project.id}`, title: 'Takeoff and issue', save, onSaved: saved,
    // whoever changes the settings sees them
    read: (answer: { settings: ProjectSettings | null; version: number }) => standing({ settings: answer.settings ?? settings, version: answer.version }),
    record: useMemo(() => standing({ settings, version }), [settings, version]), body: (input, opened) => ({ ...input, version: opened.version ?? version }),
    words: { label: (path) => words[path] },
  });
  const { control } = form;
  const disabled = !may;
  return (
    <Panel title={<><Term name="takeoff">Takeoff</Term> and issue</>}>
      <SettingsForm edit={edit} locked={may ? null : whyNot('edit-takeoff')}>
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
