import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useSession } from '@/components/api/session-provider';
import { useJobs } from '@/components/api/use-jobs';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { Icon } from '@/components/ui/icon';
import { LinkArea } from '@/components/ui/link';
import { SearchField } from '@/components/ui/search-field';
import { Chip } from '@/components/ui/state-mark';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { Job } from '@/shared/api/jobs';
import { JobDialog } from './job-dialog';
import { ScreenFrame } from './screen-frame';

/** The team's jobs, the latest change first. */
export function JobsScreen() {
  const { team, abilities } = useSession();
  const [search, setSearch] = useState('');
  const [archived, setArchived] = useState(false);
  const [creating, setCreating] = useState(false);
  const query = useJobs(search, archived);
  const jobs = query.data?.pages.flatMap(({ items }) => items) ?? [];
  const create = abilities.createJob ? (
    <Button label="New job" icon="add" variant="primary" onPress={() => setCreating(true)} />
  ) : null;
  return (
    <ScreenFrame title="Jobs" lead={team.name} actions={create}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.l }}>
        <View style={{ flexGrow: 1, flexBasis: 220 }}>
          <SearchField label="Find a job" value={search} onChange={setSearch} />
        </View>
        <Checkbox label="Archived" checked={archived} onChange={setArchived} />
      </View>
      {query.isPending ? (
        <LoadingState label="Fetching the jobs" />
      ) : query.isError && jobs.length === 0 ? (
        <ErrorState
          title="The jobs did not arrive"
          text={describeError(query.error)}
          onRetry={() => void query.refetch()}
        />
      ) : jobs.length === 0 ? (
        <EmptyState
          icon="jobs"
          title={search || archived ? 'None found' : 'No job yet'}
          text={emptyText(search, archived)}
        >
          {search || archived ? null : create}
        </EmptyState>
      ) : (
        <View role="list">
          {jobs.map((job) => (
            <JobLine key={job.id} job={job} />
          ))}
        </View>
      )}
      {query.hasNextPage ? (
        <Button
          label="Show more jobs"
          onPress={() => void query.fetchNextPage()}
          busy={query.isFetchingNextPage}
        />
      ) : null}
      {creating ? <JobDialog job={null} onClose={() => setCreating(false)} /> : null}
    </ScreenFrame>
  );
}

function emptyText(search: string, archived: boolean): string {
  if (search) return `No ${archived ? 'archived ' : ''}job is called “${search}”.`;
  if (archived) return 'No job is archived.';
  return 'A job is one piece of work for one customer: a vehicle, a roof or a device to be fitted.';
}

function JobLine({ job: { id, name, customer, archived, updatedAt, platformCount } }: { readonly job: Job }) {
  const { color } = useTheme();
  const platforms = `${platformCount} ${platformCount === 1 ? 'platform' : 'platforms'}`;
  return (
    <View role="listitem" style={{ borderBottomWidth: line.hair, borderColor: color.rule }}>
      <LinkArea href={`/jobs/${id}`} label={`${name}, ${customer}, ${platforms}`}>
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.m, paddingVertical: space.m }}>
          <View style={{ flex: 1, gap: space.hair }}>
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
              <Text variant="strong">{name}</Text>
              {archived ? <Chip text="archived" /> : null}
            </View>
            <Text variant="small" tone="soft">
              {[customer, platforms, `changed ${new Date(updatedAt).toLocaleDateString()}`]
                .filter(Boolean)
                .join(' · ')}
            </Text>
          </View>
          <Icon name="chevron-right" tone="inkSoft" />
        </View>
      </LinkArea>
    </View>
  );
}
