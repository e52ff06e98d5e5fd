import { View } from 'react-native';
import type { LengthUnit } from '@/components/canvas/round-length';
import type { LayoutEditor } from '@/components/editor/layout-editor';
import { space } from '@/components/theme/tokens';
import { QuantityField } from '@/components/ui/quantity-field';
import { Table, type Column } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument, PlacedAntenna } from '@/shared/layout/document';
import { compareLabels } from '@/shared/layout/labels';
import { worstPairOf } from '@/components/canvas/spoken-antenna';
import { checkAntennaNumber, turnedBearing, type AntennaNumber } from './antenna-fields';
import { pairMargin } from './estimate-words';
import { angleEntry, lengthEntry } from './quantity-entries';

type CoordinatesTableProps = {
  readonly editor: LayoutEditor;
  readonly document: LayoutDocument;
  readonly estimate: Estimate | null;
  readonly unit: LengthUnit;
  readonly canEdit: boolean;
};

const MIN_WIDTH = 620;

/** All antennas with their coordinates, to be typed; the way to place without a pointer. */
export function CoordinatesTable({ editor, document, estimate, unit, canEdit }: CoordinatesTableProps) {
  const field = (name: AntennaNumber, title: string) => {
    const entry = name === 'azimuthDeg' ? angleEntry : lengthEntry(unit);
    return function NumberCell(antenna: PlacedAntenna) {
      return (
        <View style={{ paddingVertical: space.xs }}>
          <QuantityField
            label={`${title} of ${antenna.label}`}
            labelHidden
            value={antenna[name]}
            read={(text) => checkAntennaNumber(document, antenna, name, entry.read(text))}
            format={entry.format}
            onCommit={(value) => {
              const stored = name === 'azimuthDeg' ? turnedBearing(value) : value;
              editor.commit([
                { kind: 'set', collection: 'antennas', id: antenna.id, fields: { [name]: stored } },
              ]);
            }}
            readOnly={!canEdit}
          />
        </View>
      );
    };
  };
  const columns: readonly Column<PlacedAntenna>[] = [
    {
      key: 'antenna',
      title: 'Antenna',
      flex: 1.2,
      cell: (antenna) => (
        <View>
          <Text variant="figuresStrong">{antenna.label}</Text>
          <Text variant="smallFigures" tone="soft">
            {antenna.name}
          </Text>
        </View>
      ),
    },
    { key: 'x', title: 'x', flex: 1.3, cell: field('x', 'x') },
    { key: 'y', title: 'y', flex: 1.3, cell: field('y', 'y') },
    { key: 'height', title: 'Mount height', flex: 1.3, cell: field('mountHeight', 'Mount height') },
    { key: 'azimuth', title: 'Azimuth', flex: 1.1, cell: field('azimuthDeg', 'Azimuth') },
    {
      key: 'margin',
      title: 'Worst margin, dB',
      flex: 1,
      align: 'right',
      cell: (antenna) => {
        const worst = worstPairOf(antenna.id, estimate);
        return worst ? `${pairMargin(worst)}${worst.state === 'not held' ? '' : `, ${worst.state}`}` : '–';
      },
    },
  ];
  return (
    <Table
      label="Coordinates of all antennas, from the datum"
      columns={columns}
      rows={Object.values(document.antennas).sort(compareLabels)}
      rowKey={({ id }) => id}
      minWidth={MIN_WIDTH}
    />
  );
}
