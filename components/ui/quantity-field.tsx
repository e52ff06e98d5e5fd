import { useState } from 'react';
import type { QuantityReading } from '@/shared/units/read-quantity';
import { Field } from './field';

export type { QuantityReading };

type QuantityFieldProps = {
  readonly label: string;
  /** In SI; null while nothing valid stands there. */
  readonly value: number | null;
  /** Called when an entry is finished (Enter, or leaving the field) and reads as a number. */
  readonly onCommit: (value: number) => void;
  readonly read: (text: string) => QuantityReading;
  readonly format: (value: number) => string;
  readonly hint?: string;
  /** A refusal from elsewhere (the server, the plan): shown while the text that caused it stands. */
  readonly error?: string;
  readonly labelHidden?: boolean;
  readonly readOnly?: boolean;
  /** Arrow up and down change the value by this much (SI); ten times as much with Shift. */
  readonly step?: number;
  readonly testID?: string;
};

/** A text that is not (yet) the value, why it was refused, and what stood in the field then. */
type Edit = { readonly text: string; readonly problem: string | null; readonly shownThen: string };

/**
 * A number with its unit, as people write it. The text stays as it was typed while it is being edited and while
 * it is refused; a finished entry shows as the number that was understood.
 */
export function QuantityField({
  label,
  value,
  onCommit,
  read,
  format,
  hint,
  error,
  labelHidden,
  readOnly = false,
  step,
  testID,
}: QuantityFieldProps) {
  const shown = value === null ? '' : format(value);
  const [edit, setEdit] = useState<Edit | null>(null);
  // A value that changed elsewhere replaces a refused text, not one that is being typed.
  const current = edit?.problem != null && edit.shownThen !== shown ? null : edit;
  const draft = current?.text ?? null;

  /** Takes a text over, or leaves it standing with what is wrong with it. */
  const take = (text: string) => {
    const reading = read(text);
    if (!reading.ok) {
      setEdit({ text, problem: reading.message, shownThen: shown });
      return;
    }
    setEdit(null);
    onCommit(reading.value);
  };

  const finish = () => {
    if (draft === null) return;
    if (draft.trim() === shown) {
      setEdit(null);
      return;
    }
    take(draft);
  };

  const reading = draft !== null && draft.trim() !== '' ? read(draft) : null;
  return (
    <Field
      label={label}
      labelHidden={labelHidden}
      value={draft ?? shown}
      onChange={(text) => setEdit({ text, problem: null, shownThen: shown })}
      onBlur={finish}
      onKeyDown={(event) => {
        if (event.key === 'Enter') finish();
        else if (event.key === 'Escape' && draft !== null) {
          event.preventDefault();
          setEdit(null);
        } else if (step !== undefined && value !== null && draft === null && !readOnly) {
          const sign = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
          if (sign === 0) return;
          event.preventDefault();
          // As if the next number had been typed: clean of rounding, and held to the same bounds.
          take(format(value + sign * step * (event.shiftKey ? 10 : 1)));
        }
      }}
      hint={hint}
      error={current?.problem ?? (draft === null ? error : undefined)}
      understood={
        reading?.ok && format(reading.value) !== draft?.trim() ? `= ${format(reading.value)}` : undefined
      }
      refused={current?.problem != null}
      readOnly={readOnly}
      figures
      testID={testID}
    />
  );
}
