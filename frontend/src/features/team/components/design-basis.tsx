import { useMemo } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { actionCategories, actionCategoryNames, designBasisSchema, memberTypeNames, memberTypes } from '@mantlet/common';
import type { ProjectDto, ProjectSettings } from '@mantlet/common';
import { whyNot } from '../../../lib/may.js';
import { CheckField, NumberField, RadioField } from '../../../ui/form/fields.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { Panel } from '../../../ui/panel.js';
import { Term } from '../../../ui/term.js';
import { useMay } from '../../projects/project-context.js';
import { useSaveDesignBasis } from '../api/team.js';
import { SettingsForm, useSavedMessage } from './settings-form.js';

type Form = UseFormReturn<z.input<typeof designBasisSchema>, unknown, z.output<typeof designBasisSchema>>;
interface PartProps { form: Form; disabled: boolean }

function Actions({ form: { control }, disabled }: PartProps) {
  return (
    <fieldset>
      <legend>Actions in fire</legend>
      <RadioField
        control={control} name="psiFi" label="ψ of the leading variable action" disabled={disabled} help="EN 1990 6.4.3.3 and EN 1991-1-2 4.3.1: a national choice."
        options={[{ value: 'psi1', label: 'ψ1, frequent' }, { value: 'psi2', label: 'ψ2, quasi-permanent' }]}
      />
      <div className="mt-form-row">
        <NumberField control={control} name="gammaG" label="γG" disabled={disabled} help="Permanent, cold" />
        <NumberField control={control} name="gammaQ" label="γQ" disabled={disabled} help="Variable, cold" />
        <NumberField control={control} name="etaFi" label="ηfi" disabled={disabled} help="Where not worked out, EN 1993-1-2 2.4.2" />
      </div>
    </fieldset>
  );
}

function Psi({ form: { control }, disabled }: PartProps) {
  return (
    <fieldset>
      <legend>ψ by category</legend>
      <p className="mt-help">EN 1990 Table A1.1; the National Annex governs.</p>
      <div className="mt-psi">
        {actionCategories.map((category) => (
          <div key={category} className="mt-psi-row" role="group" aria-label={actionCategoryNames[category]}>
            <span className="mt-psi-name">{actionCategoryNames[category]}</span>
            <NumberField control={control} name={`psi.${category}.psi1`} label="ψ1" disabled={disabled} />
            <NumberField control={control} name={`psi.${category}.psi2`} label="ψ2" disabled={disabled} />
          </div>
        ))}
      </div>
    </fieldset>
  );
}

function Steel({ form: { control }, disabled }: PartProps) {
  return (
    <fieldset>
      <legend>Steel and resistance</legend>
      <RadioField
        control={control} name="utilisationMethod" label="Critical temperature from utilisation" disabled={disabled}
        options={[{ value: 'equation-4.22', label: 'Equation (4.22)' }, { value: 'inversion-of-ky', label: 'Inversion of ky, Table 3.1' }]}
        help="The equation is a fit and lies a few degrees from the table; the method is named on every result."
      />
      <div className="mt-form-row">
        <NumberField control={control} name="gammaMFi" label="γM,fi" disabled={disabled} help="EN 1993-1-2 2.3" />
        <NumberField control={control} name="emissivitySteel" label="Emissivity εm" disabled={disabled} help="EN 1993-1-2 2.2" />
        <NumberField control={control} name="class4TemperatureC" label="Class 4 sections" unit="°C" disabled={disabled} help="EN 1993-1-2 4.2.3.6" />
      </div>
      <CheckField control={control} name="shadowEffect" label="Shadow effect for bare I sections" disabled={disabled} help="EN 1993-1-2 4.2.5.1" />
    </fieldset>
  );
}

function Assumed({ form: { control }, disabled }: PartProps) {
  return (
    <fieldset>
      <legend><Term name="assumed">Assumed</Term> critical temperatures</legend>
      <p className="mt-help">Used only where nothing better is given; each blocks issue until the fire engineer accepts it. Common practice: 550 °C for columns, 620 °C for beams that carry a slab.</p>
      <div className="mt-form-row">
        {memberTypes.map((type) => <NumberField key={type} control={control} name={`assumedTemperatureC.${type}`} label={memberTypeNames[type]} unit="°C" disabled={disabled} />)}
      </div>
      <NumberField control={control} name="secondSignatureAboveC" label="Second signature above" unit="°C" disabled={disabled} width={160} help="Common practice: 650 °C." />
    </fieldset>
  );
}

/** Every factor of the design basis, shown to the team and changed by the fire engineer. */
export function DesignBasisPanel({ project, settings }: { project: ProjectDto; settings: ProjectSettings }) {
  const may = useMay()('edit-design-basis');
  const save = useSaveDesignBasis(project.id);
  const saved = useSavedMessage();
  const { version } = project;
  const { form, edit } = useEditForm({
    schema: designBasisSchema, name: `design-basis/${project.id}`, title: 'Design basis', save, onSaved: saved,
    // whoever changes the settings sees them
    read: (answer: { settings: ProjectSettings | null; version: number }) => ({ values: (answer.settings ?? settings).designBasis, version: answer.version }),
    record: useMemo(() => ({ values: settings.designBasis, version }), [settings, version]),
    body: (designBasis, opened) => ({ designBasis, version: opened.version ?? version }),
  });
  const part = { form, disabled: !may };
  return (
    <Panel title={<Term name="design-basis" />} sub="EN 1990, EN 1991-1-2 and EN 1993-1-2. Nothing here is a hidden constant.">
      <SettingsForm edit={edit} locked={may ? null : whyNot('edit-design-basis')}>
        <Actions {...part} />
        <Steel {...part} />
        <Assumed {...part} />
        <Psi {...part} />
      </SettingsForm>
    </Panel>
  );
}
