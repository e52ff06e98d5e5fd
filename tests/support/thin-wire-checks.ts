import checks from '../fixtures/thin-wire-checks.json';

/** One row of the fixture: numbers by name, complex values as `re` and `im`. */
export type Check = {
  readonly id: string;
  readonly topic: string;
  readonly source: string;
  readonly tolerance: number;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly expected: Readonly<Record<string, unknown>>;
};

/** The rows whose id begins so. */
export function checksOf(prefix: string): Check[] {
  const rows = (checks.rows as unknown as Check[]).filter((row) => row.id.startsWith(prefix));
  if (rows.length === 0) throw new Error(`no check ${prefix}`);
  return rows;
}

/** A number of a row's inputs or expected values. */
export function numberOf(record: Readonly<Record<string, unknown>>, name: string): number {
  const value = record[name];
  if (typeof value !== 'number') throw new Error(`no number ${name}`);
  return value;
}

/** A complex value of a row's expected values; the whole record without a name. */
export function complexOf(
  record: Readonly<Record<string, unknown>>,
  name?: string,
): { re: number; im: number } {
  const source = name === undefined ? record : (record[name] as Readonly<Record<string, unknown>>);
  return { re: numberOf(source, 're'), im: numberOf(source, 'im') };
}
