import { useState } from 'react';
import { View } from 'react-native';
import { measure } from '@/components/theme/tokens';
import { PlanHeader } from './plan-header';
import { PlanHeadline } from './plan-headline';
import { PlanSide } from './plan-side';
import type { Plan, PlanPart } from './plan-state';
import { PlanView } from './plan-view';

const LEFT: readonly PlanPart[] = ['shelf', 'antenna'];

/** Shelf, plan and results side by side. */
export function PlanOnDesktop({ plan }: { readonly plan: Plan }) {
  // Each column remembers what it showed last while the other one is worked with.
  const [left, setLeft] = useState<PlanPart>('shelf');
  const [right, setRight] = useState<PlanPart>('results');
  const { part } = plan;
  const isLeft = LEFT.includes(part);
  const open = (next: PlanPart) => {
    (LEFT.includes(next) ? setLeft : setRight)(next);
    plan.show(next);
  };
  const shownLeft = isLeft ? part : left;
  const shownRight = isLeft ? right : part;
  return (
    <View style={{ flex: 1 }}>
      <PlanHeader plan={plan} />
      <View style={{ flex: 1, flexDirection: 'row' }}>
        <PlanSide
          plan={plan}
          label="What is placed"
          side="left"
          width={measure.shelf}
          parts={[
            { key: 'shelf', label: 'Shelf' },
            { key: 'antenna', label: 'Antennas' },
          ]}
          active={shownLeft}
          onChange={open}
        />
        <PlanView plan={plan} />
        <PlanSide
          plan={plan}
          label="What it comes to"
          side="right"
          width={measure.panel}
          head={<PlanHeadline plan={plan} />}
          parts={[
            { key: 'results', label: 'Pairs' },
            {
              key: 'comments',
              label: 'Comments',
              count: plan.openComments > 0 ? plan.openComments : undefined,
            },
            { key: 'revisions', label: 'Revisions' },
          ]}
          active={shownRight}
          onChange={open}
        />
      </View>
    </View>
  );
}
