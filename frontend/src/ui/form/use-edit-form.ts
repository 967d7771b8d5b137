import { useEffect, useRef, useState } from 'react';
import type { SubmitEvent } from 'react';
import { useFormState } from 'react-hook-form';
import type { DefaultValues, FieldValues, UseFormReturn } from 'react-hook-form';
import type { UseMutationResult } from '@tanstack/react-query';
import type { z } from 'zod';
import { ApiError } from '../../lib/api-client.js';
import type { Draft } from '../../lib/drafts.js';
import { differencesOf, mergeOf, sameValue } from '../../lib/three-way.js';
import type { Choices, Difference } from '../../lib/three-way.js';
import { useContractForm, useServerIssues } from './use-contract-form.js';
import { useDraft } from './use-draft.js';
import { useUnsavedChanges } from './use-unsaved-changes.js';

/** A record as a form holds it. version: null for something new, and for what has none. */
export interface Standing<In> { values: In; version: number | null }

/** Words of one form for its comparison, where a field's stored name and value do not say it; undefined leaves it to the usual ones. */
export interface EditWords {
  label?: (path: string) => string | undefined;
  value?: (path: string, value: unknown) => string | undefined;
}

/** Two versions side by side: after a save that was overtaken, or for a draft whose record moved on. */
export interface Comparison {
  why: 'save' | 'draft' | 'moved';
  by: string | null;
  at: string | null;
  differences: Difference[];
}

interface EditOptions<In extends FieldValues, Out, Sent, Result, Current> {
  schema: z.ZodType<Out, In>;
  /** what the form is about, for the draft kept of it: "zone/<id>", or "new-zone/<project>" */
  name: string;
  /** as people call it: "Zone Z1" */
  title: string;
  /** the record as it stands, or what a new one begins with */
  record: Standing<In>;
  save: UseMutationResult<Result, Error, Sent>;
  /** what is sent: the parsed value, with the version (or values) the form was opened with */
  body: (input: Out, opened: Standing<In>) => Sent;
  /** this form's part of what the server answers with: after a save, and where somebody else saved meanwhile */
  read?: (answer: Current) => Standing<In>;
  onSaved?: (result: Result, input: Out) => void;
  /** makes it anew where it was deleted meanwhile */
  anew?: (input: Out) => Promise<unknown>;
  words?: EditWords;
}

export interface EditForm {
  title: string;
  dirty: boolean;
  saving: boolean;
  error: unknown;
  words: EditWords;
  comparison: Comparison | null;
  /** somebody saved the record while this form was being filled */
  movedOn: boolean;
  /** it was deleted meanwhile */
  gone: boolean;
  offered: Draft | null;
  kept: boolean;
  submit: (event?: SubmitEvent<HTMLFormElement> | React.FormEvent<HTMLFormElement>) => void;
  compare: () => void;
  choose: (choices: Choices) => void;
  /** back to the form, with what was typed */
  putAside: () => void;
  putBack: () => void;
  /** forgets what was typed, and what was left earlier */
  discard: () => void;
  anew: (() => void) | null;
  /** what stands in the form now */
  typed: () => FieldValues;
}

interface Compared<In> { base: In; mine: In; theirs: Standing<In>; shown: Comparison }
/** Every field as given: the form's own options would keep what was typed, also where it was just given up. */
const afresh = { keepDirtyValues: false } as const;
/** The same, on the ground the form has. */
const onGround = { ...afresh, keepDefaultValues: true } as const;
/** a record that is saved by others again and again between two of our tries */
const mostTries = 3;

/**
 * A form on a record that others may be editing too. What it was opened with stays the ground until it is saved:
 * a newer version never slips in under typed fields, and a save that was overtaken shows both versions field by field.
 */
