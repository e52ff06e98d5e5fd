import { describeError } from '@/components/api/api-problem';
import { useLayout } from '@/components/api/use-layout';
import { useSizeClass } from '@/components/theme/use-size-class';
import { LinkButton } from '@/components/ui/link';
import { ErrorState, LoadingState } from '@/components/ui/states';
import type { Layout } from '@/shared/api/layouts';
import { usePageTitle } from './page-title';
import { PlanOnDesktop } from './plan-on-desktop';
import { PlanOnPhone } from './plan-on-phone';
import { PlanOnTablet } from './plan-on-tablet';
import { usePlan } from './plan-state';
import { ScreenFrame } from './screen-frame';

/** A layout: the plan, what it comes to, who is here, and what is said about it. */
export function PlanScreen({ layoutId }: { readonly layoutId: string }) {
  const layout = useLayout(layoutId);
  if (layout.data) return <OpenPlan key={layoutId} layout={layout.data} />;
  return (
    <ScreenFrame title="Layout">
      {layout.isError ? (
        <ErrorState
          title="The layout did not open"
          text={describeError(layout.error)}
          onRetry={() => void layout.refetch()}
        >
          <LinkButton href="/jobs" label="To the jobs" />
        </ErrorState>
      ) : (
        <LoadingState label="Opening the layout" />
      )}
    </ScreenFrame>
  );
}

const ARRANGEMENTS = { phone: PlanOnPhone, tablet: PlanOnTablet, desktop: PlanOnDesktop } as const;

function OpenPlan({ layout }: { readonly layout: Layout }) {
  usePageTitle(`${layout.name}, ${layout.job.name}`);
  const plan = usePlan(layout);
  const Arrangement = ARRANGEMENTS[useSizeClass()];
  return <Arrangement plan={plan} />;
}
