import { zodResolver } from '@hookform/resolvers/zod';
import { useEffect } from 'react';
import { useForm } from 'react-hook-form';
import type { DefaultValues, FieldValues, Path, UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { ApiError } from '../../lib/api-client.js';

/**
 * A form resolved by the contract's own schema. `form.handleSubmit` gives the parsed value.
 * values: pass the loaded record to fill the form when it arrives; fields already typed in are kept.
 */
export function useContractForm<In extends FieldValues, Out>(
  schema: z.ZodType<Out, In>,
  options: { defaultValues?: DefaultValues<In>; values?: In },
): UseFormReturn<In, unknown, Out> {
  return useForm<In, unknown, Out>({
    resolver: zodResolver(schema),
    // first at the save: an error that appears as a field is left moves what lies below from under the pointer
    mode: 'onSubmit',
    reValidateMode: 'onChange',
    resetOptions: { keepDirtyValues: true },
    ...options,
  });
}

/** Puts the server's issues beside the fields they are about. */
export function useServerIssues<In extends FieldValues, Out>(form: UseFormReturn<In, unknown, Out>, error: unknown): void {
  const { setError } = form;
  useEffect(() => {
    if (!(error instanceof ApiError)) return;
    for (const issue of error.issues) if (issue.path) setError(issue.path as Path<In>, { type: 'server', message: issue.message });
  }, [error, setError]);
}
