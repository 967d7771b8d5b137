import { App, Button } from 'antd';
import { useState } from 'react';
import type { MemberRowDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { count } from '../../../lib/format.js';
import { useMay } from '../../projects/project-context.js';
import { useDeleteMembers } from '../api/members.js';
import { AcceptanceDrawer } from '../forms/acceptance-drawer.js';
import { BulkDrawer } from '../forms/bulk-drawer.js';
import { changedWords } from '../member-words.js';

interface ChoiceBarProps {
  projectId: string;
  chosen: readonly MemberRowDto[];
  /** members that the filter finds, on all pages */
  found: number;
  clear: () => void;
  chooseAll: () => Promise<void>;
}
const mostAtOnce = 5000;

/** What may be done with the chosen members, by those who may do it. */
export function ChoiceBar({ projectId, chosen, found, clear, chooseAll }: ChoiceBarProps) {
  const { message, modal } = App.useApp();
  const may = useMay();
  const remove = useDeleteMembers(projectId);
  const [drawer, setDrawer] = useState<'set' | 'accept' | null>(null);
  const [gathering, setGathering] = useState(false);
  if (chosen.length === 0) return null;
  const done = (words: string) => { setDrawer(null); clear(); void message.success(words); };
  const gather = async () => {
    setGathering(true);
    await chooseAll().catch((error: unknown) => message.error(error instanceof ApiError ? error.message : 'The members could not all be fetched. Try again.'));
    setGathering(false);
  };
  const askDelete = () => modal.confirm({
    title: `Delete ${count(chosen.length, 'member')}?`, icon: null, okText: `Delete ${count(chosen.length, 'member')}`, okButtonProps: { danger: true }, cancelText: 'Keep',
    content: `${chosen.slice(0, 8).map((m) => m.mark).join(', ')}${chosen.length > 8 ? ` and ${chosen.length - 8} more` : ''}. They leave the schedule in progress; issued revisions keep them.`,
    onOk: () => remove.mutateAsync({ members: chosen.map(({ id, version }) => ({ id, version })) }).then(({ deleted }) => done(`${count(deleted, 'member')} deleted`), (error: unknown) => {
      void message.error(error instanceof ApiError ? error.message : 'Nothing was deleted. Try again.');
    }),
  });
  return (
    <div className="mt-choice mt-noprint" role="region" aria-label="Chosen members">
      <strong role="status">{count(chosen.length, 'member')} chosen</strong>
      {chosen.length < found && found <= mostAtOnce && <Button loading={gathering} onClick={() => { void gather(); }}>Choose all {found} found</Button>}
      {may('edit-members') && <Button onClick={() => setDrawer('set')}>Set values</Button>}
      {may('accept-temperatures') && <Button onClick={() => setDrawer('accept')}>Accept</Button>}
      {may('edit-members') && <Button danger onClick={askDelete}>Delete</Button>}
      <Button type="link" onClick={clear}>Choose none</Button>
      {drawer === 'set' && <BulkDrawer projectId={projectId} members={chosen} onClose={() => setDrawer(null)} onChanged={(n) => done(changedWords(n))} />}
      {drawer === 'accept' && <AcceptanceDrawer members={chosen} onClose={() => setDrawer(null)} onAccepted={(n) => done(`Accepted for ${count(n, 'member')}`)} />}
    </div>
  );
}
