import { useWatch } from 'react-hook-form';
import { wayNames } from '@mantlet/common';
import type { MemberChoice, MembersChangedDto } from '@mantlet/common';
import { count as counted } from '../../../lib/format.js';
import { NumberField, SelectField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useBulkStructural } from '../api/member-list.js';
import { structuralFormSchema, structuralValues } from './structural-form.js';

// actions are each member's own, so that "calculated" is set on its sheet
const ways = (['declared', 'utilisation', 'ambient-utilisation', 'assumed', 'none'] as const).map((value) => ({ value, label: wayNames[value] }));
const start = { values: { basis: { ...structuralValues({ way: 'none' }).basis, way: 'declared' as const } }, version: null };

interface BulkStructuralDrawerProps { projectId: string; choice: MemberChoice; count: number; onClose: () => void; onChanged: (answer: MembersChangedDto) => void }

/** The same way to a critical temperature for many members: the structural engineer's alone. */
export function BulkStructuralDrawer({ projectId, choice, count, onClose, onChanged }: BulkStructuralDrawerProps) {
  const save = useBulkStructural(projectId);
  const { form, edit } = useEditForm({
    schema: structuralFormSchema, name: `bulk-structural/${projectId}`, title: 'Critical temperature of several members', record: start, save,
    body: ({ basis }) => ({ ...choice, basis }), onSaved: onChanged,
  });
  const { control } = form;
  const way = useWatch({ control, name: 'basis.way' });
  const reference = <TextField control={control} name="basis.reference" label="Reference" help="Where the value comes from: calculation, sheet, date." />;
  return (
    <FormDrawer title={`Critical temperature of ${counted(count, 'member')}`} open onClose={onClose} edit={edit} saveText={`Set on ${counted(count, 'member')}`}>
      <p className="mt-sub">All {count} get the same, under your name and today’s date; what each had before stays in its history. Actions are set on a member’s own sheet.</p>
      <SelectField control={control} name="basis.way" label="How it comes about" options={ways} />
      {way === 'declared' && <NumberField control={control} name="basis.temperatureC" label="Critical temperature" unit="°C" help="100 to 1200 °C." />}
      {way === 'utilisation' && <NumberField control={control} name="basis.mu0" label="Degree of utilisation μ0" min={0} help="E fi,d / R fi,d,0. Beams are held against buckling as well; say otherwise on a member’s own sheet." />}
      {way === 'ambient-utilisation' && <NumberField control={control} name="basis.utilisation" label="Utilisation cold" min={0} help="E d / R d, multiplied by the project’s η fi." />}
      {way === 'assumed' && <p className="mt-sub">Each rests on the project’s assumption for its type, and blocks the schedule until the fire engineer accepts it.</p>}
      {way === 'none' && <p className="mt-sub">Nothing is given: their results are not determined.</p>}
      {way !== 'assumed' && way !== 'none' && reference}
    </FormDrawer>
  );
}
