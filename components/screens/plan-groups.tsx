import { View } from 'react-native';
import { space } from '@/components/theme/tokens';
import { Choice } from '@/components/ui/choice';
import { PlanPartView } from './plan-part-view';
import type { Plan, PlanPart } from './plan-state';

/** Parts that share a tab where there is one column for all, first the one that the tab opens. */
export type PlanGroup = { readonly label: string; readonly parts: readonly [PlanPart, ...PlanPart[]] };

export const PLAN_GROUPS: readonly [PlanGroup, ...PlanGroup[]] = [
  { label: 'Pairs', parts: ['results'] },
  { label: 'Shelf', parts: ['shelf'] },
  { label: 'Antennas', parts: ['antenna'] },
  { label: 'Review', parts: ['comments', 'revisions'] },
];

const WORDS: Partial<Record<PlanPart, string>> = {
  comments: 'Comments',
  revisions: 'Revisions',
};

/** The group that a part stands in. */
export function groupOf(part: PlanPart): PlanGroup {
  return PLAN_GROUPS.find(({ parts }) => parts.includes(part)) ?? PLAN_GROUPS[0];
}

/** The tabs of all groups. */
export function groupTabs({ openComments }: Plan) {
  return PLAN_GROUPS.map(({ label, parts }) => ({
    key: parts[0],
    label,
    count: label === 'Review' && openComments > 0 ? openComments : undefined,
  }));
}

type PlanGroupViewProps = { readonly plan: Plan; readonly part: PlanPart; readonly onPlan?: () => void };

/** A part, under the choice among those that share its tab. */
export function PlanGroupView({ plan, part, onPlan }: PlanGroupViewProps) {
  const { label, parts } = groupOf(part);
  return (
    <View style={{ gap: space.l }}>
      {parts.length > 1 ? (
        <Choice
          label={label}
          labelHidden
          value={part}
          options={parts.map((one) => ({ value: one, label: WORDS[one] ?? one }))}
          onChange={plan.show}
        />
      ) : null}
      <PlanPartView key={part} plan={plan} part={part} onPlan={onPlan} />
    </View>
  );
}
