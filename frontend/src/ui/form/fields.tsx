import { Checkbox, Input, InputNumber, Radio, Select } from 'antd';
import { useId } from 'react';
import { useController } from 'react-hook-form';
import type { Control, FieldPath, FieldValues } from 'react-hook-form';
import type { ReactNode } from 'react';
import { describedBy, FieldFrame } from './field-frame.js';
import type { FieldCommon } from './field-frame.js';

// eslint-disable-next-line @typescript-eslint/no-explicit-any -- a field does not care what the form resolves to
export type AnyControl<T extends FieldValues> = Control<T, any, any>;
export interface FieldProps<T extends FieldValues> extends FieldCommon { control: AnyControl<T>; name: FieldPath<T> }

function useField<T extends FieldValues>({ control, name, help }: FieldProps<T>) {
  const id = useId();
  const { field, fieldState } = useController({ control, name });
  const error = fieldState.error?.message ?? (fieldState.error ? 'is not right' : undefined);
  const aria = { id, 'aria-invalid': error ? true : undefined, 'aria-describedby': describedBy(id, help, error) };
  // taken apart here: the field's ref is a callback for the input, the rest are plain values
  const { ref, name: path, value, onBlur, onChange } = field;
  return { id, ref, path, value, onBlur, onChange, error, aria, status: error ? ('error' as const) : ('' as const) };
}
const frame = <T extends FieldValues>(p: FieldProps<T>) => ({ label: p.label, help: p.help, unit: p.unit, term: p.term });

export function TextField<T extends FieldValues>(props: FieldProps<T> & { type?: 'text' | 'email' | 'password' | 'date'; autoComplete?: string; placeholder?: string; autoFocus?: boolean; rows?: number }) {
  const { id, ref, path, value, onBlur, onChange, error, aria, status } = useField(props);
  const { type = 'text', autoComplete, placeholder, autoFocus, rows, disabled } = props;
  const given = { ...aria, ref, name: path, onBlur, onChange, value: value ?? '', status, disabled, placeholder, autoComplete: autoComplete ?? 'off', autoFocus };
  return (
    <FieldFrame {...frame(props)} id={id} error={error}>
      {/* grows by CSS: antd's own autoSize measures with a style attribute, which the content security policy refuses */}
      {rows ? <Input.TextArea {...given} rows={rows} className="mt-grow" style={{ minHeight: `calc(${rows}lh + 12px)` }} /> : <Input {...given} type={type} />}
    </FieldFrame>
  );
}

/** The field's value is a number, or null while empty; a decimal string with `text` (money and rates). */
export function NumberField<T extends FieldValues>(props: FieldProps<T> & { min?: number; max?: number; step?: number; decimals?: number; text?: boolean; width?: number | string }) {
  const { id, ref, path, value, onBlur, onChange, error, aria, status } = useField(props);
  const { min, max, step, decimals, text = false, width, disabled } = props;
  return (
    <FieldFrame {...frame(props)} id={id} error={error}>
      <InputNumber<number | string>
        {...aria} ref={ref} name={path} onBlur={onBlur} value={value ?? null} status={status} disabled={disabled ?? false}
        onChange={(next) => onChange(next === '' ? null : next)} stringMode={text} controls={false} changeOnWheel={false} style={{ width: width ?? '100%' }}
        {...(min != null ? { min } : {})} {...(max != null ? { max } : {})} {...(step != null ? { step } : {})} {...(decimals != null ? { precision: decimals } : {})}
      />
    </FieldFrame>
  );
}

export interface Option { value: string | number; label: ReactNode; disabled?: boolean; title?: string }

export function SelectField<T extends FieldValues>(props: FieldProps<T> & { options: readonly Option[]; placeholder?: string; allowClear?: boolean; multiple?: boolean; search?: boolean; /** free entries; the value is an array of text */ tags?: boolean }) {
  const { id, ref, value, onBlur, onChange, error, aria, status } = useField(props);
  const { options, placeholder, allowClear = false, multiple = false, search = false, tags = false, disabled } = props;
  return (
    <FieldFrame {...frame(props)} id={id} error={error}>
      <Select
        {...aria} ref={ref} value={value ?? undefined} onBlur={onBlur} onChange={(next) => onChange(next ?? null)}
        status={status} disabled={disabled ?? false} placeholder={placeholder} allowClear={allowClear} options={options as Option[]} style={{ width: '100%' }}
        {...(tags ? { mode: 'tags' as const, tokenSeparators: [',', ';', ' '], suffixIcon: null, open: false } : multiple ? { mode: 'multiple' as const } : {})} showSearch={search || multiple || tags ? { optionFilterProp: 'label' } : false}
      />
    </FieldFrame>
  );
}

export function RadioField<T extends FieldValues>(props: FieldProps<T> & { options: readonly Option[] }) {
  const { id, value, onBlur, onChange, error } = useField(props);
  return (
    <FieldFrame {...frame(props)} id={id} error={error} group>
      <Radio.Group
        aria-labelledby={`${id}-label`} aria-describedby={describedBy(id, props.help, error)} name={id} value={value} disabled={props.disabled ?? false}
        onChange={(event) => onChange(event.target.value)} onBlur={onBlur} options={props.options as never} className="mt-radios"
      />
    </FieldFrame>
  );
}

/** Several of a short list: the value is an array. */
export function CheckListField<T extends FieldValues>(props: FieldProps<T> & { options: readonly Option[] }) {
  const { id, value, onChange, error } = useField(props);
  return (
    <FieldFrame {...frame(props)} id={id} error={error} group>
      <div role="group" aria-labelledby={`${id}-label`} aria-describedby={describedBy(id, props.help, error)}>
        <Checkbox.Group value={value ?? []} onChange={onChange} disabled={props.disabled ?? false} options={props.options as never} className="mt-radios" />
      </div>
    </FieldFrame>
  );
}

export function CheckField<T extends FieldValues>(props: FieldProps<T>) {
  const { id, value, onBlur, onChange, error, aria } = useField(props);
  return (
    <div className="mt-field">
      <Checkbox {...aria} checked={!!value} disabled={props.disabled ?? false} onChange={(event) => onChange(event.target.checked)} onBlur={onBlur}>{props.label}</Checkbox>
      {props.help && <p className="mt-help" id={`${id}-help`}>{props.help}</p>}
      {error && <p className="mt-field-error" id={`${id}-error`} role="alert">{error}</p>}
    </div>
  );
}
