/** A pair is clear from this margin on, dB. */
export const CLEAR_MARGIN_DB = 6;

/** States of a margin that is known. */
export type MarginState = 'clear' | 'tight' | 'lacking';

/** *lacking* below 0 dB, *clear* from 6 dB and at least the model's uncertainty (dB) on, *tight* between. */
export function marginState(marginDb: number, uncertaintyDb: number): MarginState {
  if (marginDb < 0) return 'lacking';
  return marginDb >= Math.max(CLEAR_MARGIN_DB, uncertaintyDb) ? 'clear' : 'tight';
}
