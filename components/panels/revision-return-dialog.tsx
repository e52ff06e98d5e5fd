import { useState } from 'react';
import { useReturnRevision } from '@/components/api/use-revisions';
import { useTextDraft } from '@/components/api/use-text-draft';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import type { Revision } from '@/shared/api/revisions';
import { fieldRefusal, reasonProblem, wholeRefusal } from './revision-refusal';

type RevisionReturnDialogProps = { readonly revision: Revision; readonly onClose: () => void };

/** Returns a submitted revision to its submitter, with the reason. */
export function RevisionReturnDialog({ revision, onClose }: RevisionReturnDialogProps) {
  const { text, change, clear } = useTextDraft(`return:${revision.id}`);
  const back = useReturnRevision(revision.id);
  const [problem, setProblem] = useState<string | null>(null);
  const confirm = () => {
    const wrong = reasonProblem(text);
    setProblem(wrong);
    if (wrong !== null || back.isPending) return;
    back.mutate(
      { reason: text },
      {
        onSuccess: () => {
          clear();
          onClose();
        },
      },
    );
  };
  const whole = wholeRefusal(back.error, ['reason']);
  return (
    <Dialog
      open
      title={`Return revision ${revision.letter}`}
      onClose={onClose}
      actions={
        <>
          <Button label="Cancel" onPress={onClose} />
          <Button
            label={`Return ${revision.letter}`}
            variant="primary"
            icon="undo"
            onPress={confirm}
            busy={back.isPending}
          />
        </>
      }
    >
      <Form label={`Return revision ${revision.letter}`} onSubmit={confirm}>
        <Text>
          {`${revision.letter} stays as it is and is marked returned. Whoever submitted it is told why, changes the working copy and submits the next letter.`}
        </Text>
        <Field
          label="Reason"
          hint="What has to change before it can be frozen."
          value={text}
          onChange={change}
          multiline
          required
          error={problem ?? fieldRefusal(back.error, 'reason', 'The reason')}
        />
        {whole ? <Notice kind="error" text={whole} /> : null}
      </Form>
    </Dialog>
  );
}
