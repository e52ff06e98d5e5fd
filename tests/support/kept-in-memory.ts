/** What the browser's database would keep; stands in for `idb-keyval`, for jsdom has no IndexedDB. */
export const kept = new Map<string, unknown>();

export async function get(key: string): Promise<unknown> {
  return kept.get(key);
}

export async function set(key: string, value: unknown): Promise<void> {
  kept.set(key, value);
}

export async function del(key: string): Promise<void> {
  kept.delete(key);
}
