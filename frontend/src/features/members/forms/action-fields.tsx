import { Button, Checkbox } from 'antd';
import { useFieldArray, useWatch } from 'react-hook-form';
import type { Control, FieldPath } from 'react-hook-form';
import { actionCategories, actionCategoryNames } from '@mantlet/common';
import { NumberField, RadioField, SelectField } from '../../../ui/form/fields.js';
import { BeamFields } from './beam-fields.js';
import { noEffects } from './structural-form.js';
import type { StructuralOut, StructuralValues } from './structural-form.js';
import type { UseFormReturn } from 'react-hook-form';

export type StructuralForm = UseFormReturn<StructuralValues, unknown, StructuralOut>;
export type StructuralControl = Control<StructuralValues, unknown, StructuralOut>;
const categories = actionCategories.map((value) => ({ value, label: actionCategoryNames[value] }));
const actions = 'basis.design.actions';

/** Axial force, bending and shear of one action, with their signs and axes said once in the heading's help. */
function EffectFields({ control, name }: { control: StructuralControl; name: string }) {
  const at = (field: string) => `${name}.${field}` as FieldPath<StructuralValues>;
  return (
    <div className="mt-form-row">
      <NumberField control={control} name={at('axialKn')} label="Axial force N" unit="kN" help="Compression positive, tension negative." />
      <NumberField control={control} name={at('momentYKnm')} label="Moment My" unit="kNm" help="Greatest, about the strong axis." />
      <NumberField control={control} name={at('momentZKnm')} label="Moment Mz" unit="kNm" help="Greatest, about the weak axis." />
      <NumberField control={control} name={at('shearZKn')} label="Shear Vz" unit="kN" help="Greatest, parallel to the web." />
    </div>
  );
}

const CategoryField = ({ control, name }: { control: StructuralControl; name: string }) => (
  <SelectField control={control} name={`${name}.category` as FieldPath<StructuralValues>} label="Category" options={categories} help="EN 1990 Table A1.1; its ψ factors are the project's." />
);

function Accompanying({ control }: { control: StructuralControl }) {
  const list = useFieldArray({ control, name: `${actions}.accompanying` });
  return (
    <fieldset>
      <legend>Accompanying variable actions</legend>
      {list.fields.map((field, i) => (
        <div key={field.id} className="mt-stack">
          <CategoryField control={control} name={`${actions}.accompanying.${i}`} />
          <EffectFields control={control} name={`${actions}.accompanying.${i}`} />
          <div><Button size="small" onClick={() => list.remove(i)}>Remove this action</Button></div>
        </div>
      ))}
      {list.fields.length === 0 && <p className="mt-help">None. They enter with ψ2.</p>}
      <div><Button size="small" disabled={list.fields.length >= 10} onClick={() => list.append({ ...noEffects, category: 'wind' })}>Add an action</Button></div>
    </fieldset>
  );
}

function Characteristic({ form }: { form: StructuralForm }) {
  const { control } = form;
  const leading = useWatch({ control, name: `${actions}.leading` });
  const toggle = (on: boolean) => form.setValue(`${actions}.leading`, on ? { ...noEffects, category: 'B' } : null, { shouldDirty: true });
  return (
    <>
      <fieldset><legend>Permanent action, characteristic</legend><EffectFields control={control} name={`${actions}.permanent`} /></fieldset>
      <fieldset>
        <legend>Leading variable action, characteristic</legend>
        <Checkbox checked={leading !== null} onChange={(e) => toggle(e.target.checked)}>There is a variable action</Checkbox>
        {leading !== null && <><CategoryField control={control} name={`${actions}.leading`} /><EffectFields control={control} name={`${actions}.leading`} /></>}
      </fieldset>
      {leading !== null && <Accompanying control={control} />}
    </>
  );
}

/** Characteristic actions, combined for fire by the server, or the effect in fire itself. */
export function ActionFields({ form }: { form: StructuralForm }) {
  const { control } = form;
  const given = useWatch({ control, name: `${actions}.given` });
  return (
    <>
      <RadioField
        control={control} name={`${actions}.given`} label="Actions given as"
        options={[{ value: 'loads', label: 'Beam with its loads' }, { value: 'characteristic', label: 'Characteristic actions' }, { value: 'fire-effect', label: 'Effect in fire' }]}
        help={given === 'fire-effect' ? 'Already combined: E fi,d. Nothing is added or reduced.' : 'Combined by EN 1990 6.4.3.3 with the ψ factors of the design basis.'}
      />
      {given === 'fire-effect' && <fieldset><legend>Effect in fire</legend><EffectFields control={control} name={`${actions}.effect`} /></fieldset>}
      {given === 'characteristic' && <Characteristic form={form} />}
      {given === 'loads' && <BeamFields form={form} />}
    </>
  );
}
