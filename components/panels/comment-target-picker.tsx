import { View } from 'react-native';
import { usePreferences } from '@/components/theme/preferences';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { Text } from '@/components/ui/text';
import type { CommentTarget } from '@/shared/api/comments';
import type { LayoutDocument } from '@/shared/layout/document';
import { describeTarget } from './comment-target-words';
import { positionRows } from './revision-sheet-rows';

type CommentTargetPickerProps = {
  readonly target: CommentTarget | null;
  readonly document: LayoutDocument | null;
  readonly onChange: (target: CommentTarget) => void;
  /** Starts choosing a spot on the drawing; without it only antennas can be chosen. */
  readonly onPickSpot?: () => void;
};

const SPOT = 'spot';
const NOTHING = '';

/** What the comment points at: an antenna from the list (the way without a pointer), or a spot on the drawing. */
export function CommentTargetPicker({ target, document, onChange, onPickSpot }: CommentTargetPickerProps) {
  const { lengthUnit } = usePreferences();
  const antennas = document ? positionRows(document) : [];
  const spot = target?.kind === 'spot' ? target : null;
  const gone =
    target?.kind === 'antenna' && !antennas.some(({ id }) => id === target.antennaId) ? target : null;
  const options = [
    ...(target === null ? [{ value: NOTHING, label: 'Choose an antenna' }] : []),
    ...(spot ? [{ value: SPOT, label: describeTarget(spot, document, lengthUnit) }] : []),
    ...(gone ? [{ value: gone.antennaId, label: describeTarget(gone, document, lengthUnit) }] : []),
    ...antennas.map(({ id, label, name }) => ({ value: id, label: `${label} ${name}` })),
  ];
  const value = target === null ? NOTHING : target.kind === 'spot' ? SPOT : target.antennaId;
  return (
    <View style={{ gap: space.s }}>
      <SelectField
        label="Points at"
        value={value}
        options={options}
        onChange={(chosen) => {
          const antenna = antennas.find(({ id }) => id === chosen);
          if (antenna) onChange({ kind: 'antenna', antennaId: antenna.id, label: antenna.label });
        }}
      />
      {onPickSpot ? (
        <Button
          label={spot ? 'Choose another spot on the drawing' : 'Choose a spot on the drawing'}
          icon="comment"
          onPress={onPickSpot}
        />
      ) : null}
      {antennas.length === 0 && !onPickSpot && target === null ? (
        <Text variant="small" tone="soft">
          There is no antenna to point at yet.
        </Text>
      ) : null}
    </View>
  );
}
