import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useArchivePart, useCopyPart, useParts } from '@/components/api/use-parts';
import { describePart } from '@/components/panels/shelf-row';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Choice } from '@/components/ui/choice';
import { Notice } from '@/components/ui/notice';
import { SearchField } from '@/components/ui/search-field';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { Part } from '@/shared/api/parts';
import { ScreenFrame } from './screen-frame';

type Kind = Part['content']['kind'];

/** The team's shelf: antennas and radios. */
export function PartsScreen() {
  const [kind, setKind] = useState<Kind>('antenna');
  const [search, setSearch] = useState('');
  const query = useParts({ kind, search });
  const parts = query.data?.pages.flatMap(({ items }) => items) ?? [];
  return (
    <ScreenFrame
      title="Parts"
      lead="What the team can place: typical values, to be checked against the datasheet."
    >
      <Choice
        label="Kind"
        labelHidden
        value={kind}
        options={[
          { value: 'antenna', label: 'Antennas' },
          { value: 'radio', label: 'Radios' },
        ]}
        onChange={setKind}
      />
      <SearchField label="Find a part" value={search} onChange={setSearch} />
      {query.isPending ? (
        <LoadingState label="Fetching the shelf" />
      ) : query.isError && parts.length === 0 ? (
        <ErrorState
          title="The shelf did not arrive"
          text={describeError(query.error)}
          onRetry={() => void query.refetch()}
        />
      ) : parts.length === 0 ? (
        <EmptyState icon="parts" title="None found" text="No part of this kind is called so." />
      ) : (
        <View role="list">
          {parts.map((part) => (
            <PartLine key={part.id} part={part} />
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

function PartLine({ part: { id, name, content, abilities } }: { readonly part: Part }) {
  const { color } = useTheme();
  const copy = useCopyPart();
  const archive = useArchivePart();
  const error = copy.error ?? archive.error;
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
          <Text variant="strong">{name}</Text>
          <Text variant="small" tone="soft">
            {content.kind === 'antenna'
              ? describePart(content.antenna)
              : content.radio.receiveOnly
                ? 'receives only'
                : `${content.radio.power} W`}
          </Text>
        </View>
        {abilities.edit ? (
          <View style={{ flexDirection: 'row', gap: space.s }}>
            <Button label={`Copy ${name}`} onPress={() => copy.mutate(id)} busy={copy.isPending}>
              Copy
            </Button>
            <Button
              label={`Archive ${name}`}
              onPress={() => archive.mutate({ id, archived: true })}
              busy={archive.isPending}
            >
              Archive
            </Button>
          </View>
        ) : null}
      </View>
      {error ? <Notice kind="error" text={describeError(error)} /> : null}
    </View>
  );
}
