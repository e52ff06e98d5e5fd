import type { ReactNode } from 'react';
import { Text as NativeText, type StyleProp, type TextStyle } from 'react-native';
import { font } from '../theme/fonts';
import { letter } from '../theme/tokens';
import type { ThemeColors } from '../theme/themes';
import { useTheme } from '../theme/use-theme';
import { webAttributes } from './web-attributes';

const VARIANTS = {
  body: { ...letter.body, fontFamily: font.text.regular },
  strong: { ...letter.body, fontFamily: font.text.strong },
  small: { ...letter.small, fontFamily: font.text.regular },
  smallStrong: { ...letter.small, fontFamily: font.text.strong },
  caption: { ...letter.caption, fontFamily: font.text.medium },
  figures: { ...letter.body, fontFamily: font.figures.regular, fontVariant: ['tabular-nums'] },
  figuresStrong: { ...letter.body, fontFamily: font.figures.strong, fontVariant: ['tabular-nums'] },
  smallFigures: { ...letter.small, fontFamily: font.figures.regular, fontVariant: ['tabular-nums'] },
  smallFiguresStrong: { ...letter.small, fontFamily: font.figures.strong, fontVariant: ['tabular-nums'] },
  title: { ...letter.title, fontFamily: font.text.strong },
  heading: { ...letter.heading, fontFamily: font.text.strong },
  display: { ...letter.display, fontFamily: font.text.strong },
} as const satisfies Record<string, TextStyle>;

const TONES = {
  ink: 'ink',
  soft: 'inkSoft',
  action: 'action',
  onAction: 'onAction',
  lacking: 'lacking',
  tight: 'tight',
} as const satisfies Record<string, keyof ThemeColors>;

export type TextVariant = keyof typeof VARIANTS;
export type TextTone = keyof typeof TONES;

type TextProps = {
  readonly children: ReactNode;
  readonly variant?: TextVariant;
  readonly tone?: TextTone;
  readonly align?: 'left' | 'right' | 'center';
  readonly numberOfLines?: number;
  readonly id?: string;
  readonly selectable?: boolean;
  /** Read out when it changes. */
  readonly live?: 'polite' | 'assertive';
  readonly hiddenFromReaders?: boolean;
  readonly style?: StyleProp<TextStyle>;
};

/** Every word on screen. */
export function Text({
  children,
  variant = 'body',
  tone = 'ink',
  align,
  numberOfLines,
  id,
  selectable,
  live,
  hiddenFromReaders,
  style,
}: TextProps) {
  const { color } = useTheme();
  return (
    <NativeText
      id={id}
      numberOfLines={numberOfLines}
      selectable={selectable}
      aria-live={live}
      aria-hidden={hiddenFromReaders}
      style={[VARIANTS[variant], { color: color[TONES[tone]], textAlign: align }, style]}
    >
      {children}
    </NativeText>
  );
}

type HeadingProps = {
  readonly children: ReactNode;
  readonly level: 1 | 2 | 3 | 4;
  readonly variant?: TextVariant;
  readonly tone?: TextTone;
  readonly id?: string;
  readonly numberOfLines?: number;
  readonly style?: StyleProp<TextStyle>;
};

const HEADING_VARIANTS = { 1: 'heading', 2: 'title', 3: 'smallStrong', 4: 'smallStrong' } as const;

/** A heading with its level; the look can be chosen apart from it. */
export function Heading({ children, level, variant, tone = 'ink', id, numberOfLines, style }: HeadingProps) {
  const { color } = useTheme();
  return (
    <NativeText
      role="heading"
      id={id}
      numberOfLines={numberOfLines}
      {...webAttributes({ 'aria-level': level })}
      style={[VARIANTS[variant ?? HEADING_VARIANTS[level]], { color: color[TONES[tone]] }, style]}
    >
      {children}
    </NativeText>
  );
}

/** The type style of a variant, for what is not a Text (an input, a label in the drawing). */
export function textStyle(variant: TextVariant): TextStyle {
  return VARIANTS[variant];
}
