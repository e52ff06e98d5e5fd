import { View } from 'react-native';
import { measure } from '@/components/theme/tokens';
import { PlanHeader } from './plan-header';
import { PlanHeadline } from './plan-headline';
import { PlanSide } from './plan-side';
import type { Plan } from './plan-state';
import { PlanView } from './plan-view';

/** The plan and one column beside it. */
export function PlanOnTablet({ plan }: { readonly plan: Plan }) {
  return (
    <View style={{ flex: 1 }}>
      <PlanHeader plan={plan} />
      <View style={{ flex: 1, flexDirection: 'row' }}>
        <PlanView plan={plan} />
        <PlanSide
          plan={plan}
          label="Beside the plan"
          side="right"
          width={measure.panel}
          head={<PlanHeadline plan={plan} />}
          parts={planTabs(plan)}
          active={plan.part}
          onChange={plan.show}
        />
      </View>
    </View>
  );
}

/** All parts in one row, for a window with one column. */
export function planTabs({ openComments }: Plan) {
  return [
    { key: 'results', label: 'Pairs' },
    { key: 'shelf', label: 'Shelf' },
    { key: 'antenna', label: 'Antennas' },
    { key: 'comments', label: 'Comments', count: openComments },
    { key: 'revisions', label: 'Revisions' },
    { key: 'radios', label: 'Radios' },
    { key: 'platform', label: 'Platform' },
  ] as const;
}
