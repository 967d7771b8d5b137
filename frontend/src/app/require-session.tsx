import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import type { MeDto } from '@mantlet/common';
import { useSession } from '../features/session/api/session.js';
import { SessionEndedDialog } from '../features/session/components/session-ended-dialog.js';
import { leaveToSomebodyElse, onSignedInElsewhere } from '../features/session/other-windows.js';
import { onSignedOut } from '../lib/api-client.js';
import { pruneDrafts } from '../lib/drafts.js';
import { sessionKey } from '../lib/query-client.js';
import { DraftOwner } from '../ui/form/use-draft.js';
import { LeaveGuard } from '../ui/form/use-unsaved-changes.js';
import { ErrorState, LoadingState } from '../ui/states.js';

/**
 * Whoever arrives without a session signs in and comes back to the address they asked for.
 * Whoever loses it while working signs in over the page, so that nothing typed is lost.
 */
export function RequireSession() {
  const session = useSession();
  const location = useLocation();
  const client = useQueryClient();
  const [ended, setEnded] = useState(false);
  // who was working here: while the page is open they sign in over it, however the end of their session became known
  const [known, setKnown] = useState<MeDto | null>(null);
  useEffect(() => {
    pruneDrafts();
    onSignedOut(() => setEnded(true));
    return () => onSignedOut(() => undefined);
  }, []);
  const now = session.data?.user?.id;
  const somebodyElse = known !== null && now !== undefined && now !== known.id;
  useEffect(() => { if (somebodyElse) leaveToSomebodyElse(); }, [somebodyElse]);
  const knownId = known?.id;
  useEffect(() => (knownId === undefined ? undefined : onSignedInElsewhere((id) => { if (id !== knownId) leaveToSomebodyElse(); })), [knownId]);
  if (session.data === undefined) {
    return session.error ? <ErrorState error={session.error} retry={() => { void session.refetch(); }} /> : <LoadingState what="Mantlet" />;
  }
  if (session.data.needsSetUp) return <Navigate to="/set-up" replace />;
  if (somebodyElse) return <LoadingState what="Mantlet" />;
  if (session.data.user && known === null) setKnown(session.data.user);
  const user = session.data.user ?? known;
  if (!user) return <Navigate to={`/sign-in?to=${encodeURIComponent(location.pathname + location.search)}`} replace />;
  return (
    <DraftOwner value={user.id}>
      <LeaveGuard />
      <Outlet />
      {(ended || !session.data.user) && (
        <SessionEndedDialog
          user={user}
          onBack={() => { setEnded(false); void client.invalidateQueries({ predicate: (q) => q.queryKey[0] !== sessionKey[0] }); }}
        />
      )}
    </DraftOwner>
  );
}
