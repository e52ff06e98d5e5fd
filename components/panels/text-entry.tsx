import { useState } from 'react';
import { Field } from '@/components/ui/field';

type TextEntryProps = {
  readonly label: string;
  readonly value: string;
  /** Why a text is refused, or null; a refused text stays in the field. */
  readonly problem: (text: string) => string | null;
  readonly onCommit: (text: string) => void;
  readonly readOnly?: boolean;
  readonly labelHidden?: boolean;
  readonly testID?: string;
};

/** A short text that is taken over when it is finished (Enter, or leaving the field). */
export function TextEntry({
  label,
  value,
  problem,
  onCommit,
  readOnly,
  labelHidden,
  testID,
}: TextEntryProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);
  const finish = () => {
    if (draft === null) return;
    const text = draft.trim();
    const refused = text === value ? null : problem(text);
    setError(refused);
    if (refused !== null) return;
    setDraft(null);
    if (text !== value) onCommit(text);
  };
  return (
    <Field
      label={label}
      labelHidden={labelHidden}
      value={draft ?? value}
      onChange={(text) => {
        setDraft(text);
        setError(null);
      }}
      onBlur={finish}
      onKeyDown={(event) => {
        if (event.key === 'Enter') finish();
        if (event.key === 'Escape' && draft !== null) {
          event.preventDefault();
          setDraft(null);
          setError(null);
        }
      }}
      error={error ?? undefined}
      refused={error !== null}
      readOnly={readOnly}
      maxLength={200}
      testID={testID}
    />
  );
}

/** Why a name is refused: empty, too long. */
export function nameProblem(text: string): string | null {
  if (text === '') return 'A name is needed.';
  return text.length > 120 ? 'At most 120 characters.' : null;
}
