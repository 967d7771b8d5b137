import { Link, Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { LoadingState } from '../../../ui/states.js';
import { useSession } from '../api/session.js';
import { CaughtMailNote } from '../components/caught-mail-note.js';
import { Gate } from '../components/gate.js';
import { SignInForm } from '../components/sign-in-form.js';

const here = 'http://here.invalid';
/**
 * Only an address of this application may be returned to. Read as a browser reads it, which drops tabs and line breaks, takes a
 * backslash for a slash and resolves dots before it sees two slashes and goes to another server.
 */
export function returnAddress(to: string | null): string {
  if (!to?.startsWith('/') || !URL.canParse(to, here)) return '/projects';
  const { origin, pathname, search, hash } = new URL(to, here);
  return origin === here && !pathname.startsWith('//') && !pathname.startsWith('/sign-in') ? pathname + search + hash : '/projects';
}

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
      <p className="mt-sub"><Link to="/forgotten-password">Forgotten password?</Link></p>
      <p className="mt-sub">No account yet? The administrator of this installation invites people by e-mail.</p>
      {session.data?.caughtMail && <CaughtMailNote />}
    </Gate>
  );
}
