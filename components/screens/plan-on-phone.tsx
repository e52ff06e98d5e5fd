import { useState } from 'react';
import { View } from 'react-native';
import { measure, space } from '@/components/theme/tokens';
import { Choice } from '@/components/ui/choice';
import { Sheet, type SheetStop } from '@/components/ui/sheet';
import { Tabs } from '@/components/ui/tabs';
import { PlanHeaderNarrow } from './plan-header';
import { PlanHeadline } from './plan-headline';
import { PlanPartView } from './plan-part-view';
import type { Plan, PlanPart } from './plan-state';
import { PlanView } from './plan-view';

/** Height of the sheet while it only says what is worst, px. */
const PEEK = 96;

/** Parts that share a tab along the foot, first the one that the tab opens. */
const GROUPS: readonly { readonly label: string; readonly parts: readonly PlanPart[] }[] = [
  { label: 'Pairs', parts: ['results'] },
  { label: 'Shelf', parts: ['shelf'] },
  { label: 'Antennas', parts: ['antenna'] },
  { label: 'Fit-out', parts: ['radios', 'platform'] },
  { label: 'Review', parts: ['comments', 'revisions'] },
];
const WORDS: Partial<Record<PlanPart, string>> = {
  radios: 'Radios',
  platform: 'Platform',
  comments: 'Comments',
  revisions: 'Revisions',
};

/** The plan fills the screen; everything else comes up from below. */
export function PlanOnPhone({ plan }: { readonly plan: Plan }) {
  const [stop, setStop] = useState<SheetStop>('peek');
  const [openedFor, setOpenedFor] = useState(plan.part);
  const group = GROUPS.find(({ parts }) => parts.includes(plan.part)) ?? GROUPS[0]!;
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
        {group.parts.length > 1 ? (
          <Choice
            label={group.label}
            labelHidden
            value={plan.part}
            options={group.parts.map((part) => ({ value: part, label: WORDS[part] ?? part }))}
            onChange={plan.show}
          />
        ) : null}
        <PlanPartView key={plan.part} plan={plan} part={plan.part} onPlan={() => setStop('peek')} />
      </Sheet>
      <Tabs
        bottom
        label="Beside the plan"
        tabs={GROUPS.map(({ label, parts }) => ({
          key: parts[0]!,
          label,
          count: label === 'Review' && plan.openComments > 0 ? plan.openComments : undefined,
        }))}
        active={group.parts[0]!}
        onChange={(next) => {
          setOpenedFor(next);
          plan.show(next);
          setStop(next === group.parts[0] && stop !== 'peek' ? 'peek' : 'half');
        }}
      />
    </View>
  );
}
