import Svg, { Circle, Path } from 'react-native-svg';
import { iconSize, line } from '../theme/tokens';
import type { ThemeColors } from '../theme/themes';
import { useTheme } from '../theme/use-theme';

type Drawing = {
  readonly path?: string;
  /** Circles as [cx, cy, r]. */
  readonly circles?: readonly (readonly [number, number, number])[];
  /** Small filled dots as [cx, cy]. */
  readonly dots?: readonly (readonly [number, number])[];
};

/** The icon set: strokes on a field of 24 by 24, drawn for this product. */
const DRAWINGS = {
  account: { path: 'M4.5 20c1-4 4-5.5 7.5-5.5s6.5 1.5 7.5 5.5', circles: [[12, 8, 3.75]] },
  add: { path: 'M12 5v14M5 12h14' },
  antenna: { path: 'M12 2.5v5M12 16.5v5M2.5 12h5M16.5 12h5', circles: [[12, 12, 5.5]], dots: [[12, 12]] },
  archive: { path: 'M3.5 5h17v4h-17zM5 9v10.5h14V9M9.5 13h5' },
  back: { path: 'M14.5 5 7.5 12l7 7' },
  check: { path: 'M4.5 12.5 10 18 19.5 6.5' },
  'chevron-down': { path: 'M5 9l7 7 7-7' },
  'chevron-right': { path: 'M9.5 5l7 7-7 7' },
  close: { path: 'M5.5 5.5l13 13M18.5 5.5l-13 13' },
  comment: { path: 'M7.7 13.3 3.5 20.5', circles: [[13.5, 9.5, 6.5]] },
  copy: { path: 'M8.5 8.5h11v11h-11zM15.5 8.5v-4h-11v11h4' },
  download: { path: 'M12 4v11M7 10.5l5 5 5-5M4.5 20h15' },
  edit: { path: 'M4.5 19.5l1-4.5L16 4.5l3.5 3.5L9 18.5zM13.5 7l3.5 3.5' },
  error: { path: 'M12 7.5v6', circles: [[12, 12, 8.75]], dots: [[12, 16.75]] },
  eye: {
    path: 'M2.5 12c2.5-4.5 6-6.5 9.5-6.5s7 2 9.5 6.5c-2.5 4.5-6 6.5-9.5 6.5S5 16.5 2.5 12z',
    circles: [[12, 12, 2.75]],
  },
  'eye-off': {
    path: 'M2.5 12c2.5-4.5 6-6.5 9.5-6.5s7 2 9.5 6.5c-2.5 4.5-6 6.5-9.5 6.5S5 16.5 2.5 12zM4.5 20 19.5 4',
  },
  filter: { path: 'M4 5.5h16l-6 7v6.5l-4-2v-4.5z' },
  fit: { path: 'M4.5 9V4.5H9M15 4.5h4.5V9M19.5 15v4.5H15M9 19.5H4.5V15' },
  info: { path: 'M12 11v6', circles: [[12, 12, 8.75]], dots: [[12, 7.5]] },
  jobs: { path: 'M4 4.5h16v15H4zM13 19.5v-5h7M7.5 8h5' },
  layers: { path: 'M12 4 3.5 8.5 12 13l8.5-4.5zM3.5 12.5 12 17l8.5-4.5M3.5 16.5 12 21l8.5-4.5' },
  link: {
    path: 'M8.25 12h7.5',
    circles: [
      [5.25, 12, 3],
      [18.75, 12, 3],
    ],
  },
  lock: { path: 'M5.5 11h13v9h-13zM8.5 11V8a3.5 3.5 0 0 1 7 0v3' },
  mail: { path: 'M3.5 6h17v12.5h-17zM3.5 6.5 12 13l8.5-6.5' },
  menu: { path: 'M4 6.5h16M4 12h16M4 17.5h16' },
  minus: { path: 'M5 12h14' },
  more: {
    dots: [
      [5, 12],
      [12, 12],
      [19, 12],
    ],
  },
  offline: { path: 'M5 18.5V14M10 18.5V10.5M15 18.5V9M20 18.5V5M4 4l16 16.5' },
  parts: {
    path: 'M4 10.5h16M4 20h16M7 10.5V4.5M12 10.5V6.5M17 10.5V3M7.5 20v-5M16.5 20v-5M5.5 15h4M14.5 15h4',
  },
  people: {
    path: 'M2.5 19c.7-3.5 3-5 6-5s5.3 1.5 6 5M15.5 13.8c3 0 5.3 1.5 6 5',
    circles: [
      [8.5, 8.25, 3.25],
      [16.25, 8.75, 2.75],
    ],
  },
  print: { path: 'M7 9V4h10v5M7 17H4V9h16v8h-3M7 14h10v6H7z' },
  radio: { path: 'M3.5 9.5h17v9h-17zM16 9.5V4M13.5 14h4', circles: [[8, 14, 2.25]] },
  redo: { path: 'M19.5 9H9a4.75 4.75 0 0 0 0 9.5h5M15.5 4.5 20 9l-4.5 4.5' },
  refresh: { path: 'M19.5 12a7.5 7.5 0 1 1-2.3-5.4M19.5 3.5v4.5H15' },
  restore: { path: 'M3.5 5h17v4h-17zM5 9v10.5h14V9M12 17v-5M9.5 14l2.5-2.5 2.5 2.5' },
  rose: { path: 'M12 3v3M12 5.5c4.5 0 7.5 2 6.5 6.5s-3 6.5-6.5 6-7-1.5-6-6 2-6.5 6-6.5z', dots: [[12, 12]] },
  search: { path: 'M15 15l5.5 5.5', circles: [[10, 10, 6]] },
  send: { path: 'M4 12 20 4.5 15 20l-3.5-6.5zM11.5 13.5 20 4.5' },
  settings: {
    path: 'M4 7h8M18 7h2M4 17h2M12 17h8',
    circles: [
      [15, 7, 2.75],
      [9, 17, 2.75],
    ],
  },
  'sign-out': { path: 'M13.5 4.5h-9v15h9M9.5 12h11M16.5 8l4 4-4 4' },
  table: { path: 'M3.5 5h17v14h-17zM3.5 9.7h17M3.5 14.3h17M9.5 5v14' },
  trash: { path: 'M4.5 7h15M9.5 7V4.5h5V7M6.5 7l1 13h9l1-13' },
  undo: { path: 'M4.5 9H15a4.75 4.75 0 0 1 0 9.5h-5M8.5 4.5 4 9l4.5 4.5' },
  warning: { path: 'M12 4 2.8 19.5h18.4zM12 10v4.5', dots: [[12, 17]] },
} as const satisfies Record<string, Drawing>;

