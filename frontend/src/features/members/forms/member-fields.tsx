import { Button } from 'antd';
import { useState } from 'react';
import { memberTypeNames, memberTypes, steelGrades } from '@mantlet/common';
import type { SectionDto } from '@mantlet/common';
import { CheckField, NumberField, RadioField, SelectField, TextField } from '../../../ui/form/fields.js';
import { useZones } from '../../zones/api/zones.js';
import { CustomSectionDrawer } from './custom-section-drawer.js';
import { ExposureFields } from './exposure-fields.js';
import type { MemberForm } from './member-form.js';
import { ChosenSection, SectionField } from './section-field.js';

export const typeOptions = memberTypes.map((value) => ({ value, label: memberTypeNames[value] }));
export const gradeOptions = steelGrades.map((value) => ({ value, label: value }));
export const formOptions = [{ value: 'profile', label: 'Following the profile' }, { value: 'boxed', label: 'Boxed' }];
export const placeOptions = [{ value: 'site', label: 'On site' }, { value: 'shop', label: 'In the shop' }];

export function useZoneOptions(projectId: string) {
  return (useZones(projectId).data ?? []).map((z) => ({ value: z.id, label: `${z.code} ${z.name}, R ${z.periodMin}` }));
}

/** What the specifier decides of a member. */
export function MemberFields({ form, projectId, section, setSection }: { form: MemberForm; projectId: string; section: SectionDto | null; setSection: (s: SectionDto) => void }) {
  const zones = useZoneOptions(projectId);
  const [making, setMaking] = useState(false);
  const { control } = form;
  const made = (next: SectionDto) => {
    setSection(next);
    form.setValue('sectionId', next.id, { shouldDirty: true, shouldValidate: true });
  };
  return (
    <>
      <div className="mt-form-row">
        <TextField control={control} name="mark" label="Mark" help="Names one member, or identical ones." />
        <NumberField control={control} name="quantity" label="Number off" min={1} decimals={0} />
      </div>
      <SelectField control={control} name="zoneId" label="Zone" options={zones} search help="Gives the member its period and fire." />
      <div className="mt-form-row">
        <SelectField control={control} name="memberType" label="Type" options={typeOptions} />
        <SelectField control={control} name="grade" label="Steel grade" options={gradeOptions} />
        <NumberField control={control} name="lengthMm" label="Length" unit="mm" min={0} />
      </div>
      <fieldset>
        <legend>Section</legend>
        <SectionField control={control} projectId={projectId} current={section} onChosen={setSection} />
        <div><Button size="small" onClick={() => setMaking(true)}>Make a section from dimensions</Button></div>
        <ChosenSection section={section} />
        {making && <CustomSectionDrawer projectId={projectId} open onClose={() => setMaking(false)} onMade={made} />}
      </fieldset>
      <fieldset>
        <legend>Fire and protection</legend>
        <ExposureFields control={control} name="exposure" />
        <RadioField control={control} name="protectionForm" label="Protection form" options={formOptions} help="Boards enclose, reactive coatings follow the profile; a spray may do either." />
        <CheckField control={control} name="onSite" label="Protected on site" help="Otherwise in the fabricator's shop." />
      </fieldset>
      <fieldset>
        <legend>Takeoff</legend>
        <div className="mt-form-row">
          <NumberField control={control} name="coatBackConnections" label="Coat-back connections" min={0} decimals={0} help="Bare secondary steel that meets this member." />
          <NumberField control={control} name="coatBackGirthMm" label="Coat-back girth" unit="mm" min={0} help="Girth of that secondary steel." />
          <NumberField control={control} name="deductionM2" label="Deduction" unit="m²" min={0} help="Faces not to be protected, whole member." />
        </div>
        <TextField control={control} name="note" label="Note" rows={2} />
      </fieldset>
    </>
  );
}