export function useEditForm<In extends FieldValues, Out, Sent, Result, Current = Result>(
  { schema, name, title, record, save, body, read, onSaved, anew, words = {} }: EditOptions<In, Out, Sent, Result, Current>,
): { form: UseFormReturn<In, unknown, Out>; edit: EditForm } {
  const form = useContractForm<In, Out>(schema, { defaultValues: record.values as DefaultValues<In> });
  const { isDirty } = useFormState({ control: form.control });
  const opened = useRef(record);
  const [compared, setCompared] = useState<Compared<In> | null>(null);
  const [movedOn, setMovedOn] = useState(false);
  const draft = useDraft(form, { name, title, standing: record.values, opened: () => opened.current.values });
  const saving = save.isPending;
  useServerIssues(form, save.error);
  useUnsavedChanges(isDirty && !saving, title, draft.kept);

  const typed = () => structuredClone(form.getValues());
  /** The record as new ground, with what is typed standing on it. */
  const fill = (standing: Standing<In>, values: In) => {
    opened.current = standing;
    setMovedOn(false);
    form.reset(standing.values as DefaultValues<In>, afresh);
    if (!sameValue(standing.values, values)) form.reset(values as DefaultValues<In>, onGround);
  };
  /** typing is untouched by somebody's change of other fields of the same record */
  const othersOnly = (base: In, mine: In, theirs: In) => differencesOf(base, mine, theirs).every(({ by }) => by === 'mine');
  const show = (why: Comparison['why'], base: In, mine: In, theirs: Standing<In>, from: { by: string | null; at: string | null }) =>
    setCompared({ base, mine, theirs, shown: { why, ...from, differences: differencesOf(base, mine, theirs.values) } });

  const settled = (result: Result, input: Out, sent: In) => {
    const standing = read && result ? read(result as unknown as Current) : opened.current;
    // whoever went on typing while the answer was on its way keeps that
    const now = typed();
    fill(standing, sameValue(now, sent) ? standing.values : now);
    draft.forget();
    onSaved?.(result, input);
  };
  const send = async (input: Out, tries = 0): Promise<void> => {
    const [sent, from] = [typed(), opened.current];
    setCompared(null);
    try {
      settled(await save.mutateAsync(body(input, from)), input, sent);
    } catch (error) {
      if (!(error instanceof ApiError) || !error.overtaken || !read) return;
      const theirs = read(error.overtaken.current as Current);
      const meant = schema.safeParse(theirs.values);
      // what stands is what was sent: an earlier try arrived though its answer did not
      if (meant.success && sameValue(meant.data, input)) { save.reset(); settled(error.overtaken.current as Result, input, sent); return; }
      const mine = typed();
      if (othersOnly(from.values, mine, theirs.values) && tries < mostTries) { fill(theirs, mine); return send(input, tries + 1); }
      show('save', from.values, mine, theirs, error.overtaken);
    }
  };
  const submit: EditForm['submit'] = (event) => { void form.handleSubmit((input) => send(input))(event); };

  // the record moved on: an untouched form follows; a touched one keeps its ground, and is told where its own fields are concerned
  const seen = useRef(record);
  useEffect(() => {
    const before = seen.current;
    const newer = record.version === null ? !sameValue(record.values, before.values) : record.version > (opened.current.version ?? 0);
    seen.current = record;
    if (!newer || saving || compared) return;
    const mine = structuredClone(form.getValues());
    if (!isDirty) {
      opened.current = record;
      form.reset(record.values as DefaultValues<In>, afresh);
    } else if (differencesOf(opened.current.values, mine, record.values).every(({ by }) => by === 'mine')) {
      opened.current = record;
      form.reset(record.values as DefaultValues<In>, afresh);
      form.reset(mine as DefaultValues<In>, onGround);
    } else setMovedOn(true);
  }, [record, isDirty, saving, compared, form]);

  const edit: EditForm = {
    title, dirty: isDirty, saving, words, submit, movedOn, offered: draft.offered, kept: draft.kept, typed,
    error: compared || (save.error instanceof ApiError && save.error.isStale && read) ? null : save.error,
    comparison: compared?.shown ?? null,
    gone: save.error instanceof ApiError && save.error.isMissing && record.version !== null,
    compare: () => show('moved', opened.current.values, typed(), record, { by: null, at: null }),
    choose: (choices) => {
      if (!compared) return;
      const merged = mergeOf(compared.base, compared.mine, compared.theirs.values, choices);
      setCompared(null);
      save.reset();
      fill(compared.theirs, merged);
      if (compared.shown.why === 'save') submit();
    },
    putAside: () => setCompared(null),
    putBack: () => {
      if (!draft.offered) return;
      const [base, mine] = [draft.offered.base as In, draft.offered.values as In];
      const theirs = opened.current;
      draft.answered();
      if (othersOnly(base, mine, theirs.values)) fill(theirs, mine);
      else show('draft', base, mine, theirs, { by: null, at: null });
    },
    discard: () => {
      fill(opened.current, opened.current.values);
      setCompared(null);
      save.reset();
      draft.forget();
    },
    anew: anew ? () => {
      void form.handleSubmit((input) => anew(input).then(() => { draft.forget(); onSaved?.(undefined as Result, input); }, () => undefined))();
    } : null,
  };
  return { form, edit };
}
