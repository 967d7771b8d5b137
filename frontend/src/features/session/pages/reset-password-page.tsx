import { ChoosePassword } from '../components/choose-password.js';

export default function ResetPasswordPage() {
  return <ChoosePassword purpose="password-reset" />;
}
