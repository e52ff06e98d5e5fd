import { act, fireEvent } from '@testing-library/react';

/**
 * A key pressed and let go where the focus is, as a browser does it: a native button is clicked by Enter and Space, a
 * form is sent by Enter in one of its fields. Answers whether nobody claimed the key.
 */
export function pressKey(key: string, modifiers: { readonly shiftKey?: boolean } = {}): boolean {
  const target = document.activeElement ?? document.body;
  const free = fireEvent.keyDown(target, { key, ...modifiers });
  if (free && target instanceof HTMLButtonElement && (key === 'Enter' || key === ' '))
    fireEvent.click(target);
  if (free && target instanceof HTMLInputElement && key === 'Enter' && target.form)
    fireEvent.submit(target.form);
  fireEvent.keyUp(document.activeElement ?? document.body, { key, ...modifiers });
  return free;
}

/** Moves the focus to an element, and lets React hear of it. */
export function focusOn(element: HTMLElement): void {
  act(() => element.focus());
}
