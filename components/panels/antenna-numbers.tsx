import { View } from 'react-native';
import type { LengthUnit } from '@/components/canvas/round-length';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { QuantityField, type QuantityReading } from '@/components/ui/quantity-field';
import { SelectField } from '@/components/ui/select-field';
import { Heading, Text } from '@/components/ui/text';
import type { LayoutDocument, PlacedAntenna } from '@/shared/layout/document';
import { checkAntennaNumber, labelProblem, turnedBearing, type AntennaNumber } from './antenna-fields';
import { angleEntry, decibelEntry, lengthEntry, type Entry } from './quantity-entries';
import { nameProblem, TextEntry } from './text-entry';

type AntennaNumbersProps = {
  readonly editor: LayoutEditor;
  readonly document: LayoutDocument;
  readonly antenna: PlacedAntenna;
  readonly unit: LengthUnit;
  readonly canEdit: boolean;
  readonly onComment: (() => void) | null;
};

/** Test id of the first number; Enter on the plan goes there. */
export const FIRST_NUMBER = 'antenna-x';
const NO_RADIO = 'none';

/** The chosen antenna in numbers, each typed as people write it. */
export function AntennaNumbers({ editor, document, antenna, unit, canEdit, onComment }: AntennaNumbersProps) {
  const commit = (fields: Partial<PlacedAntenna>) =>
    void editor.commit([{ kind: 'set', collection: 'antennas', id: antenna.id, fields }]);
  const number = (field: AntennaNumber, label: string, entry: Entry, step: number) => (
    <View style={{ flexGrow: 1, flexBasis: '45%' }}>
      <QuantityField
        key={`${antenna.id} ${field}`}
        label={label}
        value={antenna[field]}
        read={(text): QuantityReading => checkAntennaNumber(document, antenna, field, entry.read(text))}
        format={entry.format}
        onCommit={(value) => commit({ [field]: field === 'azimuthDeg' ? turnedBearing(value) : value })}
        step={step}
        readOnly={!canEdit}
        testID={field === 'x' ? FIRST_NUMBER : `antenna-${field}`}
      />
    </View>
  );
  const length = lengthEntry(unit);
  const fine = document.platform.kind === 'handset' ? 0.001 : 0.01;
  return (
    <View style={{ gap: space.m }}>
      <Heading level={3}>{`${antenna.label} ${antenna.name}`}</Heading>
      <Text variant="small" tone="soft">
        {`${antenna.part.name}. Positions from the datum: ${document.platform.datum}.`}
      </Text>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m }}>
        {number('x', `x, ${document.platform.forwardAxis}`, length, fine)}
        {number('y', 'y, to the left', length, fine)}
        {number('mountHeight', 'Mount height', length, fine)}
        {number('azimuthDeg', 'Azimuth', angleEntry, 1)}
        {number('tiltDeg', 'Tilt from upright', angleEntry, 1)}
        {number('feederLossDb', 'Feeder loss', decibelEntry, 0.1)}
      </View>
      <SelectField
        label="Radio"
        value={antenna.radioId ?? NO_RADIO}
        disabled={!canEdit}
        options={[
          { value: NO_RADIO, label: 'No radio yet' },
          ...Object.values(document.radios).map(({ id, name }) => ({ value: id, label: name })),
        ]}
        onChange={(value) => commit({ radioId: value === NO_RADIO ? null : value })}
        hint={antenna.radioId === null ? 'Without a radio it forms no pair.' : undefined}
        testID="antenna-radio"
      />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.m }}>
        <View style={{ flexGrow: 1, flexBasis: '28%' }}>
          <TextEntry
            key={`${antenna.id} label`}
            label="Mark"
            value={antenna.label}
            problem={(text) => labelProblem(document, antenna.id, text)}
            onCommit={(label) => commit({ label })}
            readOnly={!canEdit}
          />
        </View>
        <View style={{ flexGrow: 2, flexBasis: '55%' }}>
          <TextEntry
            key={`${antenna.id} name`}
            label="Name"
            value={antenna.name}
            problem={nameProblem}
            onCommit={(name) => commit({ name })}
            readOnly={!canEdit}
          />
        </View>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
        {onComment ? <Button label="Comment" icon="comment" onPress={onComment} /> : null}
        {canEdit ? (
          <Button
            label={`Remove ${antenna.label}`}
            icon="trash"
            variant="danger"
            onPress={() => {
              editor.select([antenna.id]);
              editor.removeSelected();
            }}
          />
        ) : null}
      </View>
    </View>
  );
}
