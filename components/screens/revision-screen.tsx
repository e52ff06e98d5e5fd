import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useRevision } from '@/components/api/use-revisions';
import { PlatformPreview } from '@/components/canvas/platform-preview';
import { lengthEntry } from '@/components/panels/quantity-entries';
import { CAUTIONS_LEAD, cautionsFor } from '@/components/panels/revision-cautions';
import { neverTogetherRows, positionRows, type PositionRow } from '@/components/panels/revision-sheet-rows';
import { explainState, findFreeze, groupHash } from '@/components/panels/revision-words';
import { usePreferences } from '@/components/theme/preferences';
import { space } from '@/components/theme/tokens';
import { Notice } from '@/components/ui/notice';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { Table, type Column } from '@/components/ui/table';
import { Heading, Text } from '@/components/ui/text';
import type { RevisionDetail } from '@/shared/api/revisions';
import { ScreenFrame } from './screen-frame';

/** One revision, read-only, from its row alone: what to build, from which datum, with which cautions. */
export function RevisionScreen({ revisionId }: { readonly revisionId: string }) {
  const revision = useRevision(revisionId);
  if (revision.data) return <RevisionSheet revision={revision.data} />;
  return (
    <ScreenFrame title="Revision">
      {revision.isError ? (
        <ErrorState
          title="The revision did not open"
          text={describeError(revision.error)}
          onRetry={() => void revision.refetch()}
        />
      ) : (
        <LoadingState label="Fetching the revision" />
      )}
    </ScreenFrame>
  );
}

function RevisionSheet({ revision }: { readonly revision: RevisionDetail }) {
  const { document, letter, state, hash, job, platform, layout } = revision;
  const freeze = findFreeze(revision);
  const rules = neverTogetherRows(document);
  return (
    <ScreenFrame title={`${job}, ${platform}: revision ${letter}`} lead={layout}>
      <Notice kind={state === 'frozen' ? 'done' : 'caution'} text={explainState(state)} />
      <View style={{ gap: space.xs }}>
        {freeze ? (
          <Text>{`Frozen by ${freeze.by}, ${new Date(freeze.at).toLocaleString()}${freeze.reason ? `: ${freeze.reason}` : ''}`}</Text>
        ) : null}
        <Text variant="smallFigures" tone="soft" selectable>
          {`Revision ${letter}, hash ${groupHash(hash)}`}
        </Text>
      </View>
      <PlatformPreview document={document} width={280} height={200} />
      <View style={{ gap: space.s }}>
        <Heading level={2}>Positions</Heading>
        <Text tone="soft">
          {`From the datum: ${document.platform.datum}. x points ${document.platform.forwardAxis}, y to the left.`}
        </Text>
        <Positions rows={positionRows(document)} />
      </View>
      {rules.length > 0 ? (
        <View style={{ gap: space.s }}>
          <Heading level={2}>Never together</Heading>
          {rules.map(({ id, radios, rule }) => (
            <Text key={id}>{`${radios.join(' and ')}: ${rule}`}</Text>
          ))}
        </View>
      ) : null}
      <View style={{ gap: space.s }}>
        <Heading level={2}>Cautions</Heading>
        <Text>{CAUTIONS_LEAD}</Text>
        {cautionsFor(document.platform.kind).map(({ id, title, text }) => (
          <Text key={id}>{`${title}. ${text}`}</Text>
        ))}
      </View>
    </ScreenFrame>
  );
}

function Positions({ rows }: { readonly rows: readonly PositionRow[] }) {
  const { format } = lengthEntry(usePreferences().lengthUnit);
  const columns: readonly Column<PositionRow>[] = [
    { key: 'mark', title: 'Mark', cell: ({ label }) => label, width: 56 },
    { key: 'name', title: 'Antenna', cell: ({ name, part }) => `${name}: ${part}`, flex: 2 },
    { key: 'x', title: 'x', cell: ({ x }) => format(x), width: 92, align: 'right' },
    { key: 'y', title: 'y', cell: ({ y }) => format(y), width: 92, align: 'right' },
    {
      key: 'height',
      title: 'Height',
      cell: ({ mountHeight }) => format(mountHeight),
      width: 92,
      align: 'right',
    },
  ];
  return <Table label="Positions" columns={columns} rows={rows} rowKey={({ id }) => id} minWidth={560} />;
}
