import { useEffect, useState } from 'react';
import type { z } from 'zod';
import { describeError, fieldProblems } from '@/components/api/api-problem';
import { useDraft } from '@/components/api/use-draft';

type Values = Readonly<Record<string, unknown>>;

export type ScreenForm<V extends Values> = {
  readonly values: V;
  readonly set: <K extends keyof V>(field: K, value: V[K]) => void;
  /** What is wrong with a field: found here, or by the server. */
  readonly errorOf: (field: keyof V & string) => string | undefined;
  /** What is wrong with the whole. */
  readonly error: string | null;
  readonly busy: boolean;
  /** Checks, then sends; problems stand at their fields and what was typed stays. */
  readonly submit: () => void;
};

type Sender<Body> = {
  readonly mutateAsync: (body: Body) => Promise<unknown>;
  readonly isPending: boolean;
};

/**
 * A short form of one screen: its entries, checked by the same schema as on the server. `bodyOf` makes the request
 * from the entries; paths of problems are fields of it.
 */
export function useScreenForm<V extends Values, S extends z.ZodType>(options: {
  readonly initial: V;
  readonly schema: S;
  readonly bodyOf: (values: V) => z.input<S>;
  readonly sender: Sender<z.input<S>>;
  readonly onDone?: () => void;
  /** Fields that survive a reload under this name; never a secret. */
  readonly draft?: { readonly name: string; readonly fields: readonly (keyof V & string)[] };
}): ScreenForm<V> {
  const { initial, schema, bodyOf, sender, onDone, draft } = options;
  const { kept, keep, discard } = useDraft(draft?.name ?? null, (found) =>
    fittingFields(found, initial, draft?.fields ?? []),
  );
  const [typed, setTyped] = useState<V | null>(null);
  const values = typed ?? { ...initial, ...kept };
  const [refusals, setRefusals] = useState(0);
  const [problems, setProblems] = useState<ReadonlyMap<string, string>>(new Map());
  const [error, setError] = useState<string | null>(null);

  // Whoever was refused stands in the first field to mend.
  useEffect(() => {
    if (refusals > 0) document.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [refusals]);

  const send = async () => {
    const parsed = schema.safeParse(bodyOf(values));
    setError(null);
    setProblems(new Map());
    if (!parsed.success) {
      setProblems(firstByField(parsed.error.issues.map(({ path, message }) => [String(path[0]), message])));
      setRefusals((count) => count + 1);
      return;
    }
    try {
      await sender.mutateAsync(bodyOf(values));
    } catch (refusal) {
      const found = fieldProblems(refusal).map(({ path, message }) => [fieldOf(path), message] as const);
      setProblems(firstByField(found));
      if (found.length === 0) setError(describeError(refusal));
      else setRefusals((count) => count + 1);
      return;
    }
    discard();
    onDone?.();
  };

  return {
    values,
    set: (field, value) => {
      const next = { ...values, [field]: value };
      setTyped((before) => ({ ...(before ?? values), [field]: value }));
      if (draft) keep(fittingFields(next, initial, draft.fields) ?? {});
      setProblems((before) => new Map([...before].filter(([name]) => name !== field)));
    },
    errorOf: (field) => {
      const message = problems.get(field);
      return message === undefined ? undefined : sentenceOf(message);
    },
    error,
    busy: sender.isPending,
    submit: () => void send(),
  };
}

/** Of what was kept, the fields that still fit the form; null when none does. */
function fittingFields<V extends Values>(
  kept: unknown,
  initial: V,
  fields: readonly (keyof V & string)[],
): Partial<V> | null {
  if (typeof kept !== 'object' || kept === null) return null;
  const found: Values = { ...kept };
  const fitting = fields.filter((field) => {
    const [now, then] = [initial[field], found[field]];
    return Array.isArray(now) ? Array.isArray(then) : typeof then === typeof now;
  });
  if (fitting.length === 0) return null;
  return Object.fromEntries(fitting.map((field) => [field, found[field]])) as Partial<V>;
}

/** `is empty` and `needs at least one role` as sentences. */
function sentenceOf(message: string): string {
  const text = message.startsWith('is ') ? `this ${message}` : message;
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

function firstByField(found: readonly (readonly [string, string])[]): ReadonlyMap<string, string> {
  return new Map([...found].reverse());
}

/** `body.roles[0]` and `roles.0` are problems of the field `roles`. */
function fieldOf(path: string): string {
  return path.replace(/^body\./, '').split(/[.[]/)[0] ?? path;
}
