import { useState } from 'react';
import { useDraft } from './use-draft';

function readText(kept: unknown): string | null {
  return typeof kept === 'string' ? kept : null;
}

export type TextDraftHold = {
  readonly text: string;
  readonly change: (text: string) => void;
  readonly clear: () => void;
};

/** Holds a half-written note by name; it survives a refusal, an expired session and a reload. */
export function useTextDraft(name: string): TextDraftHold {
  const { kept, keep, discard } = useDraft(name, readText);
  const [typed, setTyped] = useState<{ readonly name: string; readonly text: string } | null>(null);
  return {
    text: typed?.name === name ? typed.text : (kept ?? ''),
    change: (text) => {
      setTyped({ name, text });
      keep(text);
    },
    clear: () => {
      setTyped({ name, text: '' });
      discard();
    },
  };
}
