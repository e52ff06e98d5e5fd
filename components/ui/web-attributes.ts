type Attributes = {
  readonly 'aria-level'?: number;
  readonly 'aria-current'?: 'page' | 'step' | 'true';
  readonly 'aria-describedby'?: string;
  readonly 'aria-labelledby'?: string;
  readonly 'aria-invalid'?: boolean;
  readonly 'aria-required'?: boolean;
  readonly 'aria-haspopup'?: 'menu' | 'dialog' | 'listbox';
  readonly 'aria-controls'?: string;
  readonly 'aria-orientation'?: 'horizontal' | 'vertical';
  readonly 'aria-sort'?: 'ascending' | 'descending' | 'none';
  readonly 'aria-colspan'?: number;
  readonly 'aria-pressed'?: boolean;
  readonly 'aria-atomic'?: boolean;
  readonly 'aria-valuenow'?: number;
  readonly 'aria-valuemin'?: number;
  readonly 'aria-valuemax'?: number;
  readonly 'aria-valuetext'?: string;
  readonly tabIndex?: 0 | -1;
  readonly dataSet?: Readonly<Record<string, string>>;
  readonly href?: string;
  readonly onKeyDown?: (event: KeyPress) => void;
  readonly onClick?: () => void;
};

/** What a key handler may look at; the browser's own event has more. */
export type KeyPress = {
  readonly key: string;
  readonly shiftKey: boolean;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
  readonly target?: unknown;
  readonly currentTarget?: unknown;
  preventDefault(): void;
  stopPropagation(): void;
};

/** Attributes that the web target passes on but React Native's types do not know; spread them into a component. */
export function webAttributes(attributes: Attributes): object {
  return attributes;
}

/** Style properties of the web that React Native's types do not know. */
export function webStyle(style: {
  readonly transition?: string;
  readonly cursor?: 'grab' | 'grabbing' | 'crosshair' | 'default';
  readonly touchAction?: 'none' | 'pan-y' | 'manipulation';
  readonly willChange?: 'transform';
}): object {
  return style;
}
