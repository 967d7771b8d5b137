import { Button } from 'antd';
import { signInSchema } from '@mantlet/common';
import type { MeDto, SessionDto } from '@mantlet/common';
import { TextField } from '../../../ui/form/fields.js';
import { useContractForm } from '../../../ui/form/use-contract-form.js';
import { useSignIn } from '../api/session.js';
import { GateError } from './gate.js';

/** E-mail and password. Used by the sign-in page, and over a page whose session has ended. */
export function SignInForm({ known, onSignedIn }: { known?: MeDto; onSignedIn: (session: SessionDto) => void }) {
  const signIn = useSignIn(known !== undefined);
  const form = useContractForm(signInSchema, { defaultValues: { email: known?.email ?? '', password: '' } });
  const submit = form.handleSubmit((body) => signIn.mutate(body, { onSuccess: onSignedIn }));
  return (
    <form className="mt-form" noValidate onSubmit={(event) => { void submit(event); }}>
      <GateError error={signIn.error} />
      <TextField control={form.control} name="email" label="E-mail" type="email" autoComplete="username" autoFocus={!known} disabled={!!known} />
      <TextField control={form.control} name="password" label="Password" type="password" autoComplete="current-password" autoFocus={!!known} />
      <Button type="primary" htmlType="submit" loading={signIn.isPending} block>Sign in</Button>
    </form>
  );
}
