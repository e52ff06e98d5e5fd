import { useDeferredValue } from 'react';
import { useCalmEditor } from '@/components/canvas/use-calm-editor';
import { ResultHeadline } from '@/components/panels/result-headline';
import type { Plan } from './plan-state';

type PlanHeadlineProps = { readonly plan: Plan; readonly brief?: boolean };

/** The worst pair in one sentence; in view whatever else is open. */
export function PlanHeadline({ plan: { editor, labelOf }, brief }: PlanHeadlineProps) {
  const estimate = useDeferredValue(useCalmEditor(editor, (snapshot) => snapshot.estimate));
  return <ResultHeadline estimate={estimate} labelOf={labelOf} brief={brief} />;
}
