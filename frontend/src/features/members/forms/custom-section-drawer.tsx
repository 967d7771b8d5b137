import { Select } from 'antd';
import { useId } from 'react';
import { useWatch } from 'react-hook-form';
import type { FieldPath } from 'react-hook-form';
import type { z } from 'zod';
import { customSectionSchema } from '@mantlet/common';
import type { CustomSection, SectionDto, SectionKind } from '@mantlet/common';
import { NumberField, TextField } from '../../../ui/form/fields.js';
import { FieldFrame } from '../../../ui/form/field-frame.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { SectionDrawing } from '../../../ui/drawing/section-drawing.js';
import { shapeDetails, shapePreview } from '../../../ui/drawing/shape-preview.js';
import { useCreateSection } from '../api/sections.js';
import { completeShape, dimensionsOf, sectionKindNames, shapeOfKind } from './custom-section.js';

type Values = z.input<typeof customSectionSchema>;
const blank = { values: { designation: '', shape: shapeOfKind('i', {}) as never } as Values, version: null };
const kinds = (Object.keys(sectionKindNames) as SectionKind[]).map((value) => ({ value, label: sectionKindNames[value] }));

interface CustomSectionDrawerProps { projectId: string; open: boolean; onClose: () => void; onMade: (section: SectionDto) => void }

/** A section of the project from its dimensions, drawn while they are typed. Its properties are computed by the server. */
export function CustomSectionDrawer({ projectId, open, onClose, onMade }: CustomSectionDrawerProps) {
  const kindId = useId();
  const create = useCreateSection(projectId);
  const { form, edit } = useEditForm<Values, CustomSection, CustomSection, SectionDto>({
    schema: customSectionSchema, name: `new-section/${projectId}`, title: 'Make a section', record: blank, save: create, body: (input) => input,
    onSaved: (section) => { onMade(section); onClose(); },
  });
  const typed = useWatch({ control: form.control, name: 'shape' }) as { kind: SectionKind } & Record<string, unknown>;
  const shape = completeShape(typed);
  const outline = shape && shapePreview(shape);
  return (
    <FormDrawer
      title="Make a section" open={open} onClose={onClose} edit={edit} saveText="Make the section"
      // the drawer's form lies inside another one in the tree of components: its submit must not reach that one
      onSubmit={(event) => { event.stopPropagation(); edit.submit(event); }}
    >
      <TextField control={form.control} name="designation" label="Name" help="As it will stand in the schedule, such as PG 800x300x15x25." />
      <FieldFrame id={kindId} label="Shape" error={undefined}>
        <Select id={kindId} value={typed.kind} options={kinds} onChange={(kind) => { form.setValue('shape', shapeOfKind(kind, typed) as never, { shouldDirty: true }); form.clearErrors('shape'); }} />
      </FieldFrame>
      <div className="mt-form-row">
        {dimensionsOf[typed.kind].map(({ name, label, unit, help }) => (
          <NumberField key={`${typed.kind} ${name}`} control={form.control} name={`shape.${name}` as FieldPath<Values>} label={label.replace('_', '')} unit={unit || undefined} min={0} {...(help && { help })} />
        ))}
      </div>
      {shape && outline
        ? <SectionDrawing outline={outline} name={form.getValues('designation') || 'the section'} details={shapeDetails(shape)} maxHeight={260} />
        : <p className="mt-help">The section is drawn here once all its dimensions are given.</p>}
    </FormDrawer>
  );
}
