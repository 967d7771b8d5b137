import { useState } from 'react';
import type { MemberDto, SectionDto } from '@mantlet/common';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useCreateMember, useUpdateMember } from '../api/members.js';
import { MemberFields } from './member-fields.js';
import { useMemberForm } from './member-form.js';

interface NewProps { projectId: string; zoneId: string | null; onClose: () => void; onAdded: (mark: string) => void }
/** Adds a member. Mount it when it opens, so that every one starts blank. */
export function NewMemberDrawer({ projectId, zoneId, onClose, onAdded }: NewProps) {
  const create = useCreateMember(projectId);
  const [section, setSection] = useState<SectionDto | null>(null);
  const form = useMemberForm(null, zoneId ? { zoneId } : {});
  useServerIssues(form, create.error);
  const save = form.handleSubmit((body) => create.mutate(body, { onSuccess: () => onAdded(body.mark) }));
  return (
    <FormDrawer title="Add a member" open onClose={onClose} onSubmit={(e) => { void save(e); }} dirty={form.formState.isDirty && !create.isSuccess} saving={create.isPending} error={create.error} saveText="Add the member" size={620}>
      <MemberFields form={form} projectId={projectId} section={section} setSection={setSection} />
    </FormDrawer>
  );
}

interface EditProps { projectId: string; member: MemberDto; section: SectionDto; onClose: () => void; onReload: () => void }
/** Changes what the specifier decides of a member. A save against an older version is refused and keeps what was typed. */
export function EditMemberDrawer({ projectId, member, section: saved, onClose, onReload }: EditProps) {
  const update = useUpdateMember(projectId, member.id);
  const [section, setSection] = useState<SectionDto | null>(saved);
  const form = useMemberForm(member);
  useServerIssues(form, update.error);
  const save = form.handleSubmit((body) => update.mutate({ ...body, version: member.version }, { onSuccess: onClose }));
  const reload = () => { update.reset(); onReload(); };
  return (
    <FormDrawer title={`Change ${member.mark}`} open onClose={onClose} onSubmit={(e) => { void save(e); }} dirty={form.formState.isDirty && !update.isSuccess} saving={update.isPending} error={update.error} onReload={reload} size={620}>
      <MemberFields form={form} projectId={projectId} section={section} setSection={setSection} />
    </FormDrawer>
  );
}
