import { Button } from 'antd';
import { Navigate, useNavigate } from 'react-router-dom';
import { setUpSchema } from '@mantlet/common';
import { FailedSave } from '../../../ui/form/failed-save.js';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { LoadingState } from '../../../ui/states.js';
import { useSession, useSetUp } from '../api/session.js';
import { Gate } from '../components/gate.js';

export default function SetUpPage() {
  const session = useSession();
  const navigate = useNavigate();
  const setUp = useSetUp();
  const form = useContractForm(setUpSchema, { defaultValues: { name: '', email: '', password: '' } });
  useServerIssues(form, setUp.error);
  if (session.isPending) return <LoadingState what="Mantlet" />;
  if (session.data && !session.data.needsSetUp && !setUp.isSuccess) return <Navigate to="/sign-in" replace />;
  const submit = form.handleSubmit((body) => setUp.mutate(body, { onSuccess: () => { void navigate('/projects', { replace: true }); } }));
  return (
    <Gate title="Set up" heading="Make the first account" sub="Nobody has an account here yet. The first one is the administrator's: it gives accounts to the others and keeps the shared product library. To read a project it must be on the project's team, like everybody else.">
      <form className="mt-form" noValidate onSubmit={(event) => { void submit(event); }}>
        <FailedSave error={setUp.error} />
        <TextField control={form.control} name="name" label="Name" autoComplete="name" autoFocus />
        <TextField control={form.control} name="email" label="E-mail" type="email" autoComplete="username" />
        <TextField control={form.control} name="password" label="Password" type="password" autoComplete="new-password" help="At least 12 characters. A few unrelated words are easier to keep than signs." />
        <Button type="primary" htmlType="submit" loading={setUp.isPending} block>Make the account</Button>
      </form>
    </Gate>
  );
}