export type IconName = keyof typeof DRAWINGS;

type IconProps = {
  readonly name: IconName;
  readonly size?: keyof typeof iconSize;
  readonly tone?: keyof ThemeColors;
};

const DOT_RADIUS = 1.35;

/** One of the icon set. It is decoration: the thing that carries it has the label. */
export function Icon({ name, size = 'm', tone = 'ink' }: IconProps) {
  const { color } = useTheme();
  const drawing: Drawing = DRAWINGS[name];
  const stroke = color[tone];
  const pixels = iconSize[size];
  return (
    <Svg width={pixels} height={pixels} viewBox="0 0 24 24" fill="none" aria-hidden style={{ flexShrink: 0 }}>
      {drawing.path ? (
        <Path
          d={drawing.path}
          stroke={stroke}
          strokeWidth={line.mark}
          strokeLinecap="round"
          strokeLinejoin="round"
        />
      ) : null}
      {drawing.circles?.map(([x, y, r]) => (
        <Circle key={`${x} ${y}`} cx={x} cy={y} r={r} stroke={stroke} strokeWidth={line.mark} />
      ))}
      {drawing.dots?.map(([x, y]) => (
        <Circle key={`${x} ${y}`} cx={x} cy={y} r={DOT_RADIUS} fill={stroke} />
      ))}
    </Svg>
  );
}
