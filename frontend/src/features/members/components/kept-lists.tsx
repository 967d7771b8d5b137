import { App, Button } from 'antd';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { memberViewInputSchema } from '@mantlet/common';
import type { MemberViewDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useChangeView, useDropView, useKeepView, useMemberViews } from '../api/member-list.js';

const standing = (aboveC: number) => [
  { name: 'All', query: '' },
  { name: 'Open', query: 'open=true' },
  { name: 'Assumed temperature', query: 'assumed=true' },
  { name: 'Outside the assessment', query: 'verdicts=outside' },
  { name: 'May stay bare', query: 'verdicts=bare' },
  { name: `Above ${aboveC} °C`, query: `criticalTemperatureAbove=${aboveC}` },
];
/** The same parameters in whatever order. */
const sameQuery = (a: string, b: string) => {
  const sorted = (text: string) => { const params = new URLSearchParams(text); params.sort(); return params.toString(); };
  return sorted(a) === sorted(b);
};

const nameSchema = memberViewInputSchema.pick({ name: true });
function KeepDrawer({ projectId, query, onClose }: { projectId: string; query: string; onClose: () => void }) {
  const keep = useKeepView(projectId);
  const form = useContractForm(nameSchema, { defaultValues: { name: '' } });
  useServerIssues(form, keep.error);
  const save = form.handleSubmit(({ name }) => keep.mutate({ name, query }, { onSuccess: onClose }));
  return (
    <FormDrawer title="Keep this list" open onClose={onClose} onSubmit={(e) => { void save(e); }} dirty={form.formState.isDirty && !keep.isSuccess} saving={keep.isPending} error={keep.error} saveText="Keep">
      <TextField control={form.control} name="name" label="Name" help="Filter, order and columns are kept with it, on this project and for you alone." />
    </FormDrawer>
  );
}

interface KeptListsProps { projectId: string; query: string; aboveC: number }

/** Lists in words: those that every project has, and one's own. */
export function KeptLists({ projectId, query, aboveC }: KeptListsProps) {
  const { message, modal } = App.useApp();
  const own = useMemberViews(projectId).data ?? [];
  const change = useChangeView(projectId);
  const drop = useDropView(projectId);
  const [keeping, setKeeping] = useState(false);
  const [last, setLast] = useState<MemberViewDto | null>(null);
  const current = own.find((view) => sameQuery(view.query, query));
  const chosen = current ?? last;
  const failed = (error: unknown) => { void message.error(error instanceof ApiError ? error.message : 'Not saved. Try again.'); };
  const askDrop = (view: MemberViewDto) => modal.confirm({
    title: `Forget the list ${view.name}?`, icon: null, content: 'Its members stay as they are.', okText: 'Forget it', cancelText: 'Keep it',
    onOk: () => drop.mutateAsync(view.id).then(() => setLast(null), failed),
  });
  const isBuiltIn = standing(aboveC).some((one) => sameQuery(one.query, query));
  return (
    <div className="mt-lists mt-noprint">
      <nav aria-label="Lists">
        <ul>
          {standing(aboveC).map((one) => <li key={one.name}><Link to={{ search: one.query }} aria-current={sameQuery(one.query, query) ? 'true' : undefined} onClick={() => setLast(null)}>{one.name}</Link></li>)}
          {own.map((view) => <li key={view.id} className="mt-list-own"><Link to={{ search: view.query }} aria-current={view.id === current?.id ? 'true' : undefined} onClick={() => setLast(view)}>{view.name}</Link></li>)}
        </ul>
      </nav>
      <div className="mt-row-actions">
        {!current && !isBuiltIn && <Button size="small" onClick={() => setKeeping(true)}>Keep this list</Button>}
        {last && !current && own.some((v) => v.id === last.id) && <Button size="small" onClick={() => change.mutate({ ...last, query }, { onSuccess: () => void message.success(`${last.name} is this list now`), onError: failed })}>Change {last.name} to this</Button>}
        {chosen && current && <Button size="small" onClick={() => askDrop(current)}>Forget {current.name}</Button>}
      </div>
      {keeping && <KeepDrawer projectId={projectId} query={query} onClose={() => setKeeping(false)} />}
    </div>
  );
}
