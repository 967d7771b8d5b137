import { Button, Select } from 'antd';
import { useId } from 'react';
import { useFieldArray, useWatch } from 'react-hook-form';
import type { UseFormReturn } from 'react-hook-form';
import { evidenceShapes, orientations } from '@mantlet/common';
import type { ProductKind, ThicknessTable } from '@mantlet/common';
import { SymbolText } from '../../../ui/drawing/symbol-text.js';
import { CheckField, NumberField, SelectField } from '../../../ui/form/fields.js';
import type { Library } from '../api/products.js';
import { orientationNames, shapeNames, tableName, thicknessUnitOf } from '../product-words.js';
import { blankFit, numbersOf, withTable } from './product-form.js';
import type { ProductForm, ProductFormOut } from './product-form.js';
import { ReadTableForm } from './read-table-form.js';

export type ProductFormApi = UseFormReturn<ProductForm, unknown, ProductFormOut>;
interface PartProps { form: ProductFormApi; kind: ProductKind }

export function TableFields({ form, kind, library }: PartProps & { library: Library }) {
  const tables = (useWatch({ control: form.control, name: 'evidence.tables' }) ?? []) as ThicknessTable[];
  const put = (next: ThicknessTable[]) => form.setValue('evidence.tables', next, { shouldDirty: true, shouldValidate: form.formState.isSubmitted });
  return (
    <>
      {tables.length === 0 ? <p className="mt-sub">No table yet. Read them in one by one, each for a section shape, a kind of member and a period.</p> : (
        <ul className="mt-table-list" aria-label="Thickness tables">
          {tables.map((t) => (
            <li key={tableName(t)}>
              <span>{tableName(t)} <span className="mt-sub">{t.sectionFactorsPerM.length} section factors × {t.temperaturesC.length} temperatures</span></span>
              <Button size="small" type="text" aria-label={`Remove ${tableName(t)}`} onClick={() => put(tables.filter((other) => other !== t))}>Remove</Button>
            </li>
          ))}
        </ul>
      )}
      {form.formState.isSubmitted && tables.length === 0 && <p className="mt-field-error" role="alert">At least one thickness table is needed.</p>}
      <ReadTableForm library={library} kind={kind} tables={tables} onRead={(table) => put(withTable(tables, table))} />
    </>
  );
}

const shapeOptions = evidenceShapes.map((value) => ({ value, label: shapeNames[value] }));
const orientationOptions = orientations.map((value) => ({ value, label: orientationNames[value] }));
const coefficientHelp = ['constant', 'd', 'd/(A/V)', 'θ', 'd·θ', 'd·θ/(A/V)', 'θ/(A/V)', '1/(A/V)'];

export function RegressionFields({ form, kind }: PartProps) {
  const { control } = form;
  const fits = useFieldArray({ control, name: 'evidence.fits' });
  const unit = thicknessUnitOf(kind);
  return (
    <>
      <p className="mt-sub"><SymbolText text="t = a_0 + a_1·d + a_2·d/(A/V) + a_3·θ + a_4·d·θ + a_5·d·θ/(A/V) + a_6·θ/(A/V) + a_7/(A/V)" />; t in minutes, d in {unit}, θ in °C.</p>
      {fits.fields.map((field, i) => (
        <div key={field.id} className="mt-form" role="group" aria-label={`Regression ${i + 1}`}>
          <div className="mt-form-row">
            <SelectField control={control} name={`evidence.fits.${i}.shape`} label="Section" options={shapeOptions} />
            <SelectField control={control} name={`evidence.fits.${i}.orientation`} label="Member" options={orientationOptions} />
          </div>
          <div className="mt-form-row">
            {coefficientHelp.map((term, n) => <NumberField key={term} control={control} name={`evidence.fits.${i}.coefficients.${n}`} label={`a${n}`} help={term} />)}
          </div>
          <div className="mt-form-row">
            <NumberField control={control} name={`evidence.fits.${i}.minThickness`} label="Least thickness" unit={unit} />
            <NumberField control={control} name={`evidence.fits.${i}.maxThickness`} label="Greatest thickness" unit={unit} />
            <NumberField control={control} name={`evidence.fits.${i}.minSectionFactorPerM`} label="Least A/V" unit="1/m" />
            <NumberField control={control} name={`evidence.fits.${i}.maxSectionFactorPerM`} label="Greatest A/V" unit="1/m" />
          </div>
          <div className="mt-form-row">
            <NumberField control={control} name={`evidence.fits.${i}.minTemperatureC`} label="Lowest temperature" unit="°C" />
            <NumberField control={control} name={`evidence.fits.${i}.maxTemperatureC`} label="Highest temperature" unit="°C" />
            <NumberField control={control} name={`evidence.fits.${i}.minPeriodMin`} label="Shortest period" unit="min" />
            <NumberField control={control} name={`evidence.fits.${i}.maxPeriodMin`} label="Longest period" unit="min" />
          </div>
          {fits.fields.length > 1 && <div><Button size="small" onClick={() => fits.remove(i)}>{`Remove regression ${i + 1}`}</Button></div>}
        </div>
      ))}
      <div><Button onClick={() => fits.append(blankFit())}>Add a regression</Button></div>
    </>
  );
}

