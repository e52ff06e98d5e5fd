import type { ReactNode } from 'react';
import { ActivityIndicator, View } from 'react-native';
import { measure, space } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import { Button } from './button';
import { Icon, type IconName } from './icon';
import { Heading, Text } from './text';

const FRAME = {
  alignItems: 'flex-start',
  gap: space.m,
  paddingVertical: space.xl,
  maxWidth: measure.text,
} as const;

type EmptyStateProps = {
  readonly title: string;
  readonly text: string;
  readonly icon?: IconName;
  /** What to do about it. */
  readonly children?: ReactNode;
};

/** Nothing is here yet: what belongs here, and how to begin. */
export function EmptyState({ title, text, icon, children }: EmptyStateProps) {
  return (
    <View style={FRAME}>
      {icon ? <Icon name={icon} size="xl" tone="inkSoft" /> : null}
      <Heading level={2}>{title}</Heading>
      <Text tone="soft">{text}</Text>
      {children}
    </View>
  );
}

/** Something is on its way. */
export function LoadingState({ label }: { readonly label: string }) {
  const { color } = useTheme();
  return (
    <View role="status" style={{ ...FRAME, flexDirection: 'row', alignItems: 'center' }}>
      <ActivityIndicator size="small" color={color.action} aria-hidden />
      <Text tone="soft">{label}</Text>
    </View>
  );
}

type ErrorStateProps = {
  readonly title: string;
  readonly text: string;
  readonly onRetry?: () => void;
  readonly children?: ReactNode;
};

/** It did not work: why, and what to do. */
export function ErrorState({ title, text, onRetry, children }: ErrorStateProps) {
  return (
    <View role="alert" style={FRAME}>
      <Icon name="error" size="xl" tone="lacking" />
      <Heading level={2}>{title}</Heading>
      <Text tone="soft">{text}</Text>
      {onRetry ? <Button label="Try again" icon="refresh" onPress={onRetry} /> : null}
      {children}
    </View>
  );
}
