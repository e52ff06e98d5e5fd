import { useState } from 'react';
import { describeError, fieldProblems } from '@/components/api/api-problem';
import { useSaveRevision, useSubmitRevision } from '@/components/api/use-revisions';
import { useTextDraft } from '@/components/api/use-text-draft';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';

type RevisionSaveDialogProps = {
  readonly layoutId: string;
  /** The letter that it probably gets; the server gives it. */
  readonly letter: string;
  /** Also submits it once it is saved. */
  readonly andSubmit: boolean;
  /** Changes of this window that the server has not answered yet: they would not be in it. */
  readonly pendingCount: number;
  readonly onClose: () => void;
};

/** Saves the working copy as its next letter, with a note, and submits it if so wished. */
export function RevisionSaveDialog({
  layoutId,
  letter,
  andSubmit,
  pendingCount,
  onClose,
}: RevisionSaveDialogProps) {
  const { text, change, clear } = useTextDraft(`revision-note:${layoutId}`);
  const save = useSaveRevision(layoutId);
  const submit = useSubmitRevision();
  const [saved, setSaved] = useState<{ readonly id: string; readonly letter: string } | null>(null);
  const busy = save.isPending || submit.isPending;

  const send = (revisionId: string) => submit.mutate(revisionId, { onSuccess: onClose });
  const confirm = () => {
    if (busy || pendingCount > 0) return;
    if (saved) {
      send(saved.id);
      return;
    }
    save.mutate(
      { note: text },
      {
        onSuccess: (revision) => {
          clear();
          if (!andSubmit) {
            onClose();
            return;
          }
          setSaved({ id: revision.id, letter: revision.letter });
          send(revision.id);
        },
      },
    );
  };
  const confirmLabel = saved
    ? `Submit ${saved.letter}`
    : andSubmit
      ? `Save and submit ${letter}`
      : `Save revision ${letter}`;
  const noteProblem = fieldProblems(save.error).find((problem) => problem.path.endsWith('note'));
  return (
    <Dialog
      open
      title={andSubmit ? `Submit revision ${letter} for review` : `Save revision ${letter}`}
      onClose={onClose}
      actions={
        <>
          <Button label="Cancel" onPress={onClose} />
          <Button
            label={confirmLabel}
            variant="primary"
            onPress={confirm}
            busy={busy}
            disabled={pendingCount > 0}
          />
        </>
      }
    >
      <Form label={confirmLabel} onSubmit={confirm}>
        <Text>
          {andSubmit
            ? `The layout as it stands now is saved as revision ${letter} with its estimates, and the approvers are told. You go on in the working copy.`
            : `The layout as it stands now is saved as revision ${letter} with its estimates. You go on in the working copy; what is saved no longer changes.`}
        </Text>
        <Field
          label="Note (optional)"
          hint="What this revision is for, or what has changed."
          value={text}
          onChange={change}
          multiline
          readOnly={saved !== null}
          error={noteProblem ? `The note ${noteProblem.message}.` : undefined}
        />
        {pendingCount > 0 ? (
          <Notice
            kind="caution"
            text={`${pendingCount === 1 ? 'One change has' : `${pendingCount} changes have`} not reached the server yet. It can be saved once they have arrived.`}
          />
        ) : null}
        {save.error && !noteProblem ? <Notice kind="error" text={describeError(save.error)} /> : null}
        {submit.error && saved ? (
          <Notice
            kind="error"
            text={`Revision ${saved.letter} is saved, but it was not submitted. ${describeError(submit.error)}`}
          />
        ) : null}
      </Form>
    </Dialog>
  );
}
