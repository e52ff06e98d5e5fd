import type { CSSProperties, ReactNode, SubmitEvent } from 'react';
import { space } from '../theme/tokens';
import { focusRefused } from './focus-refused';

type FormProps = {
  /** What the form is for: read out on entering it. */
  readonly label: string;
  readonly onSubmit: () => void;
  readonly children: ReactNode;
};

const FORM_STYLE: CSSProperties = {
  display: 'flex',
  flexDirection: 'column',
  gap: space.l,
  margin: space.none,
};

/**
 * A form of the page: Enter in a field sends it, and password managers know it for what it is. While a field holds a
 * text that it refused, the form is not sent and that field gets the focus.
 */
export function Form({ label, onSubmit, children }: FormProps) {
  const submit = (event: SubmitEvent<HTMLFormElement>) => {
    event.preventDefault();
    event.stopPropagation();
    if (!focusRefused(event.currentTarget)) onSubmit();
  };
  return (
    <form aria-label={label} noValidate onSubmit={submit} style={FORM_STYLE}>
      {children}
      <input type="submit" hidden />
    </form>
  );
}
