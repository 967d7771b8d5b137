import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../../ui/states.js';
import { useSession } from '../../session/api/session.js';

/** Somebody with an account and no project: what happens next, and whom to ask. */
export function FirstVisit({ start }: { start: ReactNode }) {
  const user = useSession().data?.user;
  return (
    <EmptyState title="Nothing to do yet, and nothing missed" action={start}>
      <p>
        If you were invited to work on a project, its fire engineer or specifier adds you to the team by your e-mail address{user ? <>, <span className="mt-strong">{user.email}</span></> : null}.
        The project then stands here, with what waits on you. If it does not, ask whoever invited you.
      </p>
      <p>If you are to begin one yourself, start it here and say which roles you hold on it. <Link to="/help">What each role does, step by step</Link></p>
      {user?.administrator && <p>You are the administrator: <Link to="/accounts">invite people under Accounts</Link> first. You see a project only where you are on its team.</p>}
    </EmptyState>
  );
}
