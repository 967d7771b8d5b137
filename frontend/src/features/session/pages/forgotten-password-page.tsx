import { Button } from 'antd';
import { Link } from 'react-router-dom';
import { resetRequestSchema } from '@mantlet/common';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useAskForReset } from '../api/account-links.js';
import { useSession } from '../api/session.js';
import { CaughtMailNote } from '../components/caught-mail-note.js';
import { Gate, GateError } from '../components/gate.js';

/** Says the same whether anybody has an account with the address or not. */
export default function ForgottenPasswordPage() {
  const ask = useAskForReset();
  const caught = useSession().data?.caughtMail ?? false;
  const form = useContractForm(resetRequestSchema, { defaultValues: { email: '' } });
  useServerIssues(form, ask.error);
  const submit = form.handleSubmit((body) => ask.mutate(body));
  if (ask.isSuccess) {
    return (
      <Gate title="Forgotten password" heading="Look into your mailbox" sub={`If ${ask.variables.email} has an account here, a link to choose another password is on its way there. It works once, within an hour.`}>
        <p className="mt-sub">Nothing after a few minutes? Look among unwanted mail, or ask the administrator of this installation which address your account has.</p>
        {caught && <CaughtMailNote />}
        <div className="mt-actions"><Button onClick={() => ask.reset()}>Try another address</Button><Link to="/sign-in">Go to sign in</Link></div>
      </Gate>
    );
  }
  return (
    <Gate title="Forgotten password" heading="Choose another password by e-mail" sub="Give the address you sign in with. Your present password stays as it is until you have used the link.">
      <form className="mt-form" noValidate onSubmit={(event) => { void submit(event); }}>
        <GateError error={ask.error} />
        <TextField control={form.control} name="email" label="E-mail" type="email" autoComplete="username" autoFocus />
        <Button type="primary" htmlType="submit" loading={ask.isPending} block>Send the link</Button>
      </form>
      <p className="mt-sub"><Link to="/sign-in">Go to sign in</Link></p>
    </Gate>
  );
}
