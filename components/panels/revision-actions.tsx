import { useState } from 'react';
import { describeError } from '@/components/api/api-problem';
import { useSubmitRevision } from '@/components/api/use-revisions';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import type { Revision } from '@/shared/api/revisions';
import { RevisionFreezeDialog } from './revision-freeze-dialog';
import { RevisionReturnDialog } from './revision-return-dialog';

type RevisionActionsProps = {
  readonly revision: Revision;
  /** Leads to the revision's own page; left out where it is open already. */
  readonly withOpen?: boolean;
};

/** What may be done with a revision, as its abilities say. */
export function RevisionActions({ revision, withOpen = true }: RevisionActionsProps) {
  const submit = useSubmitRevision();
  const [asking, setAsking] = useState<'return' | 'freeze' | null>(null);
  const { abilities, letter } = revision;
  const close = () => setAsking(null);
  return (
    <>
      {withOpen ? <LinkButton href={`/r/${revision.id}`} label={`Open ${letter}`} icon="layers" /> : null}
      {abilities.submit ? (
        <Button
          label={`Submit ${letter} for review`}
          icon="send"
          busy={submit.isPending}
          onPress={() => submit.mutate(revision.id)}
        />
      ) : null}
      {abilities.return ? (
        <Button label={`Return ${letter}`} icon="undo" onPress={() => setAsking('return')} />
      ) : null}
      {abilities.freeze ? (
        <Button
          label={`Freeze ${letter}`}
          icon="lock"
          variant="primary"
          onPress={() => setAsking('freeze')}
        />
      ) : null}
      {submit.error ? (
        <Notice kind="error" text={describeError(submit.error)} onClose={submit.reset} />
      ) : null}
      {asking === 'return' ? <RevisionReturnDialog revision={revision} onClose={close} /> : null}
      {asking === 'freeze' ? <RevisionFreezeDialog revision={revision} onClose={close} /> : null}
    </>
  );
}
