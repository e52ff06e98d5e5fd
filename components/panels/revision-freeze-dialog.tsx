import { useState } from 'react';
import { useFreezeRevision } from '@/components/api/use-revisions';
import { useTextDraft } from '@/components/api/use-text-draft';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import type { Revision } from '@/shared/api/revisions';
import { fieldRefusal, reasonProblem, wholeRefusal } from './revision-refusal';

type RevisionFreezeDialogProps = { readonly revision: Revision; readonly onClose: () => void };

/** Freezes a submitted revision: says what that means, asks for the reason and once more for the password. */
export function RevisionFreezeDialog({ revision, onClose }: RevisionFreezeDialogProps) {
  const { text, change, clear } = useTextDraft(`freeze:${revision.id}`);
  const [password, setPassword] = useState('');
  const [problems, setProblems] = useState<{
    readonly reason: string | null;
    readonly password: string | null;
  }>({
    reason: null,
    password: null,
  });
  const freeze = useFreezeRevision(revision.id);
  const { letter } = revision;
  const confirm = () => {
    const wrong = {
      reason: reasonProblem(text),
      password: password === '' ? 'Enter your password.' : null,
    };
    setProblems(wrong);
    if (wrong.reason !== null || wrong.password !== null || freeze.isPending) return;
    freeze.mutate(
      { reason: text, password },
      {
        onSuccess: () => {
          clear();
          onClose();
        },
      },
    );
  };
  const whole = wholeRefusal(freeze.error, ['reason', 'password']);
  return (
    <Dialog
      open
      insistent
      title={`Freeze revision ${letter}`}
      onClose={onClose}
      actions={
        <>
          <Button label="Cancel" onPress={onClose} />
          <Button
            label={`Freeze ${letter}`}
            variant="primary"
            icon="lock"
            onPress={confirm}
            busy={freeze.isPending}
          />
        </>
      }
    >
      <Form label={`Freeze revision ${letter}`} onSubmit={confirm}>
        <Text>
          {`From now on installers build from ${letter}. Nobody can change it afterwards, not even you: a mistake is put right by freezing a later revision. One that was frozen before becomes superseded. Your name, the time and your reason stand on the sheet.`}
        </Text>
        <Field
          label="Reason"
          hint="On what grounds it may be built: what you looked at, what was agreed."
          value={text}
          onChange={change}
          multiline
          required
          error={problems.reason ?? fieldRefusal(freeze.error, 'reason', 'The reason')}
        />
        <Field
          label="Your password"
          hint="Entered again, so that it is certain who freezes."
          value={password}
          onChange={setPassword}
          secret
          required
          autoComplete="current-password"
          error={problems.password ?? fieldRefusal(freeze.error, 'password', 'The password')}
        />
        {whole ? <Notice kind="error" text={whole} /> : null}
      </Form>
    </Dialog>
  );
}
