import type { ReactNode } from 'react';
import { View } from 'react-native';
import { line, space } from '../theme/tokens';
import type { ThemeColors } from '../theme/themes';
import { useTheme } from '../theme/use-theme';
import { Icon, type IconName } from './icon';
import { IconButton } from './icon-button';
import { Text } from './text';

const KINDS = {
  info: { icon: 'info', tone: 'action' },
  done: { icon: 'check', tone: 'action' },
  caution: { icon: 'warning', tone: 'tight' },
  error: { icon: 'error', tone: 'lacking' },
  offline: { icon: 'offline', tone: 'tight' },
} as const satisfies Record<string, { icon: IconName; tone: keyof ThemeColors }>;

type NoticeProps = {
  readonly kind: keyof typeof KINDS;
  readonly text: string;
  readonly children?: ReactNode;
  /** Shown as a cross when given. */
  readonly onClose?: () => void;
};

/** Something to know, in the place that it is about; it stays until it no longer holds or is put away. */
export function Notice({ kind, text, children, onClose }: NoticeProps) {
  const { color } = useTheme();
  const { icon, tone } = KINDS[kind];
  return (
    <View
      role={kind === 'error' ? 'alert' : 'status'}
      style={{
        flexDirection: 'row',
        alignItems: 'flex-start',
        gap: space.s,
        padding: space.m,
        borderWidth: line.hair,
        borderLeftWidth: space.xs,
        borderColor: color[tone],
        backgroundColor: color.sheet,
      }}
    >
      <Icon name={icon} tone={tone} />
      <View style={{ flex: 1, gap: space.s }}>
        <Text>{text}</Text>
        {children}
      </View>
      {onClose ? <IconButton label="Put this notice away" icon="close" onPress={onClose} /> : null}
    </View>
  );
}
