import type { PairResult } from '@/shared/estimate/estimate-result';

/**
 * A margin with its sign in whole decibels; with a tenth where rounding would tell another state (below 0 is
 * lacking, below 6 is tight).
 */
export function marginText(marginDb: number): string {
  const whole = Math.round(marginDb);
  const misleads = (whole >= 0 && marginDb < 0) || (whole >= 6 && marginDb < 6) || whole === 0;
  const digits = misleads ? 1 : 0;
  // toward the worse side: 5.96 must not read 6.0
  const value = misleads ? Math.floor(marginDb * 10) / 10 : whole;
  const text = Math.abs(value).toFixed(digits);
  if (Number(text) === 0) return marginDb < 0 ? '−0.1' : '0';
  return `${value < 0 ? '−' : '+'}${text}`;
}

/** What a link says of its pair: margin first, isolation second; words where there is no number to hold. */
export function pillText(pair: PairResult): { readonly first: string; readonly second: string | null } {
  if (pair.state === 'never together') return { first: 'never together', second: null };
  if (pair.state === 'not held' || pair.marginDb === null) return { first: 'not held', second: null };
  return {
    first: marginText(pair.marginDb),
    second: pair.isolationDb === null ? null : `${Math.round(pair.isolationDb)} dB`,
  };
}
