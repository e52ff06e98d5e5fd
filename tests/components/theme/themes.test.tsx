import { themes, type ThemeColors } from '@/components/theme/themes';

/**
 * Contrast of two colours: (L1 + 0.05) / (L2 + 0.05) of their relative luminances.
 * @source WCAG 2.2, definitions of contrast ratio and relative luminance
 */
function contrast(one: string, other: string): number {
  const [dark, light] = [luminance(one), luminance(other)].sort((a, b) => a - b) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

function luminance(colour: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const part = parseInt(colour.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

const GROUNDS = ['ground', 'sheet', 'hover', 'chosen'] as const satisfies readonly (keyof ThemeColors)[];
const TEXTS = [
  'ink',
  'inkSoft',
  'action',
  'lacking',
  'tight',
] as const satisfies readonly (keyof ThemeColors)[];
const PAPER = ['ground', 'sheet', 'surface'] as const satisfies readonly (keyof ThemeColors)[];

const cases = (['light', 'dark'] as const).map((name) => [name, themes[name].color] as const);

describe.each(cases)('the %s theme', (_name, color) => {
  test.each(TEXTS.flatMap((text) => GROUNDS.map((ground) => [text, ground] as const)))(
    'writes %s on %s with a contrast of at least 4.5',
    (text, ground) => {
      expect(contrast(color[text], color[ground])).toBeGreaterThanOrEqual(4.5);
    },
  );

  test('writes on its buttons with a contrast of at least 4.5, also under the pointer', () => {
    expect(contrast(color.onAction, color.action)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(color.onAction, color.actionHover)).toBeGreaterThanOrEqual(4.5);
  });

  test.each(PAPER)('draws dimensions on %s with a contrast of at least 4.5: they are read', (paper) => {
    expect(contrast(color.dimension, color[paper])).toBeGreaterThanOrEqual(4.5);
  });

  test.each(['ground', 'sheet'] as const)(
    'draws edges and the focus on %s with a contrast of at least 3',
    (ground) => {
      expect(contrast(color.edge, color[ground])).toBeGreaterThanOrEqual(3);
      expect(contrast(color.focus, color[ground])).toBeGreaterThanOrEqual(3);
    },
  );
});

test('contrast is that of the definition: black on white 21, a grey of 119 on white 4.48', () => {
  expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 10);
  expect(contrast('#777777', '#FFFFFF')).toBeCloseTo(4.48, 2);
});
