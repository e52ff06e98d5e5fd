/**
 * Moves the focus to a field that holds a text which it refused, in the form or dialog around an element: what stands
 * there would be lost if that form were sent now. Answers whether there is one.
 */
export function focusRefused(from: unknown): boolean {
  if (!(from instanceof Element)) return false;
  const field = from.closest('form, [role="dialog"]')?.querySelector<HTMLElement>('[data-refused]');
  field?.focus();
  return field != null;
}
