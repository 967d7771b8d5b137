import { useMemo, useState } from 'react';
import type { MemberDto, MemberInput, SectionDto } from '@mantlet/common';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useCreateMember, useUpdateMember } from '../api/members.js';
import { MemberFields, useZoneOptions } from './member-fields.js';
import { memberSchema, memberStanding, memberWords, newMember } from './member-form.js';
import type { Named } from './member-form.js';

interface NewProps { projectId: string; zoneId: string | null; onClose: () => void; onAdded: (mark: string) => void }
/** Adds a member. Mount it when it opens, so that every one starts blank. */
export function NewMemberDrawer({ projectId, zoneId, onClose, onAdded }: NewProps) {
  const create = useCreateMember(projectId);
  const zones = useZoneOptions(projectId);
  const [section, setSection] = useState<SectionDto | null>(null);
  const { form, edit } = useEditForm({
    schema: memberSchema, name: `new-member/${projectId}`, title: 'Add a member', save: create, body: (input: MemberInput) => input, onSaved: (_, input) => onAdded(input.mark),
    record: useMemo(() => newMember(zoneId), [zoneId]), words: memberWords({ zones, sections: [section] }),
  });
  return (
    <FormDrawer title="Add a member" open onClose={onClose} edit={edit} saveText="Add the member" size={620}>
      <MemberFields form={form} projectId={projectId} section={section} setSection={setSection} />
    </FormDrawer>
  );
}

interface EditProps { projectId: string; member: MemberDto; section: SectionDto; onClose: () => void }
/** Changes what the specifier decides of a member. A save that was overtaken shows both versions. */
export function EditMemberDrawer({ projectId, member, section: saved, onClose }: EditProps) {
  const update = useUpdateMember(projectId, member.id);
  const makeAnew = useCreateMember(projectId);
  const zones = useZoneOptions(projectId);
  const [section, setSection] = useState<SectionDto | null>(saved);
  const [theirs, setTheirs] = useState<Named | null>(null);
  const title = `Change ${member.mark}`;
  const { form, edit } = useEditForm({
    schema: memberSchema, name: `member/${member.id}`, title, save: update, onSaved: onClose,
    record: useMemo(() => memberStanding(member), [member]),
    body: (input, { version }) => ({ ...input, version: version ?? member.version }),
    // of a member that somebody else saved the answer names the section, which this form may never have seen
    read: (answer: MemberDto & { designation?: string }) => {
      if (answer.designation) setTheirs({ id: answer.sectionId, designation: answer.designation });
      return memberStanding(answer);
    },
    anew: (input) => makeAnew.mutateAsync(input),
    words: memberWords({ zones, sections: [saved, section, theirs] }),
  });
  return (
    <FormDrawer title={title} open onClose={onClose} edit={edit} error={makeAnew.error} size={620}>
      <MemberFields form={form} projectId={projectId} section={section} setSection={setSection} />
    </FormDrawer>
  );
}
