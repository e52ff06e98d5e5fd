/** The two letters that stand for a person on the plan. */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/);
  const first = words[0] ?? '';
  const last = words.length > 1 ? (words.at(-1) ?? '') : '';
  const letters = last === '' ? [...first].slice(0, 2) : [[...first][0] ?? '', [...last][0] ?? ''];
  return letters.join('').toUpperCase();
}
