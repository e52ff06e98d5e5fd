import { useRouter } from 'expo-router';
import { useChangeJob, useCreateJob } from '@/components/api/use-jobs';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { Notice } from '@/components/ui/notice';
import { jobRequest, type Job } from '@/shared/api/jobs';
import { useScreenForm } from './screen-form';

type JobDialogProps = { readonly job: Job | null; readonly onClose: () => void };

/** Makes a job, or renames one. */
export function JobDialog({ job, onClose }: JobDialogProps) {
  const router = useRouter();
  const create = useCreateJob();
  const change = useChangeJob(job?.id ?? '');
  const title = job ? 'Rename the job' : 'New job';
  const form = useScreenForm({
    initial: { name: job?.name ?? '', customer: job?.customer ?? '' },
    schema: jobRequest,
    bodyOf: (values) => values,
    sender: {
      isPending: create.isPending || change.isPending,
      mutateAsync: async (body: { name: string; customer?: string }) => {
        if (job) return change.mutateAsync(body);
        const made = await create.mutateAsync(body);
        router.push(`/jobs/${made.id}`);
        return made;
      },
    },
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
          <Button
            label={job ? 'Save' : 'Create the job'}
            variant="primary"
            onPress={form.submit}
            busy={form.busy}
          />
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
        <Field
          label="Customer"
          value={form.values.customer}
          onChange={(text) => form.set('customer', text)}
          error={form.errorOf('customer')}
        />
        {form.error ? <Notice kind="error" text={form.error} /> : null}
      </Form>
    </Dialog>
  );
}
