import { useState } from 'react';
import { View } from 'react-native';
import { describeError } from '@/components/api/api-problem';
import { useRevisions, useSubmitRevision } from '@/components/api/use-revisions';
import { space } from '@/components/theme/tokens';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { Layout } from '@/shared/api/layouts';
import type { Revision } from '@/shared/api/revisions';
import { nextRevisionLetter } from '@/shared/layout/revision-letters';
import { RevisionSaveDialog } from './revision-save-dialog';
import { orderRevisions } from './revision-words';

type RevisionSavingProps = {
  readonly layoutId: string;
  readonly revisions: readonly Revision[];
  readonly sequence: number;
  readonly pendingCount: number;
  readonly abilities: Layout['abilities'] | null;
};

/** Saves the working copy as the next letter, and submits it: the saved one itself when nothing changed since. */
export function RevisionSaving({
  layoutId,
  revisions,
  sequence,
  pendingCount,
  abilities,
}: RevisionSavingProps) {
  const submit = useSubmitRevision();
  const [asking, setAsking] = useState<'save' | 'submit' | null>(null);
  const last = revisions[0];
  const letter = nextRevisionLetter(last?.letter ?? null);
  const unchanged = last !== undefined && last.sequence >= sequence && pendingCount === 0;
  const ready = unchanged && last.abilities.submit ? last : null;
  if (!abilities?.saveRevision && !abilities?.submitRevision) return null;
  return (
    <View style={{ gap: space.s, flexShrink: 1 }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.s }}>
        {abilities.saveRevision ? (
          <Button label={`Save revision ${letter}`} onPress={() => setAsking('save')} />
        ) : null}
        {abilities.submitRevision ? (
          <Button
            label={ready ? `Submit ${ready.letter} for review` : 'Submit for review'}
            variant="primary"
            busy={submit.isPending}
            onPress={() => (ready ? submit.mutate(ready.id) : setAsking('submit'))}
          />
        ) : null}
      </View>
      {submit.error ? (
        <Notice kind="error" text={describeError(submit.error)} onClose={submit.reset} />
      ) : null}
      {asking ? (
        <RevisionSaveDialog
          layoutId={layoutId}
          letter={letter}
          andSubmit={asking === 'submit'}
          pendingCount={pendingCount}
          onClose={() => setAsking(null)}
        />
      ) : null}
    </View>
  );
}

type RevisionHeaderActionsProps = Omit<RevisionSavingProps, 'revisions'>;

/** The same two buttons for the head of the plan. */
export function RevisionHeaderActions(props: RevisionHeaderActionsProps) {
  const query = useRevisions(props.layoutId);
  if (!query.data) return null;
  return <RevisionSaving {...props} revisions={orderRevisions(query.data.items)} />;
}
