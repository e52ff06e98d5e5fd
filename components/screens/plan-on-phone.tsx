import { useState } from 'react';
import { View } from 'react-native';
import { measure, space } from '@/components/theme/tokens';
import { Sheet, type SheetStop } from '@/components/ui/sheet';
import { Tabs } from '@/components/ui/tabs';
import { groupOf, groupTabs, PlanGroupView } from './plan-groups';
import { PlanHeaderNarrow } from './plan-header';
import { PlanHeadline } from './plan-headline';
import type { Plan } from './plan-state';
import { PlanView } from './plan-view';

/** Height of the sheet while it only says what is worst, px. */
const PEEK = 96;

/** The plan fills the screen; everything else comes up from below. */
export function PlanOnPhone({ plan }: { readonly plan: Plan }) {
  const [stop, setStop] = useState<SheetStop>('peek');
  const [openedFor, setOpenedFor] = useState(plan.part);
  const group = groupOf(plan.part);
  // A part that was called up from the plan must be seen.
  if (openedFor !== plan.part) {
    setOpenedFor(plan.part);
    if (stop === 'peek') setStop('half');
  }
  return (
    <View style={{ flex: 1 }}>
      <PlanHeaderNarrow plan={plan} />
      <PlanView plan={plan} coveredBelow={PEEK} narrow />
      <Sheet
        label={group.label}
        stop={stop}
        onStopChange={setStop}
        peek={PEEK}
        bottom={measure.bottomBar}
        head={
          <View style={{ paddingHorizontal: space.l, paddingBottom: space.m }}>
            <PlanHeadline plan={plan} brief />
          </View>
        }
      >
        <PlanGroupView plan={plan} part={plan.part} onPlan={() => setStop('peek')} />
      </Sheet>
      <Tabs
        bottom
        label="Beside the plan"
        tabs={groupTabs(plan)}
        active={group.parts[0]}
        onChange={(next) => {
          setOpenedFor(next);
          plan.show(next);
          setStop(next === group.parts[0] && stop !== 'peek' ? 'peek' : 'half');
        }}
      />
    </View>
  );
}
