/** A path with its query; what is empty is left out. */
export function listPath(path: string, query: Readonly<Record<string, string | undefined>>): string {
  const parameters = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== '') parameters.set(name, value);
  }
  const text = parameters.toString();
  return text === '' ? path : `${path}?${text}`;
}
