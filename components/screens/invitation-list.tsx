import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useInvitations, useSendInvitationAgain, useWithdrawInvitation } from '@/components/api/use-people';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { Heading, Text } from '@/components/ui/text';
import type { Invitation } from '@/shared/api/session';
import { rolesText } from './role-words';

/** Invitations that nobody has accepted yet. */
export function InvitationList() {
  const invitations = useInvitations(true);
  return (
    <View style={{ gap: space.s }}>
      <Heading level={2}>Open invitations</Heading>
      {invitations.isPending ? (
        <LoadingState label="Fetching the invitations" />
      ) : invitations.isError ? (
        <ErrorState
          title="The invitations did not arrive"
          text={describeError(invitations.error)}
          onRetry={() => void invitations.refetch()}
        />
      ) : invitations.data.items.length === 0 ? (
        <Text tone="soft">None is open.</Text>
      ) : (
        <View role="list">
          {invitations.data.items.map((invitation) => (
            <InvitationLine key={invitation.id} invitation={invitation} />
          ))}
        </View>
      )}
    </View>
  );
}

function InvitationLine({ invitation }: { readonly invitation: Invitation }) {
  const { color } = useTheme();
  const { id, email, roles, invitedBy, expiresAt } = invitation;
  const again = useSendInvitationAgain();
  const withdraw = useWithdrawInvitation();
  const error = again.error ?? withdraw.error;
  return (
    <View
      role="listitem"
      style={{
        gap: space.s,
        paddingVertical: space.m,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
      }}
    >
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.m }}>
        <View style={{ flexGrow: 1, flexShrink: 1 }}>
          <Text variant="strong">{email}</Text>
          <Text variant="small" tone="soft">
            {`${rolesText(roles)}; invited by ${invitedBy}, open until ${new Date(expiresAt).toLocaleDateString()}`}
          </Text>
        </View>
        <View style={{ flexDirection: 'row', gap: space.s }}>
          <Button
            label={`Send the invitation to ${email} again`}
            onPress={() => again.mutate(id)}
            busy={again.isPending}
          >
            {again.isSuccess ? 'Sent' : 'Send again'}
          </Button>
          <Button
            label={`Withdraw the invitation to ${email}`}
            variant="danger"
            onPress={() => withdraw.mutate(id)}
            busy={withdraw.isPending}
          >
            Withdraw
          </Button>
        </View>
      </View>
      {error ? <Notice kind="error" text={describeError(error)} /> : null}
    </View>
  );
}
