import { App, Button } from 'antd';
import { useState } from 'react';
import type { MembersChangedDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { count } from '../../../lib/format.js';
import { whyNot } from '../../../lib/may.js';
import type { Right } from '../../../lib/may.js';
import { useMay } from '../../projects/project-context.js';
import { useDeleteMembers } from '../api/members.js';
import { AcceptanceDrawer } from '../forms/acceptance-drawer.js';
import { BulkDrawer } from '../forms/bulk-drawer.js';
import { BulkStructuralDrawer } from '../forms/bulk-structural-drawer.js';
import type { Chosen } from '../use-choice.js';

interface ChoiceBarProps { projectId: string; chosen: Chosen; found: number }
const rights = ['edit-members', 'edit-structural', 'accept-temperatures'] as const satisfies readonly Right[];

const changedWords = ({ changed, results }: MembersChangedDto) =>
  (changed === 0 ? 'Nothing was different' : `${count(changed, 'member')} changed, ${results === 0 ? 'no result moved' : `${count(results, 'result')} moved`}`);

/** What may be done with the chosen members, by those who may do it; the others read who may. */
export function ChoiceBar({ projectId, chosen, found }: ChoiceBarProps) {
  const { message, modal } = App.useApp();
  const may = useMay();
  const remove = useDeleteMembers(projectId);
  const [drawer, setDrawer] = useState<'set' | 'structural' | 'accept' | null>(null);
  if (chosen.count === 0) return null;
  const { choice, rows, summary } = chosen;
  const done = (words: string) => { setDrawer(null); chosen.clear(); void message.success(words); };
  const marks = rows ? rows.slice(0, 8).map((m) => m.mark) : summary?.marks ?? [];
  const askDelete = () => choice && modal.confirm({
    title: `Delete ${count(chosen.count, 'member')}?`, icon: null, okText: `Delete ${count(chosen.count, 'member')}`, okButtonProps: { danger: true }, cancelText: 'Keep',
    content: `${marks.join(', ')}${chosen.count > marks.length ? ` and ${chosen.count - marks.length} more` : ''}. They leave the schedule in progress with their results and acceptances, and cannot be brought back; issued revisions keep them.`,
    onOk: () => remove.mutateAsync(choice).then(({ deleted }) => done(`${count(deleted, 'member')} deleted`), (error: unknown) => {
      void message.error(error instanceof ApiError ? error.message : 'Nothing was deleted. Try again.');
    }),
  });
  const ready = { disabled: choice === null };
  const cannot = rights.filter((right) => !may(right)).map(whyNot).join(' ');
  return (
    <div className="mt-choice mt-noprint" role="region" aria-label="Chosen members">
      <strong role="status">{count(chosen.count, 'member')} chosen</strong>
      {chosen.count < found && <Button onClick={chosen.chooseAll}>Choose all {found} found</Button>}
      {may('edit-members') && <Button {...ready} onClick={() => setDrawer('set')}>Set values</Button>}
      {may('edit-structural') && <Button {...ready} onClick={() => setDrawer('structural')}>Set critical temperature</Button>}
      {may('accept-temperatures') && <Button {...ready} onClick={() => setDrawer('accept')}>Accept</Button>}
      {may('edit-members') && <Button danger {...ready} onClick={askDelete}>Delete</Button>}
      <Button type="link" onClick={chosen.clear}>Choose none</Button>
      {cannot && <span className="mt-choice-cannot mt-sub">{cannot}</span>}
      {chosen.error instanceof ApiError && <span role="alert">{chosen.error.message}</span>}
      {choice && drawer === 'set' && <BulkDrawer projectId={projectId} choice={choice} count={chosen.count} onClose={() => setDrawer(null)} onChanged={(n) => done(changedWords(n))} />}
      {choice && drawer === 'structural' && <BulkStructuralDrawer projectId={projectId} choice={choice} count={chosen.count} onClose={() => setDrawer(null)} onChanged={(n) => done(changedWords(n))} />}
      {choice && drawer === 'accept' && <AcceptanceDrawer members={rows ?? []} {...(choice.found && summary ? { found: { choice: choice.found, summary } } : {})} onClose={() => setDrawer(null)} onAccepted={(n) => done(`Accepted for ${count(n, 'member')}`)} />}
    </div>
  );
}
