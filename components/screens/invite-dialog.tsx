import { useInvite } from '@/components/api/use-people';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import type { Role } from '@/shared/api/fields';
import { invitationRequest } from '@/shared/api/session';
import { RolesChoice } from './roles-choice';
import { useScreenForm } from './screen-form';

/** Invites somebody by e-mail. */
export function InviteDialog({ onClose }: { readonly onClose: () => void }) {
  const form = useScreenForm({
    initial: { email: '', roles: [] as readonly Role[] },
    schema: invitationRequest,
    bodyOf: ({ email, roles }) => ({ email, roles: [...roles] }),
    sender: useInvite(),
    onDone: onClose,
    draft: { name: 'invite', fields: ['email', 'roles'] },
  });
  return (
    <Dialog
      open
      insistent
      title="Invite somebody"
      onClose={onClose}
      actions={
        <>
          <Button label="Cancel" onPress={onClose} />
          <Button label="Send the invitation" variant="primary" onPress={form.submit} busy={form.busy} />
        </>
      }
    >
      <Form label="Invite somebody" onSubmit={form.submit}>
        <Field
          label="E-mail"
          value={form.values.email}
          onChange={(text) => form.set('email', text)}
          error={form.errorOf('email')}
          inputMode="email"
          autoComplete="off"
          autoFocus
          required
        />
        <RolesChoice
          roles={form.values.roles}
          onChange={(roles) => form.set('roles', roles)}
          error={form.errorOf('roles')}
        />
        {form.error ? <Notice kind="error" text={form.error} /> : null}
      </Form>
    </Dialog>
  );
}
