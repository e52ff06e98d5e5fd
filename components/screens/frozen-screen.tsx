import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useFrozenRevisions } from '@/components/api/use-jobs';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { LinkArea } from '@/components/ui/link';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import { ScreenFrame } from './screen-frame';

/** Where an installer begins: the frozen revisions, newest first. */
export function FrozenScreen() {
  const { color } = useTheme();
  const query = useFrozenRevisions();
  const items = query.data?.pages.flatMap((page) => page.items) ?? [];
  return (
    <ScreenFrame title="Frozen revisions" lead="Build from these, and from nothing else.">
      {query.isPending ? (
        <LoadingState label="Fetching the frozen revisions" />
      ) : query.isError && items.length === 0 ? (
        <ErrorState
          title="The revisions did not arrive"
          text={describeError(query.error)}
          onRetry={() => void query.refetch()}
        />
      ) : items.length === 0 ? (
        <EmptyState
          icon="lock"
          title="Nothing is frozen yet"
          text="When an approver freezes a revision, it stands here."
        />
      ) : (
        <View role="list">
          {items.map(({ id, letter, job, platform, layout, frozenAt, frozenBy }) => (
            <View key={id} role="listitem" style={{ borderBottomWidth: line.hair, borderColor: color.rule }}>
              <LinkArea href={`/r/${id}`} label={`${job}, ${platform}, ${layout}, revision ${letter}`}>
                <View
                  style={{
                    flexDirection: 'row',
                    alignItems: 'center',
                    gap: space.l,
                    paddingVertical: space.m,
                  }}
                >
                  <Text variant="heading">{letter}</Text>
                  <View style={{ flex: 1 }}>
                    <Text variant="strong">{`${job}, ${platform}, ${layout}`}</Text>
                    <Text variant="small" tone="soft">
                      {`frozen by ${frozenBy}, ${new Date(frozenAt).toLocaleString()}`}
                    </Text>
                  </View>
                </View>
              </LinkArea>
            </View>
          ))}
        </View>
      )}
      {query.hasNextPage ? (
        <Button
          label="Show more"
          onPress={() => void query.fetchNextPage()}
          busy={query.isFetchingNextPage}
        />
      ) : null}
    </ScreenFrame>
  );
}
