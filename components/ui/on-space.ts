import type { KeyPress } from './web-attributes';

/**
 * A key handler that presses with the space bar: a Pressable does so only in the role of a button, but a checkbox, a
 * radio button, a row or an item of a menu is pressed with it too. Other keys go to `others`.
 */
export function onSpace(press: () => void, others?: (event: KeyPress) => void): (event: KeyPress) => void {
  return (event) => {
    if (event.key !== ' ') {
      others?.(event);
      return;
    }
    // Space in a control inside is that control's.
    if (event.target !== event.currentTarget) return;
    event.preventDefault();
    press();
  };
}
