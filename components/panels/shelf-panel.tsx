import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useParts } from '@/components/api/use-parts';
import type { PointerSource } from '@/components/canvas/gesture-surface';
import type { ShelfPart } from '@/components/editor/editor-snapshot';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { SearchField } from '@/components/ui/search-field';
import { ErrorState, LoadingState } from '@/components/ui/states';
import { Heading, Text } from '@/components/ui/text';
import { ShelfRow } from './shelf-row';

type ShelfPanelProps = {
  readonly canEdit: boolean;
  /** A part was pressed and pulled: it goes onto the plan under that pointer. */
  readonly onPull: (part: ShelfPart, pointer: PointerSource) => void;
  /** A part was chosen without pulling it. */
  readonly onPlace: (part: ShelfPart) => void;
};

/** The antennas of the team's shelf; pulled onto the plan, or placed at the first free spot. */
export function ShelfPanel({ canEdit, onPull, onPlace }: ShelfPanelProps) {
  const [search, setSearch] = useState('');
  const query = useParts({ kind: 'antenna', search });
  const parts = query.data?.pages.flatMap(({ items }) => items) ?? [];
  return (
    <View style={{ gap: space.s }}>
      <Heading level={3} tone="soft">
        Parts shelf
      </Heading>
      <SearchField label="Find a part" value={search} onChange={setSearch} />
      {canEdit ? (
        <Text variant="caption" tone="soft">
          Pull a part onto the plan, or press Enter on it.
        </Text>
      ) : (
        <Text variant="caption" tone="soft">
          You look at this layout; placing is for those who may edit it.
        </Text>
      )}
      {query.isPending ? (
        <LoadingState label="Fetching the shelf" />
      ) : query.isError && parts.length === 0 ? (
        <ErrorState
          title="The shelf did not arrive"
          text={describeError(query.error)}
          onRetry={() => void query.refetch()}
        />
      ) : parts.length === 0 ? (
        <Text variant="small" tone="soft">
          {search ? `No part is called “${search}”.` : 'The shelf is empty. Add antennas under Parts.'}
        </Text>
      ) : null}
      <View role="list">
        {parts.map((part) =>
          part.content.kind === 'antenna' ? (
            <ShelfRow
              key={part.id}
              part={part.content.antenna}
              disabled={!canEdit}
              onPull={onPull}
              onPlace={onPlace}
            />
          ) : null,
        )}
      </View>
      {query.hasNextPage ? (
        <Button label="More parts" variant="quiet" onPress={() => void query.fetchNextPage()} />
      ) : null}
    </View>
  );
}
