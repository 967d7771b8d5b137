import { useState } from 'react';
import type { z } from 'zod';
import { acceptanceKinds, acceptanceFormSchema, defaultDesignBasis } from '@mantlet/common';
import type { Acceptance, FoundSummaryDto, MembersFound } from '@mantlet/common';
import { count, joinWords } from '../../../lib/format.js';
import { RadioField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useCurrentProject } from '../../projects/project-context.js';
import { useWatch } from 'react-hook-form';
import { useAccept } from '../api/members.js';
import { acceptable } from './acceptance.js';
import type { Acceptable, AcceptanceKind } from './acceptance.js';

const named = (members: readonly Acceptable[]) => (members.length > 6 ? `${members.slice(0, 6).map((m) => m.mark).join(', ')} and ${members.length - 6} more` : joinWords(members.map((m) => m.mark)));

interface AcceptanceDrawerProps {
  members: readonly Acceptable[];
  /** instead of members: all that a filter finds, and how many of them each kind is about */
  found?: { choice: MembersFound; summary: FoundSummaryDto };
  onClose: () => void; onAccepted: (n: number) => void;
}

/** The fire engineer's signed acceptance, with its reason. It lapses by itself when the accepted value changes. */
export function AcceptanceDrawer({ members, found, onClose, onAccepted }: AcceptanceDrawerProps) {
  const project = useCurrentProject();
  const accept = useAccept(project.id);
  const aboveC = (project.settings?.designBasis ?? defaultDesignBasis).secondSignatureAboveC;
  const by = acceptable(members, aboveC);
  const words: Record<AcceptanceKind, string> = { assumed: 'An assumed critical temperature', 'high-temperature': `A critical temperature above ${aboveC} °C`, bare: 'Staying bare' };
  const number = (kind: AcceptanceKind) => (found ? found.summary.acceptable[kind] : by[kind].length);
  const first = acceptanceKinds.find((kind) => number(kind) > 0);
  const [record] = useState(() => ({ values: { ...(first && { kind: first }), reason: '' } as z.input<typeof acceptanceFormSchema>, version: null }));
  const { form, edit } = useEditForm({
    schema: acceptanceFormSchema, name: `accept/${members.length === 1 ? members[0]?.id : project.id}`, title: 'Accept', save: accept,
    record,
    body: (input: Omit<Acceptance, 'memberIds' | 'found'>) => (found ? { ...input, found: found.choice } : { ...input, memberIds: by[input.kind].map((m) => m.id) }), onSaved: ({ accepted }) => onAccepted(accepted),
  });
  const kind = useWatch({ control: form.control, name: 'kind' }) as AcceptanceKind | undefined;
  const chosen = kind ? by[kind] : [];
  const options = acceptanceKinds.map((value) => ({ value, label: `${words[value]}: ${number(value) === 0 ? 'none chosen' : count(number(value), 'member')}`, disabled: number(value) === 0 }));
  if (!first) {
    return (
      <FormDrawer title="Accept" open onClose={onClose} onSubmit={(e) => { e.preventDefault(); onClose(); }} dirty={false} saving={false} saveText="Close">
        <p>Nothing here needs an acceptance: none of {count(found?.summary.count ?? members.length, 'chosen member')} rests on an assumed temperature, has a critical temperature above {aboveC} °C, or may stay bare.</p>
      </FormDrawer>
    );
  }
  return (
    <FormDrawer
      title="Accept" open onClose={onClose} edit={edit}
      saveText={kind ? `Accept for ${count(number(kind), 'member')}` : 'Accept'}
    >
      <RadioField control={form.control} name="kind" label="What you accept" options={options} help="Your name and the date go with it. It holds only while the accepted value stands." />
      {chosen.length > 0 && <p className="mt-sub">{named(chosen)}</p>}
      <TextField control={form.control} name="reason" label="Reason" rows={4} help="Printed with the schedule." />
    </FormDrawer>
  );
}
