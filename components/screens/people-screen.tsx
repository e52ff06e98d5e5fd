import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useSession } from '@/components/api/session-provider';
import { useMembers } from '@/components/api/use-people';
import { line, space, target } from '@/components/theme/tokens';
import { useSizeClass } from '@/components/theme/use-size-class';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/state-mark';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { Member } from '@/shared/api/session';
import { InvitationList } from './invitation-list';
import { InviteDialog } from './invite-dialog';
import { MemberDialog } from './member-dialog';
import { rolesText } from './role-words';
import { ScreenFrame } from './screen-frame';

/** The people of the team; an administrator invites, gives roles and deactivates. */
export function PeopleScreen() {
  const { team, abilities } = useSession();
  const members = useMembers();
  const [inviting, setInviting] = useState(false);
  const [changed, setChanged] = useState<Member | null>(null);
  return (
    <ScreenFrame
      title="People"
      lead={team.name}
      actions={
        abilities.administer ? (
          <Button label="Invite" icon="add" variant="primary" onPress={() => setInviting(true)} />
        ) : null
      }
    >
      {members.isPending ? (
        <LoadingState label="Fetching the people" />
      ) : members.isError ? (
        <ErrorState
          title="The people did not arrive"
          text={describeError(members.error)}
          onRetry={() => void members.refetch()}
        />
      ) : (
        <View role="list">
          {members.data.items.map((member) => (
            <MemberLine key={member.id} member={member} onChange={() => setChanged(member)} />
          ))}
        </View>
      )}
      {abilities.administer ? <InvitationList /> : null}
      {inviting ? <InviteDialog onClose={() => setInviting(false)} /> : null}
      {changed ? <MemberDialog member={changed} onClose={() => setChanged(null)} /> : null}
    </ScreenFrame>
  );
}

function MemberLine({ member, onChange }: { readonly member: Member; readonly onChange: () => void }) {
  const { color } = useTheme();
  const phone = useSizeClass() === 'phone';
  const { name, email, roles, active, isYou, abilities } = member;
  const canChange = abilities.changeRoles || abilities.deactivate;
  return (
    <View
      role="listitem"
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.l,
        paddingVertical: space.m,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
      }}
    >
      <View
        style={{
          flex: 1,
          minHeight: target.min,
          flexDirection: phone ? 'column' : 'row',
          alignItems: phone ? 'stretch' : 'center',
          gap: phone ? space.hair : space.l,
        }}
      >
        <View
          style={{
            flex: phone ? undefined : 1,
            flexDirection: 'row',
            flexWrap: 'wrap',
            alignItems: 'center',
            gap: space.s,
          }}
        >
          <Text variant="strong" tone={active ? 'ink' : 'soft'}>
            {name}
          </Text>
          {isYou ? <Chip text="you" /> : null}
          {active ? null : <Chip text="deactivated" />}
        </View>
        <Text variant="small" style={phone ? undefined : { flex: 1 }}>
          {rolesText(roles)}
        </Text>
        <Text variant="small" tone="soft" selectable style={phone ? undefined : { flex: 1 }}>
          {email}
        </Text>
      </View>
      {canChange ? (
        <Button label={`Change ${name}`} onPress={onChange}>
          Change
        </Button>
      ) : null}
    </View>
  );
}
