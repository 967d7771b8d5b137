import { Radio } from 'antd';
import { useMemo, useRef } from 'react';
import { useWatch } from 'react-hook-form';
import { environments, fireCurveNames, nominalCurves, productInputSchema, productKindNames, productKinds } from '@mantlet/common';
import type { Evidence, ProductDto, ProductKind } from '@mantlet/common';
import type { UseMutationResult } from '@tanstack/react-query';
import { ApiError } from '../../../lib/api-client.js';
import { CheckField, CheckListField, RadioField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useCreateProduct, useUpdateProduct } from '../api/products.js';
import type { Library } from '../api/products.js';
import { formNames, productEditWords } from '../product-words.js';
import { RegressionFields, TableFields, ThermalFields } from './evidence-fields.js';
import type { ProductFormApi } from './evidence-fields.js';
import { blankEvidence, blankProduct, evidenceForms, formOf } from './product-form.js';
import type { ProductForm, ProductFormOut } from './product-form.js';
import { SupplyFields } from './supply-fields.js';

const standing = (product: ProductDto) => ({ values: formOf(product), version: product.version });

interface ProductDrawerProps { library: Library; product: ProductDto | null; onClose: () => void; onSaved: (product: ProductDto) => void }

const curveOptions = nominalCurves.map((value) => ({ value, label: fireCurveNames[value] }));
const environmentOptions = environments.map((value) => ({ value, label: value }));

function IdentityFields({ form }: { form: ProductFormApi }) {
  const { control } = form;
  return (
    <>
      <div className="mt-form-row">
        <TextField control={control} name="name" label="Name" />
        <TextField control={control} name="maker" label="Maker" />
      </div>
      <RadioField control={control} name="kind" label="Kind" options={productKinds.map((value) => ({ value, label: productKindNames[value] }))} />
      <CheckField control={control} name="invented" label="Invented for demonstration" help="Said wherever the product is named." />
    </>
  );
}

function AssessmentFields({ form }: { form: ProductFormApi }) {
  const { control } = form;
  return (
    <fieldset>
      <legend>Assessment</legend>
      <div className="mt-form-row">
        <TextField control={control} name="evidenceReference" label="Reference" help="Number of the report or approval" />
        <TextField control={control} name="evidenceEdition" label="Edition" />
      </div>
      <div className="mt-form-row">
        <TextField control={control} name="evidenceStandard" label="Standard" help="EN 13381-8, for example" />
        <TextField control={control} name="evidenceExpiresOn" label="Valid until" type="date" />
      </div>
      <CheckListField control={control} name="curves" label="Fire curves covered" options={curveOptions} />
      <CheckListField control={control} name="environments" label="Environments covered (ISO 12944-2)" options={environmentOptions} />
    </fieldset>
  );
}

/** The data themselves. Changing the form of the evidence keeps what was entered in the other, until the drawer closes. */
function EvidenceFields({ form, kind, library, error }: { form: ProductFormApi; kind: ProductKind; library: Library; error: unknown }) {
  const shape = useWatch({ control: form.control, name: 'evidence.form' });
  const put = useRef(new Map<Evidence['form'], ProductForm['evidence']>());
  const change = (next: Evidence['form']) => {
    put.current.set(shape, form.getValues('evidence'));
    form.setValue('evidence', put.current.get(next) ?? blankEvidence(next), { shouldDirty: true });
    form.clearErrors('evidence');
  };
  const said = error instanceof ApiError ? error.issues.filter((i) => i.path === 'evidence') : [];
  const options = evidenceForms(kind);
  return (
    <fieldset>
      <legend>Assessed data</legend>
      <Radio.Group aria-label="The assessment gives" value={shape} onChange={(e) => change(e.target.value as Evidence['form'])} className="mt-radios" options={(['table', 'regression', 'thermal'] as const).map((value) => ({ value, label: formNames[value], disabled: !options.includes(value) && value !== shape }))} />
      {kind === 'coating' && <p className="mt-help">A reactive coating has no constant thermal properties: its assessment gives tables or a regression.</p>}
      {said.length > 0 && <ul className="mt-said" role="alert">{said.map((i) => <li key={i.message}>{i.message}</li>)}</ul>}
      {shape === 'table' && <TableFields form={form} kind={kind} library={library} />}
      {shape === 'regression' && <RegressionFields form={form} kind={kind} />}
      {shape === 'thermal' && <ThermalFields form={form} kind={kind} />}
    </fieldset>
  );
}

/** Adds a product, or edits the one given, in the library given (null: the shared one). */
export function ProductDrawer({ library, product, onClose, onSaved }: ProductDrawerProps) {
  const create = useCreateProduct(library);
  const update = useUpdateProduct(library, product?.id ?? '');
  const save = product ? update : create;
  const title = product ? `Edit ${product.name}` : library ? 'Add a product to this project' : 'Add a product to the library';
  const { form, edit } = useEditForm<ProductForm, ProductFormOut, never, ProductDto>({
    schema: productInputSchema, name: product ? `product/${product.id}` : `new-product/${library ?? 'shared'}`, title, read: standing, onSaved, words: productEditWords,
    record: useMemo(() => (product ? standing(product) : { values: blankProduct(), version: null }), [product]),
    // a new product and a change of one differ in the version alone
    save: save as UseMutationResult<ProductDto, Error, never>, body: (input, { version }) => (version === null ? input : { ...input, version }) as never,
    anew: (input) => create.mutateAsync(input),
  });
  const kind = useWatch({ control: form.control, name: 'kind' });
  return (
    <FormDrawer
      title={title} open onClose={onClose} size={760} edit={edit} error={product ? create.error : null}
      saveText={product ? 'Save' : 'Add the product'}
    >
      <IdentityFields form={form} />
      <AssessmentFields form={form} />
      <EvidenceFields form={form} kind={kind} library={library} error={save.error} />
      <SupplyFields form={form} kind={kind} />
      <fieldset><legend>Note</legend><TextField control={form.control} name="note" label="Note" rows={3} /></fieldset>
    </FormDrawer>
  );
}
