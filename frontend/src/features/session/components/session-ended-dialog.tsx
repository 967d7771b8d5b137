import { Modal } from 'antd';
import { Link } from 'react-router-dom';
import type { MeDto } from '@mantlet/common';
import { SignInForm } from './sign-in-form.js';

/** The page below stays as it is, with everything typed into it. */
export function SessionEndedDialog({ user, onBack }: { user: MeDto; onBack: () => void }) {
  return (
    <Modal open title="Your session has ended" footer={null} closable={false} keyboard={false} mask={{ closable: false }} width={440}>
      <p className="mt-sub" style={{ marginBottom: 16 }}>Sign in again to go on where you were. What you typed stays on the page. <Link to="/sign-in" reloadDocument>Sign in as somebody else</Link></p>
      <SignInForm known={user} onSignedIn={onBack} />
    </Modal>
  );
}
