import type { z } from 'zod';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { platformChangeRequest } from '@/shared/api/jobs';
import { useScreenForm } from './screen-form';

type NameDialogProps = {
  readonly title: string;
  readonly confirmLabel: string;
  readonly initial: string;
  readonly sender: {
    readonly mutateAsync: (body: z.input<typeof platformChangeRequest>) => Promise<unknown>;
    readonly isPending: boolean;
  };
  readonly onClose: () => void;
};

/** Asks for one name. */
export function NameDialog({ title, confirmLabel, initial, sender, onClose }: NameDialogProps) {
  const form = useScreenForm({
    initial: { name: initial },
    schema: platformChangeRequest,
    bodyOf: (values) => values,
    sender,
    onDone: onClose,
  });
  return (
    <Dialog
      open
      insistent
      title={title}
      onClose={onClose}
      actions={
        <>
          <Button label="Cancel" onPress={onClose} />
          <Button label={confirmLabel} variant="primary" onPress={form.submit} busy={form.busy} />
        </>
      }
    >
      <Form label={title} onSubmit={form.submit}>
        <Field
          label="Name"
          value={form.values.name}
          onChange={(text) => form.set('name', text)}
          error={form.errorOf('name')}
          autoFocus
          required
        />
        {form.error ? <Notice kind="error" text={form.error} /> : null}
      </Form>
    </Dialog>
  );
}
