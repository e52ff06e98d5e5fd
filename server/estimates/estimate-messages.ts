import type { Estimate } from '@/shared/estimate/estimate-result';
import type { LayoutDocument } from '@/shared/layout/document';

/** What a worker thread is asked. */
export interface EstimateQuestion {
  readonly id: number;
  readonly layoutId: string;
  readonly document: LayoutDocument;
}

/** What a worker thread answers. */
export type EstimateAnswer =
  | { readonly id: number; readonly ok: true; readonly result: Estimate }
  | { readonly id: number; readonly ok: false; readonly problem: string };
