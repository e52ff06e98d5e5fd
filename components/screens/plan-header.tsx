import { View } from 'react-native';
import { line, measure, space } from '@/components/theme/tokens';
import { useTheme } from '@/components/theme/use-theme';
import { Icon } from '@/components/ui/icon';
import { LinkArea } from '@/components/ui/link';
import { Mark } from '@/components/ui/mark';
import { Chip } from '@/components/ui/state-mark';
import { Heading, Text } from '@/components/ui/text';
import type { ReactNode } from 'react';
import type { Plan } from './plan-state';
import { PlanStatus } from './plan-status';
import { UndoButtons } from './plan-tools';

type PlanHeaderProps = { readonly plan: Plan; readonly children?: ReactNode };

/** The bar over the plan: where one is, what the working copy is after, whether all is saved. */
export function PlanHeader({ plan, children }: PlanHeaderProps) {
  const { layout, state } = plan;
  return (
    <Bar>
      <LinkArea href="/jobs" label="Elbowroom, to the jobs">
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.s }}>
          <Mark />
          <Text variant="title">Elbowroom</Text>
        </View>
      </LinkArea>
      <View
        style={{ flex: 1, flexDirection: 'row', alignItems: 'center', gap: space.s, minWidth: space.none }}
      >
        <LinkArea href={`/jobs/${layout.job.id}`} label={`${layout.job.name}, to the job`}>
          <Text tone="soft" numberOfLines={1}>{`${layout.job.name} / ${layout.platform.name} /`}</Text>
        </LinkArea>
        <Heading level={1} variant="strong" numberOfLines={1} style={{ flexShrink: 1 }}>
          {layout.name}
        </Heading>
        <View>
          <Chip text={`working copy, ${state}`} />
        </View>
        <PlanStatus plan={plan} />
      </View>
      <UndoButtons plan={plan} />
      {children}
    </Bar>
  );
}

/** The same on a phone: back, name, undo. */
export function PlanHeaderNarrow({ plan }: { readonly plan: Plan }) {
  const { layout, state } = plan;
  return (
    <Bar>
      <LinkArea href={`/jobs/${layout.job.id}`} label={`Back to ${layout.job.name}`}>
        <View style={{ width: measure.header - space.m, alignItems: 'center' }}>
          <Icon name="back" />
        </View>
      </LinkArea>
      <View style={{ flex: 1, minWidth: space.none }}>
        <Heading level={1} variant="strong" numberOfLines={1}>
          {`${layout.job.name}, ${layout.name}`}
        </Heading>
        <View style={{ flexDirection: 'row', gap: space.s }}>
          <Text variant="smallFigures" tone="soft" numberOfLines={1}>
            {state}
          </Text>
          <PlanStatus plan={plan} />
        </View>
      </View>
      <UndoButtons plan={plan} />
    </Bar>
  );
}

function Bar({ children }: { readonly children: ReactNode }) {
  const { color } = useTheme();
  return (
    <View
      role="banner"
      style={{
        minHeight: measure.header,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.m,
        paddingHorizontal: space.m,
        borderBottomWidth: line.hair,
        borderColor: color.rule,
        backgroundColor: color.sheet,
      }}
    >
      {children}
    </View>
  );
}
