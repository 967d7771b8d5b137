import { Link, Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { LoadingState } from '../../../ui/states.js';
import { useSession } from '../api/session.js';
import { CaughtMailNote } from '../components/caught-mail-note.js';
import { Gate } from '../components/gate.js';
import { SignInForm } from '../components/sign-in-form.js';

/** Only an address of this application may be returned to. */
export const returnAddress = (to: string | null): string => (to && /^\/(?![/\\])/.test(to) && !to.startsWith('/sign-in') ? to : '/projects');

export default function SignInPage() {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const session = useSession();
  const to = returnAddress(params.get('to'));
  if (session.isPending) return <LoadingState what="Mantlet" />;
  if (session.data?.needsSetUp) return <Navigate to="/set-up" replace />;
  if (session.data?.user) return <Navigate to={to} replace />;
  return (
    <Gate title="Sign in" heading="Sign in" sub="From a steel frame and a fire strategy to a checked protection schedule.">
      <SignInForm onSignedIn={() => { void navigate(to, { replace: true }); }} />
      <p className="mt-sub"><Link to="/forgotten-password">Forgotten password?</Link> No account? The administrator of this installation invites people by e-mail.</p>
      {session.data?.caughtMail && <CaughtMailNote />}
    </Gate>
  );
}
