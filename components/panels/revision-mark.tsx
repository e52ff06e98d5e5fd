import { View } from 'react-native';
import { space } from '@/components/theme/tokens';
import type { ThemeColors } from '@/components/theme/themes';
import { Icon, type IconName } from '@/components/ui/icon';
import { Text, type TextTone } from '@/components/ui/text';
import type { RevisionState } from '@/shared/api/jobs';

const LOOKS = {
  saved: { icon: 'copy', tone: 'inkSoft', word: 'soft' },
  'in review': { icon: 'eye', tone: 'action', word: 'action' },
  returned: { icon: 'undo', tone: 'ink', word: 'ink' },
  frozen: { icon: 'lock', tone: 'ink', word: 'ink' },
  superseded: { icon: 'archive', tone: 'inkSoft', word: 'soft' },
} as const satisfies Record<RevisionState, { icon: IconName; tone: keyof ThemeColors; word: TextTone }>;

type RevisionMarkProps = { readonly state: RevisionState; readonly large?: boolean };

/** The state of a revision: its sign and its word. */
export function RevisionMark({ state, large = false }: RevisionMarkProps) {
  const look = LOOKS[state];
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.xs }}>
      <Icon name={look.icon} size={large ? 'm' : 's'} tone={look.tone} />
      <Text variant={large ? 'strong' : 'smallStrong'} tone={look.word}>
        {state}
      </Text>
    </View>
  );
}
