import { Field } from './field';

type SearchFieldProps = {
  readonly label: string;
  readonly value: string;
  readonly onChange: (value: string) => void;
};

/** A place to type what one looks for. */
export function SearchField({ label, value, onChange }: SearchFieldProps) {
  return (
    <Field
      label={label}
      labelHidden
      placeholder={label}
      value={value}
      onChange={onChange}
      inputMode="search"
      maxLength={120}
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || value === '') return;
        event.preventDefault();
        onChange('');
      }}
    />
  );
}
