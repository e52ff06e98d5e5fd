import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { line, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Tabs, type Tab } from '@/components/ui/tabs';
import { PlanGroupView } from './plan-groups';
import { PlanPartView } from './plan-part-view';
import type { Plan, PlanPart } from './plan-state';

type PlanSideProps = {
  readonly plan: Plan;
  readonly label: string;
  readonly side: 'left' | 'right';
  readonly width: number;
  readonly parts: readonly Tab<PlanPart>[];
  readonly active: PlanPart;
  /** The part that is shown, when its tab stands for several. */
  readonly part?: PlanPart;
  readonly onChange: (part: PlanPart) => void;
  /** Stays in view over the tabs. */
  readonly head?: ReactNode;
};

/** A column beside the plan with a few of its parts. */
export function PlanSide({ plan, label, side, width, parts, active, part, onChange, head }: PlanSideProps) {
  const { color } = useTheme();
  return (
    <View
      role="complementary"
      aria-label={label}
      style={{
        width,
        backgroundColor: color.sheet,
        borderColor: color.rule,
        ...(side === 'left' ? { borderRightWidth: line.hair } : { borderLeftWidth: line.hair }),
      }}
    >
      {head ? <View style={{ padding: space.l, paddingBottom: space.s }}>{head}</View> : null}
      <View style={{ flex: 1, paddingTop: space.xs }}>
        <View style={{ paddingHorizontal: space.l }}>
          <Tabs label={label} tabs={parts} active={active} onChange={onChange} />
        </View>
        <ScrollView contentContainerStyle={{ padding: space.l }}>
          {part === undefined ? (
            <PlanPartView key={active} plan={plan} part={active} />
          ) : (
            <PlanGroupView plan={plan} part={part} />
          )}
        </ScrollView>
      </View>
    </View>
  );
}