function ConductivityFields({ form }: { form: ProductFormApi }) {
  const { control } = form;
  const rows = useFieldArray({ control, name: 'evidence.properties.conductivityWPerMK' as never });
  return (
    <div className="mt-curve-rows" role="group" aria-label="Conductivity by temperature">
      {rows.fields.map((field, i) => (
        <div key={field.id}>
          <NumberField control={control} name={`evidence.properties.conductivityWPerMK.${i}.temperatureC`} label="At" unit="°C" />
          <NumberField control={control} name={`evidence.properties.conductivityWPerMK.${i}.value`} label="Conductivity" unit="W/mK" />
          <Button aria-label={`Remove conductivity ${i + 1}`} disabled={rows.fields.length <= 2} onClick={() => rows.remove(i)}>Remove</Button>
        </div>
      ))}
      <div><Button size="small" onClick={() => rows.append({ temperatureC: null, value: null } as never)}>Add a temperature</Button></div>
    </div>
  );
}

export function ThermalFields({ form, kind }: PartProps) {
  const { control } = form;
  const conductivity: unknown = useWatch({ control, name: 'evidence.properties.conductivityWPerMK' });
  const stock = (useWatch({ control, name: 'evidence.properties.stockThicknessesMm' }) ?? []) as number[];
  const byTemperature = Array.isArray(conductivity);
  const setConductivity = (value: unknown) => form.setValue('evidence.properties.conductivityWPerMK', value as never, { shouldDirty: true });
  const name = (key: string) => `evidence.properties.${key}` as 'evidence.properties.densityKgPerM3';
  return (
    <>
      <div className="mt-form-row">
        {!byTemperature && <NumberField control={control} name={name('conductivityWPerMK')} label="Conductivity λ" unit="W/mK" />}
        <NumberField control={control} name={name('densityKgPerM3')} label="Density ρ" unit="kg/m³" />
        <NumberField control={control} name={name('specificHeatJPerKgK')} label="Specific heat c" unit="J/kgK" />
        <NumberField control={control} name={name('moisturePercent')} label="Moisture" unit="%" />
      </div>
      {byTemperature && <ConductivityFields form={form} />}
      <div>
        <Button size="small" onClick={() => setConductivity(byTemperature ? null : [{ temperatureC: 20, value: null }, { temperatureC: 800, value: null }])}>
          {byTemperature ? 'Give one conductivity for all temperatures' : 'Give the conductivity by temperature'}
        </Button>
      </div>
      <div className="mt-form-row">
        <NumberField control={control} name={name('minThicknessMm')} label="Least thickness" unit="mm" />
        <NumberField control={control} name={name('maxThicknessMm')} label="Greatest thickness" unit="mm" />
        <NumberField control={control} name={name('minSectionFactorPerM')} label="Least A/V" unit="1/m" />
        <NumberField control={control} name={name('maxSectionFactorPerM')} label="Greatest A/V" unit="1/m" />
      </div>
      <div className="mt-form-row">
        <NumberField control={control} name={name('maxTemperatureC')} label="Highest temperature" unit="°C" />
        <NumberField control={control} name={name('maxPeriodMin')} label="Longest period" unit="min" />
        {kind === 'board' ? <NumberField control={control} name={name('maxLayers')} label="Layers at most" min={1} max={4} decimals={0} /> : <NumberField control={control} name={name('thicknessStepMm')} label="Rounded up to steps of" unit="mm" />}
      </div>
      {kind === 'board' && (
        <TagNumbers label="Stocked thicknesses" help="Type a thickness and press Enter. Boards are made up of these, in as many layers as are allowed." value={stock} onChange={(next) => form.setValue('evidence.properties.stockThicknessesMm', next, { shouldDirty: true, shouldValidate: form.formState.isSubmitted })} />
      )}
      <CheckField control={control} name={name('coversNaturalFire')} label="Holds in natural fires, cooling included" help="Only where the assessment says so." />
    </>
  );
}

/** Numbers as free entries; kept as numbers, sorted, each once. */
function TagNumbers({ label, value, onChange, help }: { label: string; value: readonly number[]; onChange: (value: number[]) => void; help: string }) {
  const id = useId();
  return (
    <div className="mt-field">
      <label className="mt-label" htmlFor={id}>{label} <span className="mt-unit">(mm)</span></label>
      <Select id={id} mode="tags" open={false} suffixIcon={null} tokenSeparators={[';', ' ']} value={value.map(String)} onChange={(texts: string[]) => onChange(numbersOf(texts))} style={{ width: '100%' }} aria-describedby={`${id}-help`} />
      <p className="mt-help" id={`${id}-help`}>{help}</p>
    </div>
  );
}
