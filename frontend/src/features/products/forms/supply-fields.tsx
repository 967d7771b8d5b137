import type { ProductKind } from '@mantlet/common';
import { NumberField } from '../../../ui/form/fields.js';
import type { ProductFormApi } from './evidence-fields.js';

/** What buying and applying needs; each may stay empty, and then the quantities that rest on it are not determined. */
export function SupplyFields({ form, kind }: { form: ProductFormApi; kind: ProductKind }) {
  const { control } = form;
  return (
    <fieldset>
      <legend>Buying and applying</legend>
      {kind === 'coating' && (
        <div className="mt-form-row">
          <NumberField control={control} name="supply.volumeSolidsPercent" label="Volume solids" unit="%" />
          <NumberField control={control} name="supply.maxDftPerCoatUm" label="Greatest film per coat" unit="µm dry" />
          <NumberField control={control} name="supply.densityKgPerL" label="Density" unit="kg/L" />
          <NumberField control={control} name="supply.containerL" label="Container" unit="L" />
        </div>
      )}
      {kind === 'board' && (
        <div className="mt-form-row">
          <NumberField control={control} name="supply.sheetLengthMm" label="Sheet length" unit="mm" />
          <NumberField control={control} name="supply.sheetWidthMm" label="Sheet width" unit="mm" />
        </div>
      )}
      {kind === 'spray' && (
        <div className="mt-form-row">
          <NumberField control={control} name="supply.bagKg" label="Bag" unit="kg" />
          <NumberField control={control} name="supply.bagYieldM3" label="Yield of a bag in place" unit="m³" />
        </div>
      )}
      <div className="mt-form-row">
        {kind !== 'board' && <NumberField control={control} name="supply.lossFraction" label="Loss, as a fraction" min={0} max={0.9} help="0.2 is 20 %" />}
        <NumberField control={control} name="supply.materialRate" label="Material rate" unit={{ coating: 'per litre', board: 'per m² of sheet', spray: 'per m³' }[kind]} text />
        <NumberField control={control} name="supply.labourRate" label="Labour rate" unit="per m²" text />
      </div>
      <p className="mt-help">What stays empty is not guessed: quantities that rest on it say so.</p>
    </fieldset>
  );
}
