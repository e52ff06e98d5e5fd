import { useState } from 'react';
import type { z } from 'zod';
import { describeError, fieldProblems } from '@/components/api/api-problem';

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
}): ScreenForm<V> {
  const { initial, schema, bodyOf, sender, onDone } = options;
  const [values, setValues] = useState(initial);
  const [problems, setProblems] = useState<ReadonlyMap<string, string>>(new Map());
  const [error, setError] = useState<string | null>(null);

  const send = async () => {
    const parsed = schema.safeParse(bodyOf(values));
    setError(null);
    setProblems(new Map());
    if (!parsed.success) {
      setProblems(firstByField(parsed.error.issues.map(({ path, message }) => [String(path[0]), message])));
      return;
    }
    try {
      await sender.mutateAsync(bodyOf(values));
    } catch (refusal) {
      const found = fieldProblems(refusal).map(({ path, message }) => [fieldOf(path), message] as const);
      setProblems(firstByField(found));
      if (found.length === 0) setError(describeError(refusal));
      return;
    }
    onDone?.();
  };

  return {
    values,
    set: (field, value) => {
      setValues((before) => ({ ...before, [field]: value }));
      setProblems((before) => new Map([...before].filter(([name]) => name !== field)));
    },
    errorOf: (field) => {
      const message = problems.get(field);
      return message === undefined ? undefined : `${message.charAt(0).toUpperCase()}${message.slice(1)}.`;
    },
    error,
    busy: sender.isPending,
    submit: () => void send(),
  };
}

function firstByField(found: readonly (readonly [string, string])[]): ReadonlyMap<string, string> {
  return new Map([...found].reverse());
}

/** `body.roles[0]` and `roles.0` are problems of the field `roles`. */
function fieldOf(path: string): string {
  return path.replace(/^body\./, '').split(/[.[]/)[0] ?? path;
}
