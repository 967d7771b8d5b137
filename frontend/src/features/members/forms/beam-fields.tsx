import { Button } from 'antd';
import { useFieldArray, useWatch } from 'react-hook-form';
import type { FieldPath } from 'react-hook-form';
import { actionCategories, actionCategoryNames, beamSupportNames, beamSupports } from '@mantlet/common';
import { BeamDrawing } from '../../../ui/drawing/beam-drawing.js';
import { NumberField, SelectField } from '../../../ui/form/fields.js';
import type { StructuralControl, StructuralForm } from './action-fields.js';
import { newLoad } from './structural-form.js';
import type { StructuralValues } from './structural-form.js';

const actions = 'basis.design.actions';
const kinds = [{ value: 'permanent', label: 'Permanent' }, ...actionCategories.map((value) => ({ value, label: actionCategoryNames[value] }))];
const supports = beamSupports.map((value) => ({ value, label: beamSupportNames[value] }));

function LoadFields({ control, index, onRemove }: { control: StructuralControl; index: number; onRemove: () => void }) {
  const kind = useWatch({ control, name: `${actions}.loads.${index}.kind` });
  const at = (field: string) => `${actions}.loads.${index}.${field}` as FieldPath<StructuralValues>;
  return (
    <div className="mt-stack" role="group" aria-label={`Load ${index + 1}`}>
      <SelectField control={control} name={at('action')} label={`Load ${index + 1}: ${kind === 'point' ? 'a force' : 'distributed'}`} options={kinds} />
      {kind === 'point' ? (
        <div className="mt-form-row">
          <NumberField control={control} name={at('atMm')} label="At" unit="mm" min={0} help="From the left support." />
          <NumberField control={control} name={at('forceKn')} label="Force" unit="kN" help="Characteristic; downward positive." />
        </div>
      ) : (
        <>
          <div className="mt-form-row">
            <NumberField control={control} name={at('fromMm')} label="From" unit="mm" min={0} />
            <NumberField control={control} name={at('toMm')} label="To" unit="mm" min={0} help="From the left support." />
          </div>
          <div className="mt-form-row">
            <NumberField control={control} name={at('startKnPerM')} label="At its start" unit="kN/m" />
            <NumberField control={control} name={at('endKnPerM')} label="At its end" unit="kN/m" help="Characteristic; downward positive." />
          </div>
        </>
      )}
      <div><Button size="small" onClick={onRemove}>Remove load {index + 1}</Button></div>
    </div>
  );
}

function LateralSupports({ form }: { form: StructuralForm }) {
  const name = `${actions}.lateralSupportsMm` as const;
  const places = useWatch({ control: form.control, name }) ?? [];
  const set = (next: (number | null)[]) => form.setValue(name, next, { shouldDirty: true });
  return (
    <fieldset>
      <legend>Lateral supports between the ends</legend>
      <p className="mt-help">Places that hold the beam sideways and against twist. Its supports do so too; a cantilever's tip only if it is named here.</p>
      {places.map((_, i) => (
        <div key={i} className="mt-form-row">
          <NumberField control={form.control} name={`${name}.${i}` as FieldPath<StructuralValues>} label={`Lateral support ${i + 1}`} unit="mm" min={0} help="From the left support." />
          <div className="mt-form-end"><Button size="small" onClick={() => set(places.filter((__, at) => at !== i))}>Remove lateral support {i + 1}</Button></div>
        </div>
      ))}
      <div><Button size="small" disabled={places.length >= 50} onClick={() => set([...places, null])}>Add a lateral support</Button></div>
    </fieldset>
  );
}

/** Follows what is typed. Held along its length, the places between its ends say nothing, and are not drawn. */
function Sketch({ control }: { control: StructuralControl }) {
  const [supports, spanMm, loads, lateralSupportsMm, restraint] = useWatch({
    control, name: [`${actions}.supports`, `${actions}.spanMm`, `${actions}.loads`, `${actions}.lateralSupportsMm`, 'basis.design.lateralRestraint'],
  });
  return <BeamDrawing beam={{ supports, spanMm, loads: loads ?? [], lateralSupportsMm: lateralSupportsMm ?? [] }} showLateral={restraint === 'at-points'} />;
}

/** The beam as it stands: supports, loads where they are, and what holds it sideways. Moments and shears follow from it. */
export function BeamFields({ form }: { form: StructuralForm }) {
  const { control } = form;
  const loads = useFieldArray({ control, name: `${actions}.loads` });
  return (
    <>
      <fieldset>
        <legend>Span</legend>
        <div className="mt-form-row">
          <SelectField control={control} name={`${actions}.supports`} label="Supports" options={supports} />
          <NumberField control={control} name={`${actions}.spanMm`} label="Span" unit="mm" min={0} />
        </div>
      </fieldset>
      <fieldset>
        <legend>Characteristic loads</legend>
        <Sketch control={control} />
        {loads.fields.map((field, i) => <LoadFields key={field.id} control={control} index={i} onRemove={() => loads.remove(i)} />)}
        <div className="mt-actions">
          <Button size="small" disabled={loads.fields.length >= 50} onClick={() => loads.append(newLoad('distributed') as never)}>Add a distributed load</Button>
          <Button size="small" disabled={loads.fields.length >= 50} onClick={() => loads.append(newLoad('point') as never)}>Add a force</Button>
        </div>
        <NumberField control={control} name={`${actions}.axialInFireKn`} label="Axial force in fire beside the loads" unit="kN" help="Already combined; compression positive. 0 where there is none." />
      </fieldset>
      <LateralSupports form={form} />
    </>
  );
}
