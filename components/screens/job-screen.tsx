import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useChangeJob, useJob } from '@/components/api/use-jobs';
import { space } from '@/components/theme/tokens';
import { Link, LinkButton } from '@/components/ui/link';
import { Menu } from '@/components/ui/menu';
import { Notice } from '@/components/ui/notice';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import type { JobDetail } from '@/shared/api/jobs';
import { JobDialog } from './job-dialog';
import { PlatformSection } from './platform-section';
import { ScreenFrame } from './screen-frame';

/** One job: its platforms with their layouts and revisions. */
export function JobScreen({ jobId }: { readonly jobId: string }) {
  const job = useJob(jobId);
  const above = <Link href="/jobs" label="Jobs" />;
  if (job.data) return <OpenJob job={job.data} />;
  return (
    <ScreenFrame title="Job" above={above}>
      {job.isError ? (
        <ErrorState
          title="The job did not open"
          text={describeError(job.error)}
          onRetry={() => void job.refetch()}
        />
      ) : (
        <LoadingState label="Opening the job" />
      )}
    </ScreenFrame>
  );
}

function OpenJob({ job }: { readonly job: JobDetail }) {
  const [renaming, setRenaming] = useState(false);
  const change = useChangeJob(job.id);
  const canEdit = job.abilities.edit;
  const newPlatform = canEdit ? (
    <LinkButton href={`/jobs/${job.id}/new-platform`} label="New platform" icon="add" primary />
  ) : null;
  return (
    <ScreenFrame
      title={job.name}
      lead={job.customer || undefined}
      above={<Link href="/jobs" label="Jobs" />}
      actions={
        canEdit ? (
          <View style={{ flexDirection: 'row', gap: space.s }}>
            {newPlatform}
            <Menu
              label="More about this job"
              items={[
                { label: 'Rename the job', icon: 'edit', onPress: () => setRenaming(true) },
                job.archived
                  ? {
                      label: 'Take out of the archive',
                      icon: 'restore',
                      onPress: () => change.mutate({ archived: false }),
                    }
                  : {
                      label: 'Archive the job',
                      icon: 'archive',
                      onPress: () => change.mutate({ archived: true }),
                    },
              ]}
            />
          </View>
        ) : null
      }
    >
      {job.archived ? (
        <Notice kind="info" text="This job is archived; it is kept and can be taken out again." />
      ) : null}
      {change.isError ? <Notice kind="error" text={describeError(change.error)} /> : null}
      {job.platforms.length === 0 ? (
        <EmptyState
          icon="layers"
          title="No platform yet"
          text="A platform is what the antennas go on. It begins with an outline whose sizes you type."
        >
          {newPlatform}
        </EmptyState>
      ) : (
        job.platforms.map((platform) => (
          <PlatformSection key={platform.id} platform={platform} canEdit={canEdit} />
        ))
      )}
      {renaming ? <JobDialog job={job} onClose={() => setRenaming(false)} /> : null}
    </ScreenFrame>
  );
}
