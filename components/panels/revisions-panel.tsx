import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useRevisions } from '@/components/api/use-revisions';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Heading, Text } from '@/components/ui/text';
import type { Layout } from '@/shared/api/layouts';
import { RevisionActions } from './revision-actions';
import { RevisionLine } from './revision-line';
import { RevisionSaving } from './revision-saving';
import { describeWorkingCopy, orderRevisions } from './revision-words';

export type RevisionsPanelProps = {
  readonly layoutId: string;
  /** Operations of the layout that the server has committed. */
  readonly sequence: number;
  /** Changes of this window that the server has not answered yet. */
  readonly pendingCount: number;
  /** What this member may do with the layout; null until it is known. */
  readonly abilities: Layout['abilities'] | null;
};

/** The working copy and what has been saved of it: states, events, and what may be done. */
export function RevisionsPanel({ layoutId, sequence, pendingCount, abilities }: RevisionsPanelProps) {
  const { color } = useTheme();
  const query = useRevisions(layoutId);
  const revisions = orderRevisions(query.data?.items ?? []);
  const working = describeWorkingCopy(revisions, sequence);
  if (query.isPending) return <LoadingState label="Fetching the revisions" />;
  if (query.isError && revisions.length === 0) {
    return (
      <ErrorState
        title="The revisions did not arrive"
        text={describeError(query.error)}
        onRetry={() => void query.refetch()}
      />
    );
  }
  return (
    <View style={{ gap: space.l }}>
      <View
        style={{
          gap: space.m,
          paddingBottom: space.l,
          borderBottomWidth: line.hair,
          borderColor: color.rule,
        }}
      >
        <View style={{ gap: space.xs }}>
          <Heading level={2}>{working.title}</Heading>
          <Text tone="soft">{working.detail}</Text>
        </View>
        <RevisionSaving
          layoutId={layoutId}
          revisions={revisions}
          sequence={sequence}
          pendingCount={pendingCount}
          abilities={abilities}
        />
      </View>
      {revisions.length === 0 ? (
        <EmptyState
          title="No revision yet"
          text="A revision is the layout as it stood at one moment, with a letter. It is submitted for review, and an approver returns it or freezes it; installers build from what is frozen."
          icon="layers"
        />
      ) : (
        <View role="list" aria-label="Revisions, newest first">
          {revisions.map((revision) => (
            <RevisionLine key={revision.id} revision={revision}>
              <RevisionActions revision={revision} />
            </RevisionLine>
          ))}
        </View>
      )}
    </View>
  );
}
