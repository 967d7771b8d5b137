import { returnInputSchema, revisionInputSchema } from '@mantlet/common';
import type { RevisionDto } from '@mantlet/common';
import { TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useChangeRevision, useReturnRevision, useStartRevision } from '../api/revisions.js';

/** Starts the next revision as a draft. */
export function StartRevision({ projectId, code, onClose, onStarted }: { projectId: string; code: string; onClose: () => void; onStarted: (revision: RevisionDto) => void }) {
  const start = useStartRevision(projectId);
  const form = useContractForm(revisionInputSchema, { defaultValues: { code, purpose: '' } });
  useServerIssues(form, start.error);
  const submit = form.handleSubmit((body) => start.mutate(body, { onSuccess: onStarted }));
  return (
    <FormDrawer title="Start a revision" open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !start.isSuccess} saving={start.isPending} error={start.error} saveText="Start the draft" size={440}>
      <TextField control={form.control} name="code" label="Revision" help="The next in the same pattern is suggested." />
      <TextField control={form.control} name="purpose" label="Purpose" rows={3} help="For construction, for comment, after a change of section…" />
    </FormDrawer>
  );
}

export function ChangeRevision({ projectId, revision, onClose }: { projectId: string; revision: RevisionDto; onClose: () => void }) {
  const change = useChangeRevision(projectId, revision.id);
  const form = useContractForm(revisionInputSchema, { defaultValues: { code: revision.code, purpose: revision.purpose } });
  useServerIssues(form, change.error);
  const submit = form.handleSubmit((body) => change.mutate(body, { onSuccess: onClose }));
  return (
    <FormDrawer title={`Edit ${revision.code}`} open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !change.isSuccess} saving={change.isPending} error={change.error} size={440}>
      <TextField control={form.control} name="code" label="Revision" />
      <TextField control={form.control} name="purpose" label="Purpose" rows={3} />
    </FormDrawer>
  );
}

/** Sends a prepared or checked revision back to draft, with what must change. */
export function ReturnRevision({ projectId, revision, onClose }: { projectId: string; revision: RevisionDto; onClose: () => void }) {
  const giveBack = useReturnRevision(projectId, revision.id);
  const form = useContractForm(returnInputSchema, { defaultValues: { comment: '' } });
  useServerIssues(form, giveBack.error);
  const submit = form.handleSubmit((body) => giveBack.mutate(body, { onSuccess: onClose }));
  return (
    <FormDrawer title={`Return ${revision.code} to draft`} open onClose={onClose} onSubmit={(e) => { void submit(e); }} dirty={form.formState.isDirty && !giveBack.isSuccess} saving={giveBack.isPending} error={giveBack.error} saveText="Return it" size={440}>
      <p className="mt-sub">The frozen schedule and the signatures on it are dropped; it is prepared and checked again.</p>
      <TextField control={form.control} name="comment" label="What must change" rows={4} />
    </FormDrawer>
  );
}
