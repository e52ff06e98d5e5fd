import type { ReactNode } from 'react';
import { View } from 'react-native';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Heading, Text } from '@/components/ui/text';
import type { Revision } from '@/shared/api/revisions';
import { momentText } from './moment-text';
import { RevisionMark } from './revision-mark';
import { describeEvent, explainState, shortHash } from './revision-words';

type RevisionLineProps = {
  readonly revision: Revision;
  /** Buttons for what may be done with it. */
  readonly children?: ReactNode;
};

/** A revision in the list: its letter, its state in words, what has happened to it and why. */
export function RevisionLine({ revision, children }: RevisionLineProps) {
  const { color } = useTheme();
  return (
    <View
      role="listitem"
      style={{
        flexDirection: 'row',
        gap: space.m,
        paddingVertical: space.l,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
      }}
    >
      <View aria-hidden style={{ minWidth: space.xxl }}>
        <Text variant="display">{revision.letter}</Text>
      </View>
      <View style={{ flex: 1, gap: space.s }}>
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.m }}>
          <Heading level={3} variant="strong">
            {`Revision ${revision.letter}`}
          </Heading>
          <RevisionMark state={revision.state} />
        </View>
        <Text variant="small" tone="soft">
          {explainState(revision.state)}
        </Text>
        {revision.note === '' ? null : <Text>{revision.note}</Text>}
        <View role="list" aria-label={`What happened to ${revision.letter}`} style={{ gap: space.xs }}>
          {revision.events.map((event) => (
            <View key={`${event.kind} ${event.at}`} role="listitem">
              <Text variant="small" tone="soft">
                {`${describeEvent(event)}, ${momentText(event.at)}`}
              </Text>
              {event.reason === null || event.reason === '' ? null : (
                <Text variant="small">{`“${event.reason}”`}</Text>
              )}
            </View>
          ))}
        </View>
        <Text variant="smallFigures" tone="soft">
          {`SHA-256 ${shortHash(revision.hash)} …`}
        </Text>
        {children ? (
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>{children}</View>
        ) : null}
      </View>
    </View>
  );
}
