import { useMemo } from 'react';
import { useWatch } from 'react-hook-form';
import type { FieldPath } from 'react-hook-form';
import { defaultDesignBasis, loadHeightNames, loadHeights, memberTypeNames, momentShapeNames, wayNames } from '@mantlet/common';
import type { CriticalTemperatureWay, MemberDto, MemberType, MomentShape } from '@mantlet/common';
import { fieldName } from '../../../lib/record-words.js';
import { CheckField, NumberField, RadioField, SelectField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useCurrentProject } from '../../projects/project-context.js';
import { useSetStructural } from '../api/members.js';
import { ActionFields } from './action-fields.js';
import type { StructuralForm } from './action-fields.js';
import { structuralFormSchema, structuralValues } from './structural-form.js';
import type { StructuralOut, StructuralValues } from './structural-form.js';

const ways = (['calculated', 'utilisation', 'ambient-utilisation', 'declared', 'assumed', 'none'] as const satisfies readonly CriticalTemperatureWay[]).map((value) => ({ value, label: wayNames[value] }));
const bucklingRules = [
  { value: 'given', label: 'As given' },
  { value: 'braced-intermediate', label: 'Braced column, between storeys: half the storey height' },
  { value: 'braced-top', label: 'Braced column, top storey: 0.7 of its height' },
];
const heights = loadHeights.map((value) => ({ value, label: loadHeightNames[value] }));
const shapes = (Object.keys(momentShapeNames) as MomentShape['kind'][]).map((value) => ({ value, label: momentShapeNames[value] }));
const design = 'basis.design';

/** What lateral-torsional buckling needs to know beside a described beam's own diagram. */
function LateralFields({ control, described }: { control: StructuralForm['control']; described: boolean }) {
  const shape = useWatch({ control, name: `${design}.momentShapeY.kind` });
  return (
    <>
      <SelectField control={control} name={`${design}.loadHeight`} label="Loads act at the" options={heights} help="Above the shear centre they help the beam to buckle." />
      {!described && (
        <div className="mt-form-row">
          <NumberField control={control} name={`${design}.lateralSpacingMm`} label="Distance between lateral supports" unit="mm" min={0} />
          <SelectField control={control} name={`${design}.momentShapeY.kind`} label="Moment between them" options={shapes} help="A distributed load or a force counts as one without moment at the lateral supports; for a length with moments at its ends, take the end moments." />
          {shape === 'end-moments' && <NumberField control={control} name={`${design}.momentShapeY.ratio` as FieldPath<StructuralValues>} label="Ratio of end moments" min={-1} max={1} help="Smaller over greater; 1 uniform, negative in double curvature." />}
        </div>
      )}
    </>
  );
}

const restraintHelp = {
  described: 'As by a slab. Where the moment hogs, buckling of the bottom flange is checked all the same between the supports and the lateral supports, which hold against twist.',
  effects: 'Needed of every member bent about y, columns too. Held at points, lateral-torsional buckling is checked for the length between them, EN 1993-1-2 4.2.3.3(4).',
};

function CalculatedFields({ form }: { form: StructuralForm }) {
  const { control } = form;
  const restraint = useWatch({ control, name: `${design}.lateralRestraint` });
  const described = useWatch({ control, name: `${design}.actions.given` }) === 'loads';
  return (
    <>
      <ActionFields form={form} />
      <fieldset>
        <legend>Buckling</legend>
        <div className="mt-form-row">
          <NumberField control={control} name={`${design}.bucklingLengthYMm`} label="System length, axis y" unit="mm" min={0} help="Between restraints against buckling about the strong axis." />
          <NumberField control={control} name={`${design}.bucklingLengthZMm`} label="System length, axis z" unit="mm" min={0} help="The same about the weak axis." />
        </div>
        <SelectField control={control} name={`${design}.bucklingRule`} label="Buckling length in fire" options={bucklingRules} help="EN 1993-1-2 4.2.3.2(5). The reductions hold only for continuous columns of a braced frame whose storeys are fire compartments: choosing one confirms that." />
      </fieldset>
      <fieldset>
        <legend>Bending</legend>
        <RadioField control={control} name={`${design}.lateralRestraint`} label={described ? 'Top flange' : 'Compression flange'} options={[{ value: 'continuous', label: 'Held along its length' }, { value: 'at-points', label: 'Held at points only' }]} help={described ? restraintHelp.described : restraintHelp.effects} />
        {restraint === 'at-points' && <LateralFields control={control} described={described} />}
        {!described && <CheckField control={control} name={`${design}.continuousBeam`} label="The moment is over a support of a continuous beam" help="κ2 = 0.85, EN 1993-1-2 4.2.3.3(8). There the bottom flange is compressed, which a slab does not hold." />}
        <CheckField control={control} name={`${design}.composite`} label="Composite with the slab" help="Not calculated here: give its utilisation or declare its temperature." />
        <CheckField control={control} name={`${design}.webOpenings`} label="Has web openings" help="Not calculated here: needs a declared temperature." />
      </fieldset>
    </>
  );
}

