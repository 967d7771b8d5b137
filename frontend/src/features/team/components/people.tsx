import { App, Button } from 'antd';
import { useMemo, useState } from 'react';
import { membershipInputSchema } from '@mantlet/common';
import type { MembershipDto, Role } from '@mantlet/common';
import { rolesInWords, whyNot } from '../../../lib/may.js';
import { roleDecides } from '../../../lib/role-words.js';
import { DeleteButton } from '../../../ui/form/delete-button.js';
import { CheckListField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { Panel } from '../../../ui/panel.js';
import { ScheduleTable } from '../../../ui/schedule-table.js';
import { QueryState } from '../../../ui/states.js';
import { roleOptions } from '../../projects/components/role-options.js';
import { useMay } from '../../projects/project-context.js';
import { useAddMembership, useMemberships, useRemoveMembership, useSetRoles } from '../api/team.js';

const roleHelp = 'Contractors, inspectors and readers see issued work only. Whoever prepares a schedule cannot check it.';

const nobody = { values: { email: '', roles: [] as Role[] }, version: null };
function AddPerson({ projectId, onClose }: { projectId: string; onClose: () => void }) {
  const add = useAddMembership(projectId);
  const { form, edit } = useEditForm({ schema: membershipInputSchema, name: `new-person/${projectId}`, title: 'Add a person', record: nobody, save: add, body: (input) => input, onSaved: onClose });
  return (
    <FormDrawer title="Add a person" open onClose={onClose} edit={edit} saveText="Add to the team" size={440}>
      <TextField control={form.control} name="email" label="E-mail" type="email" help="Of somebody who has an account here; they are told by e-mail. Who has none is invited by the administrator first." />
      <CheckListField control={form.control} name="roles" label="Roles" options={roleOptions} help={roleHelp} />
    </FormDrawer>
  );
}

const rolesSchema = membershipInputSchema.pick({ roles: true });
function EditPerson({ projectId, person, onClose }: { projectId: string; person: MembershipDto; onClose: () => void }) {
  const set = useSetRoles(projectId);
  const remove = useRemoveMembership(projectId);
  const { message } = App.useApp();
  const { form, edit } = useEditForm({
    schema: rolesSchema, name: `roles/${projectId}/${person.userId}`, title: `Roles of ${person.name}`, save: set, onSaved: onClose,
    record: useMemo(() => ({ values: { roles: person.roles }, version: null }), [person.roles]),
    body: ({ roles: given }, opened) => ({ userId: person.userId, roles: given, was: opened.values }),
    read: (answer: { roles: Role[] }) => ({ values: { roles: answer.roles }, version: null }),
  });
  const takeOff = () => remove.mutate(person.userId, { onSuccess: () => { void message.success(`${person.name} is no longer on the team.`); onClose(); } });
  return (
    <FormDrawer
      title={person.name} open onClose={onClose} edit={edit} error={remove.error} size={440}
      extra={<DeleteButton verb="Remove" what={`${person.name} from the team`} consequence="What they did stays in the audit trail and on issued revisions." busy={remove.isPending} onDelete={takeOff} />}
    >
      <p className="mt-sub">{person.email}</p>
      <CheckListField control={form.control} name="roles" label="Roles" options={roleOptions} help={roleHelp} />
    </FormDrawer>
  );
}

/** Who is on the project, and as what. */
export function People({ projectId }: { projectId: string }) {
  const people = useMemberships(projectId);
  const edit = useMay()('edit-team');
  const [adding, setAdding] = useState(false);
  const [editing, setEditing] = useState<MembershipDto | null>(null);
  return (
    <Panel flush title="People" sub={edit ? undefined : whyNot('edit-team')} actions={edit && <Button onClick={() => setAdding(true)}>Add a person</Button>}>
      <QueryState query={people} what="the team">
        {(rows) => (
          <ScheduleTable
            caption="People on the project" rows={rows} rowKey={(p) => p.userId} sticky={false}
            columns={[
              { title: 'Name', key: 'name', width: 260, className: 'mt-fold-head', render: (_, p) => <><span className="mt-strong">{p.name}</span><div className="mt-sub">{p.email}</div></> },
              { title: 'Roles', key: 'roles', className: 'mt-fold-text', render: (_, p) => <><span className="mt-strong">{rolesInWords(p.roles)}</span>{p.roles.map((role) => <div key={role} className="mt-sub">{roleDecides[role]}</div>)}</> },
              ...(edit ? [{ title: <span className="mt-sr">Change</span>, key: 'edit', className: 'mt-fold-side', align: 'right' as const, width: 100, render: (_: unknown, p: MembershipDto) => <Button size="small" onClick={() => setEditing(p)} aria-label={`Roles of ${p.name}`}>Roles</Button> }] : []),
            ]}
          />
        )}
      </QueryState>
      {adding && <AddPerson projectId={projectId} onClose={() => setAdding(false)} />}
      {editing && <EditPerson projectId={projectId} person={editing} onClose={() => setEditing(null)} />}
    </Panel>
  );
}
