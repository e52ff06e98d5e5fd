import { describeError } from '@/components/api/api-problem';
import { useChangeMember } from '@/components/api/use-people';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { memberChangeRequest, type Member } from '@/shared/api/session';
import { RolesChoice } from './roles-choice';
import { useScreenForm } from './screen-form';

/** Changes somebody's roles, or whether they may sign in to this team. */
export function MemberDialog({ member, onClose }: { readonly member: Member; readonly onClose: () => void }) {
  const { id, name, active, isYou, abilities } = member;
  const change = useChangeMember();
  const activity = useChangeMember();
  const form = useScreenForm({
    initial: { roles: member.roles },
    schema: memberChangeRequest,
    bodyOf: ({ roles }) => ({ roles }),
    sender: { ...change, mutateAsync: (body) => change.mutateAsync({ id, ...body }) },
    onDone: onClose,
  });
  return (
    <Dialog
      open
      insistent
      title={name}
      onClose={onClose}
      actions={
        <>
          {abilities.deactivate && !isYou ? (
            <Button
              label={active ? 'Deactivate' : 'Activate again'}
              variant={active ? 'danger' : 'plain'}
              busy={activity.isPending}
              onPress={() => activity.mutate({ id, active: !active }, { onSuccess: onClose })}
            />
          ) : null}
          <Button
            label="Save the roles"
            variant="primary"
            onPress={form.submit}
            busy={form.busy}
            disabled={!abilities.changeRoles}
          />
        </>
      }
    >
      <Form label={`Roles of ${name}`} onSubmit={form.submit}>
        <RolesChoice
          roles={form.values.roles}
          onChange={(roles) => form.set('roles', [...roles])}
          error={form.errorOf('roles')}
        />
        <Text variant="small" tone="soft">
          A change ends the sessions of this person; they sign in again with the new roles.
        </Text>
        {form.error ? <Notice kind="error" text={form.error} /> : null}
        {activity.isError ? <Notice kind="error" text={describeError(activity.error)} /> : null}
      </Form>
    </Dialog>
  );
}
