import { useWatch } from 'react-hook-form';
import type { FieldPath, FieldValues } from 'react-hook-form';
import type { Exposure } from '@mantlet/common';
import { exposureArrangements, exposureNames, faceNames } from '@mantlet/common';
import { CheckListField, SelectField, TextField } from '../../../ui/form/fields.js';
import type { AnyControl } from '../../../ui/form/fields.js';

const arrangements = exposureArrangements.map((value) => ({ value, label: exposureNames[value] }));
const faces = faceNames.map((value) => ({ value, label: value.charAt(0).toUpperCase() + value.slice(1) }));
const sides = faces.filter((f) => f.value === 'left' || f.value === 'right');
const facesWords: Partial<Record<Exposure['arrangement'], { label: string; help: string; options: typeof faces }>> = {
  'given-faces': { label: 'Faces that see fire', help: 'Of the box round the section, as drawn.', options: faces },
  'slab-edge-two-sides': { label: 'Side that sees fire', help: 'Left or right as drawn; the right one where nothing is chosen.', options: sides },
};

/** How the fire reaches the member; the reason is printed with the schedule. */
export function ExposureFields<T extends FieldValues>({ control, name }: { control: AnyControl<T>; name: string }) {
  const at = (field: string) => `${name}.${field}` as FieldPath<T>;
  const arrangement = useWatch({ control, name: at('arrangement') }) as Exposure['arrangement'] | undefined;
  const wanted = arrangement ? facesWords[arrangement] : undefined;
  return (
    <>
      <SelectField control={control} name={at('arrangement')} label="Exposure" options={arrangements} help="The sides of the section that fire reaches; they make its heated perimeter." />
      {wanted && <CheckListField control={control} name={at('faces')} {...wanted} />}
      <TextField control={control} name={at('reason')} label="Reason for the exposure" help="Such as: concrete slab on the top flange. Printed with the schedule." />
    </>
  );
}
