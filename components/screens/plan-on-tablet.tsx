import { View } from 'react-native';
import { measure } from '@/components/theme/tokens';
import { groupOf, groupTabs } from './plan-groups';
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
          parts={groupTabs(plan)}
          active={groupOf(plan.part).parts[0]}
          part={plan.part}
          onChange={plan.show}
        />
      </View>
    </View>
  );
}
