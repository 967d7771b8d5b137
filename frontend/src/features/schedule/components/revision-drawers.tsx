import { useMemo } from 'react';
import { returnInputSchema, revisionInputSchema } from '@mantlet/common';
import type { RevisionDto } from '@mantlet/common';
import { TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useChangeRevision, useReturnRevision, useStartRevision } from '../api/revisions.js';

const standing = ({ code, purpose }: Pick<RevisionDto, 'code' | 'purpose'>) => ({ values: { code, purpose }, version: null });
const noComment = { values: { comment: '' }, version: null };

/** Starts the next revision as a draft. */
export function StartRevision({ projectId, code, onClose, onStarted }: { projectId: string; code: string; onClose: () => void; onStarted: (revision: RevisionDto) => void }) {
  const start = useStartRevision(projectId);
  const { form, edit } = useEditForm({
    schema: revisionInputSchema, name: `new-revision/${projectId}`, title: 'Start a revision', save: start, body: (input) => input, onSaved: onStarted,
    record: useMemo(() => ({ values: { code, purpose: '' }, version: null }), [code]),
  });
  return (
    <FormDrawer title="Start a revision" open onClose={onClose} edit={edit} saveText="Start the draft" size={440}>
      <TextField control={form.control} name="code" label="Revision" help="The next in the same pattern is suggested." />
      <TextField control={form.control} name="purpose" label="Purpose" rows={3} help="For construction, for comment, after a change of section…" />
    </FormDrawer>
  );
}

export function ChangeRevision({ projectId, revision, onClose }: { projectId: string; revision: RevisionDto; onClose: () => void }) {
  const change = useChangeRevision(projectId, revision.id);
  const { form, edit } = useEditForm({
    schema: revisionInputSchema, name: `revision/${revision.id}`, title: `Edit ${revision.code}`, read: standing, save: change, onSaved: onClose,
    record: useMemo(() => standing(revision), [revision]), body: (input, opened) => ({ ...input, was: { code: opened.values.code, purpose: opened.values.purpose ?? '' } }),
  });
  return (
    <FormDrawer title={`Edit ${revision.code}`} open onClose={onClose} edit={edit} size={440}>
      <TextField control={form.control} name="code" label="Revision" />
      <TextField control={form.control} name="purpose" label="Purpose" rows={3} />
    </FormDrawer>
  );
}

/** Sends a prepared or checked revision back to draft, with what must change. */
export function ReturnRevision({ projectId, revision, onClose }: { projectId: string; revision: RevisionDto; onClose: () => void }) {
  const giveBack = useReturnRevision(projectId, revision.id);
  const { form, edit } = useEditForm({
    schema: returnInputSchema, name: `return/${revision.id}`, title: `Return ${revision.code} to draft`, record: noComment, save: giveBack, body: (input) => input, onSaved: onClose,
  });
  return (
    <FormDrawer title={`Return ${revision.code} to draft`} open onClose={onClose} edit={edit} saveText="Return it" size={440}>
      <p className="mt-sub">The frozen schedule and the signatures on it are dropped; it is prepared and checked again.</p>
      <TextField control={form.control} name="comment" label="What must change" rows={4} />
    </FormDrawer>
  );
}
