import type { ReactNode } from 'react';
import { Pressable, ScrollView, View } from 'react-native';
import { line, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import type { WebPressState } from './button';
import { onSpace } from './on-space';
import { Text } from './text';
import { webAttributes } from './web-attributes';

export type Column<Row> = {
  readonly key: string;
  readonly title: string;
  readonly cell: (row: Row) => ReactNode;
  /** Share of the width. */
  readonly flex?: number;
  /** A width of its own instead. */
  readonly width?: number;
  readonly align?: 'left' | 'right';
};

type TableProps<Row> = {
  /** What the table shows: read out on entering it. */
  readonly label: string;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  readonly rowLabel?: (row: Row) => string;
  readonly onRowPress?: (row: Row) => void;
  readonly isChosen?: (row: Row) => boolean;
  /** Below this width the table scrolls sideways. */
  readonly minWidth?: number;
};

/** A table with thin lines: text left, numbers right. A cell that is a plain text becomes tabular figures. */
export function Table<Row>({
  label,
  columns,
  rows,
  rowKey,
  rowLabel,
  onRowPress,
  isChosen,
  minWidth,
}: TableProps<Row>) {
  const { color } = useTheme();
  const row = {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space.m,
    minHeight: target.min,
    borderBottomWidth: line.hair,
    borderColor: color.rule,
  } as const;
  const body = (
    <View role="table" aria-label={label} style={{ minWidth, flexGrow: 1 }}>
      <View role="row" style={row}>
        {columns.map((column) => (
          <View key={column.key} role="columnheader" style={cellStyle(column)}>
            <Text variant="smallFiguresStrong" tone="soft" align={column.align}>
              {column.title}
            </Text>
          </View>
        ))}
      </View>
      {rows.map((item) => {
        const cells = columns.map((column) => {
          const content = column.cell(item);
          return (
            <View key={column.key} role="cell" style={cellStyle(column)}>
              {typeof content === 'string' ? (
                <Text variant="figures" align={column.align}>
                  {content}
                </Text>
              ) : (
                content
              )}
            </View>
          );
        });
        const chosen = isChosen?.(item) ?? false;
        return onRowPress ? (
          <Pressable
            key={rowKey(item)}
            role="row"
            aria-label={rowLabel?.(item)}
            aria-selected={chosen}
            onPress={() => onRowPress(item)}
            {...webAttributes({ onKeyDown: onSpace(() => onRowPress(item)) })}
            style={({ pressed, hovered }: WebPressState) => ({
              ...row,
              backgroundColor:
                pressed || hovered === true ? color.hover : chosen ? color.chosen : 'transparent',
            })}
          >
            {cells}
          </Pressable>
        ) : (
          <View key={rowKey(item)} role="row" style={row}>
            {cells}
          </View>
        );
      })}
    </View>
  );
  if (minWidth === undefined) return body;
  return (
    <ScrollView
      horizontal
      contentContainerStyle={{ flexGrow: 1 }}
      {...webAttributes({ tabIndex: 0 })}
      role="group"
      aria-label={label}
    >
      {body}
    </ScrollView>
  );
}

function cellStyle<Row>({ flex, width, align }: Column<Row>) {
  return {
    ...(width === undefined ? { flex: flex ?? 1, minWidth: space.none } : { width }),
    alignItems: align === 'right' ? 'flex-end' : 'flex-start',
    paddingVertical: space.xs,
  } as const;
}
