import { useState } from 'react';
import { useForgottenPassword } from '@/components/api/use-account';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { forgottenPasswordRequest } from '@/shared/api/session';
import { DoorFrame } from './door-frame';
import { useScreenForm } from './screen-form';

/** Asks for a link that sets a new password. */
export function ForgottenScreen() {
  const [sent, setSent] = useState(false);
  const form = useScreenForm({
    initial: { email: '' },
    schema: forgottenPasswordRequest,
    bodyOf: (values) => values,
    sender: useForgottenPassword(),
    onDone: () => setSent(true),
  });
  return (
    <DoorFrame title="Forgotten password" lead="A link to set a new one is sent to your e-mail address.">
      {sent ? (
        <Notice
          kind="done"
          text="If there is an account with this address, the link is on its way. It holds for a short time."
        />
      ) : (
        <Form label="Forgotten password" onSubmit={form.submit}>
          <Field
            label="E-mail"
            value={form.values.email}
            onChange={(text) => form.set('email', text)}
            error={form.errorOf('email')}
            autoComplete="username"
            inputMode="email"
            required
          />
          {form.error ? <Notice kind="error" text={form.error} /> : null}
          <Button label="Send the link" variant="primary" onPress={form.submit} busy={form.busy} wide />
        </Form>
      )}
      <Link alone href="/sign-in" label="Back to signing in" />
    </DoorFrame>
  );
}
