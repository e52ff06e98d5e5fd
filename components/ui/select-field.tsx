import { useId, type CSSProperties } from 'react';
import { line, radius, space, target } from '../theme/tokens';
import { useTheme } from '../theme/use-theme';
import { describedBy, FieldFrame } from './field';
import { textStyle } from './text';

type SelectFieldProps<T extends string> = {
  readonly label: string;
  readonly value: T;
  readonly options: readonly { readonly value: T; readonly label: string }[];
  readonly onChange: (value: T) => void;
  readonly hint?: string;
  readonly error?: string;
  readonly labelHidden?: boolean;
  readonly disabled?: boolean;
  readonly testID?: string;
};

/** One of a list. The browser's own control: it suits thumbs, keys and screen readers. */
export function SelectField<T extends string>({
  label,
  value,
  options,
  onChange,
  hint,
  error,
  labelHidden,
  disabled = false,
  testID,
}: SelectFieldProps<T>) {
  const { color } = useTheme();
  const id = useId();
  const { fontFamily, fontSize } = textStyle('body');
  const style: CSSProperties = {
    fontFamily,
    fontSize,
    color: color.ink,
    backgroundColor: disabled ? color.ground : color.sheet,
    border: `${error ? line.bold : line.hair}px solid ${error ? color.lacking : disabled ? color.rule : color.edge}`,
    borderRadius: radius.m,
    minHeight: target.min,
    padding: `${space.xs}px ${space.s}px`,
    width: '100%',
  };
  return (
    <FieldFrame label={label} controlId={id} hint={hint} error={error} labelHidden={labelHidden}>
      <select
        id={id}
        value={value}
        disabled={disabled}
        data-testid={testID}
        aria-label={labelHidden ? label : undefined}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(id, { hint, error })}
        onChange={(event) => {
          const chosen = options.find((option) => option.value === event.target.value);
          if (chosen) onChange(chosen.value);
        }}
        style={style}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