function WayFields({ form, memberType }: { form: StructuralForm; memberType: MemberType }) {
  const { control } = form;
  const basis = useCurrentProject().settings?.designBasis ?? defaultDesignBasis;
  const way = useWatch({ control, name: 'basis.way' });
  const reference = <TextField control={control} name="basis.reference" label="Reference" help="Where the value comes from: calculation, sheet, date." />;
  const beam = memberType === 'beam' || memberType === 'secondary-beam';
  const buckles = beam && <CheckField control={control} name="basis.mayBuckle" label="The beam may buckle" help="Lateral-torsional or shear buckling may govern. Unmarked: held laterally, so that equation (4.22) or k y alone holds. EN 1993-1-2 4.2.4." />;
  switch (way) {
    case 'declared': return <><NumberField control={control} name="basis.temperatureC" label="Critical temperature" unit="°C" help={`100 to 1200 °C. Above ${basis.secondSignatureAboveC} °C the fire engineer is asked to accept it.`} />{reference}</>;
    case 'utilisation': return <><NumberField control={control} name="basis.mu0" label="Degree of utilisation μ0" min={0} help="Effect in fire over the resistance at the start of the fire: E fi,d / R fi,d,0. EN 1993-1-2 4.2.4(3)." />{buckles}{reference}</>;
    case 'ambient-utilisation':
      return (
        <>
          <NumberField control={control} name="basis.utilisation" label="Utilisation cold" min={0} help="E d / R d of the ambient design; multiplied by η fi." />
          <NumberField control={control} name="basis.etaFi" label="Reduction factor η fi" min={0} max={1} help={`Left empty, the project's ${basis.etaFi} is used. EN 1993-1-2 2.4.2.`} />
          {buckles}
          {reference}
        </>
      );
    case 'calculated': return <><CalculatedFields form={form} />{reference}</>;
    case 'assumed': return <p className="mt-sub">The project assumes {basis.assumedTemperatureC[memberType]} °C for a {memberTypeNames[memberType].toLowerCase()}. It is shown as assumed, and blocks the schedule until the fire engineer accepts it.</p>;
    case 'none': return <p className="mt-sub">Nothing is given: the member's result is not determined.</p>;
  }
}

interface StructuralDrawerProps { projectId: string; member: MemberDto; onClose: () => void }

const standing = ({ basis, version }: MemberDto) => ({ values: structuralValues(basis), version });
/** Fields that this form calls otherwise than the record does. */
const formWords: Record<string, string> = { 'basis.way': 'How it comes about', 'basis.temperatureC': 'Critical temperature', 'basis.mu0': 'Degree of utilisation μ0', 'basis.etaFi': 'Reduction factor ηfi' };
/** "basis.design.actions.permanent.axialKn" → "Permanent action axial force N"; the form itself says that all of it is the basis. */
const label = (path: string): string | undefined => formWords[path] ?? (path.startsWith('basis.') ? capital(fieldName(path.replace(/^basis\.(design\.(actions\.)?)?/, ''))) : undefined);
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** How the critical temperature of a member comes about: the structural engineer's alone, kept with name, date and reference. */
export function StructuralDrawer({ projectId, member, onClose }: StructuralDrawerProps) {
  const save = useSetStructural(projectId, member.id);
  const title = `Critical temperature of ${member.mark}`;
  const { form, edit } = useEditForm<StructuralValues, StructuralOut, StructuralOut & { version: number }, MemberDto>({
    schema: structuralFormSchema, name: `structural/${member.id}`, title, read: standing, save, onSaved: onClose,
    record: useMemo(() => standing(member), [member]), body: (input, { version }) => ({ ...input, version: version ?? member.version }), words: { label },
  });
  return (
    <FormDrawer title={title} open onClose={onClose} edit={edit} size={680}>
      <SelectField control={form.control} name="basis.way" label="How it comes about" options={ways} />
      <WayFields form={form} memberType={member.memberType} />
    </FormDrawer>
  );
}
