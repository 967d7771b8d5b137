import { Checkbox } from 'antd';
import { useWatch } from 'react-hook-form';
import type { BulkMember, MemberChoice, MembersChangedDto } from '@mantlet/common';
import { count } from '../../../lib/format.js';
import { SelectField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useBulkPreview } from '../api/member-list.js';
import { useBulkMembers } from '../api/members.js';
import { bulkFormSchema, emptyBulk } from './bulk-form.js';
import { ExposureFields } from './exposure-fields.js';
import { formOptions, gradeOptions, placeOptions, typeOptions, useZoneOptions } from './member-fields.js';
import { SectionField } from './section-field.js';

interface BulkDrawerProps { projectId: string; choice: MemberChoice; count: number; onClose: () => void; onChanged: (answer: MembersChangedDto) => void }
const start = { values: emptyBulk, version: null };
const kept = { allowClear: true, placeholder: 'Keep as it is' };

/** Sets the same values on many members at once; a field left empty changes nothing. */
export function BulkDrawer({ projectId, choice, count: chosen, onClose, onChanged }: BulkDrawerProps) {
  const bulk = useBulkMembers(projectId);
  const zones = useZoneOptions(projectId);
  const { form, edit } = useEditForm({
    schema: bulkFormSchema, name: `bulk/${projectId}`, title: 'Set values on several members', record: start, save: bulk,
    body: (set: BulkMember['set']) => ({ ...choice, set }), onSaved: onChanged,
  });
  const { control } = form;
  const exposure = useWatch({ control, name: 'exposure' });
  const typed = bulkFormSchema.safeParse(useWatch({ control }));
  const preview = useBulkPreview(projectId, typed.success && !bulk.isPending && !bulk.isSuccess ? { ...choice, set: typed.data } : null).data;
  return (
    <FormDrawer
      title={`Set values on ${count(chosen, 'member')}`} open onClose={onClose} edit={edit}
      saveText={`Set on ${count(chosen, 'member')}`}
    >
      <p className="mt-sub">Choose only what shall change. Results are worked out again when you save.</p>
      <p role="status" className="mt-strong">{preview ? `${preview.changes} of ${preview.chosen} would change${preview.changes < preview.chosen ? '; the others have these values already' : ''}.` : ''}</p>
      <SelectField control={control} name="zoneId" label="Zone" options={zones} search {...kept} />
      <div className="mt-form-row">
        <SelectField control={control} name="memberType" label="Type" options={typeOptions} {...kept} />
        <SelectField control={control} name="grade" label="Steel grade" options={gradeOptions} {...kept} />
      </div>
      <SectionField control={control} projectId={projectId} current={null} clearable help="Left empty, every member keeps its own section." />
      <div className="mt-form-row">
        <SelectField control={control} name="protectionForm" label="Protection form" options={formOptions} {...kept} />
        <SelectField control={control} name="onSite" label="Protected" options={placeOptions} {...kept} />
      </div>
      <fieldset>
        <legend>Exposure</legend>
        <Checkbox checked={exposure !== null} onChange={(e) => form.setValue('exposure', e.target.checked ? { arrangement: 'four-sides', reason: '' } : null, { shouldDirty: true })}>Set the exposure</Checkbox>
        {exposure !== null && <ExposureFields control={control} name="exposure" />}
      </fieldset>
    </FormDrawer>
  );
}
