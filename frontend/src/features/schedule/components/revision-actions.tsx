import { Alert, App, Button } from 'antd';
import { useState } from 'react';
import type { ReactNode } from 'react';
import type { ReadinessDto, RevisionDto, Role } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { may } from '../../../lib/may.js';
import { useSession } from '../../session/api/session.js';
import { useTakeStep } from '../api/revisions.js';
import type { Step } from '../api/revisions.js';
import { nextStep } from '../revision-words.js';
import { ChangeRevision, ReturnRevision } from './revision-drawers.js';

const questions: Record<Step, (code: string) => { title: string; content: string; okText: string }> = {
  prepare: (code) => ({ title: `Prepare ${code}?`, content: `The schedule is frozen as it stands now, under your name. Another specifier then checks it. What changes afterwards is not in ${code} unless it is returned.`, okText: 'Prepare' }),
  check: (code) => ({ title: `Sign ${code} as checked?`, content: 'Your name goes on the schedule as the one who checked it. It can then be issued.', okText: 'Sign as checked' }),
  issue: (code) => ({ title: `Issue ${code}?`, content: `The PDF is made once and kept with its digest, the site reads ${code} from now on, and an earlier issued revision is superseded. An issued revision cannot be changed afterwards, nor taken back: corrections go into the next one.`, okText: 'Issue' }),
};

interface RevisionActionsProps { projectId: string; revision: RevisionDto; held: readonly Role[]; readiness: ReadinessDto | undefined; /** where what is open is listed */ listed: ReactNode }

/** What can be done with a revision now, by this person; what cannot says why. */
export function RevisionActions({ projectId, revision, held, readiness, listed }: RevisionActionsProps) {
  const { modal } = App.useApp();
  const myId = useSession().data?.user?.id ?? null;
  const take = useTakeStep(projectId, revision.id);
  const [drawer, setDrawer] = useState<'change' | 'return' | null>(null);
  const offer = nextStep(revision, held, myId, readiness);
  if (!offer) return null;
  const edits = may(held, 'edit-revisions');
  const ask = () => modal.confirm({ ...questions[offer.step](revision.code), icon: null, cancelText: 'Not yet', onOk: () => take.mutateAsync(offer.step).catch(() => undefined) });
  return (
    <div className="mt-stack mt-noprint">
      <div className="mt-actions">
        {edits && <Button type="primary" disabled={offer.why !== null} loading={take.isPending} onClick={ask}>{offer.text}</Button>}
        {edits && revision.state === 'draft' && <Button onClick={() => setDrawer('change')}>Edit code and purpose</Button>}
        {edits && revision.state !== 'draft' && <Button onClick={() => setDrawer('return')}>Return with a comment</Button>}
      </div>
      {offer.why && <p className="mt-sub">{offer.why}{offer.step === 'prepare' && edits && <> {listed}</>}</p>}
      {take.error && (
        <Alert
          type="error" role="alert" title="Left as it was"
          description={take.error instanceof ApiError ? <>{take.error.message}{take.error.issues.length > 0 && <ul>{take.error.issues.map((i) => <li key={i.path + i.message}>{i.message}</li>)}</ul>}</> : 'Something went wrong in this page; try again.'}
        />
      )}
      {drawer === 'change' && <ChangeRevision projectId={projectId} revision={revision} onClose={() => setDrawer(null)} />}
      {drawer === 'return' && <ReturnRevision projectId={projectId} revision={revision} onClose={() => setDrawer(null)} />}
    </div>
  );
}
