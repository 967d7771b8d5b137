import { ChoosePassword } from '../components/choose-password.js';

export default function AcceptInvitationPage() {
  return <ChoosePassword purpose="invitation" />;
}
