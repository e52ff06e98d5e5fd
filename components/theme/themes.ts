/** The colours of one theme, named by what they are for. */
export type ThemeColors = {
  /** Paper under the drawing. */
  readonly ground: string;
  /** Panels, bars, dialogs. */
  readonly sheet: string;
  /** Fill of a thing under the pointer. */
  readonly hover: string;
  /** Fill of a chosen thing. */
  readonly chosen: string;
  readonly ink: string;
  readonly inkSoft: string;
  /** Thin lines between things. */
  readonly rule: string;
  /** Edge of something that can be pressed or filled in: at least 3:1. */
  readonly edge: string;
  /** The one colour of actions. */
  readonly action: string;
  readonly actionHover: string;
  readonly onAction: string;
  /** Only for pairs that lack isolation, and for what is wrong. */
  readonly lacking: string;
  /** Only for pairs that are tight. */
  readonly tight: string;
  readonly scrim: string;
  readonly focus: string;
  /** The drawing. */
  readonly gridFine: string;
  readonly gridBold: string;
  readonly surface: string;
  readonly obstacle: string;
  readonly hatch: string;
  readonly dimension: string;
  readonly roseFill: string;
};

export type ThemeName = 'light' | 'dark';
export type Theme = { readonly name: ThemeName; readonly color: ThemeColors };

/** The two themes: identical keys, checked by the type. */
export const themes: Readonly<Record<ThemeName, Theme>> = {
  light: {
    name: 'light',
    color: {
      ground: '#F7F4EC',
      sheet: '#FCFBF6',
      hover: '#EFEBDF',
      chosen: '#E3ECE8',
      ink: '#17252E',
      inkSoft: '#53626A',
      rule: '#D3CEC0',
      edge: '#7D868A',
      action: '#0E5A63',
      actionHover: '#0A464E',
      onAction: '#FFFFFF',
      lacking: '#A23B2A',
      tight: '#8A5A00',
      scrim: 'rgba(23, 37, 46, 0.45)',
      focus: '#0E5A63',
      gridFine: '#EEE9DC',
      gridBold: '#E3DDCC',
      surface: '#FCFBF6',
      obstacle: '#E7E3D6',
      hatch: '#A9A692',
      dimension: '#5F6D74',
      roseFill: 'rgba(14, 90, 99, 0.10)',
    },
  },
  dark: {
    name: 'dark',
    color: {
      ground: '#10191E',
      sheet: '#172229',
      hover: '#203039',
      chosen: '#1D3A40',
      ink: '#EDEAE1',
      inkSoft: '#A5B1B6',
      rule: '#31414A',
      edge: '#72828A',
      action: '#62BAC4',
      actionHover: '#83CDD5',
      onAction: '#0C1519',
      lacking: '#F08B7B',
      tight: '#DFA63F',
      scrim: 'rgba(4, 8, 10, 0.66)',
      focus: '#83CDD5',
      gridFine: '#16222A',
      gridBold: '#1D2B34',
      surface: '#16222A',
      obstacle: '#22313A',
      hatch: '#5C6C74',
      dimension: '#8E9CA2',
      roseFill: 'rgba(98, 186, 196, 0.14)',
    },
  },
};
