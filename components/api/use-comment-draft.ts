import { useState } from 'react';
import { z } from 'zod';
import { commentTargetSchema, type CommentTarget } from '@/shared/api/comments';
import { idField } from '@/shared/api/fields';
import { createId } from '@/shared/ids';
import { useDraft } from './use-draft';

/** A half-written comment or reply. Its id is the one it is sent with, however often: a second arrival is the first. */
export type CommentDraft = {
  readonly id: string;
  readonly text: string;
  readonly target: CommentTarget | null;
};

const keptSchema = z.strictObject({ id: idField, text: z.string(), target: commentTargetSchema.nullable() });

function readKept(kept: unknown): CommentDraft | null {
  const parsed = keptSchema.safeParse(kept);
  return parsed.success ? parsed.data : null;
}

export type CommentDraftHold = {
  /** Null while nothing is being written. */
  readonly draft: CommentDraft | null;
  readonly change: (change: Partial<Omit<CommentDraft, 'id'>>) => CommentDraft;
  readonly clear: () => void;
};

/** Holds a half-written comment by name; it survives a refusal, an expired session and a reload. */
export function useCommentDraft(name: string): CommentDraftHold {
  const { kept, keep, discard } = useDraft(name, readKept);
  const [typed, setTyped] = useState<{ readonly name: string; readonly draft: CommentDraft | null } | null>(
    null,
  );
  const draft = typed?.name === name ? typed.draft : kept;
  return {
    draft,
    change: (change) => {
      const next = { ...(draft ?? { id: createId(), text: '', target: null }), ...change };
      setTyped({ name, draft: next });
      keep(next);
      return next;
    },
    clear: () => {
      setTyped({ name, draft: null });
      discard();
    },
  };
}
