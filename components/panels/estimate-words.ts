import { marginText } from '@/components/canvas/margin-text';
import { isWorse } from '@/components/canvas/links';
import type { Estimate, Mechanism, PairResult, PairState } from '@/shared/estimate/estimate-result';

/** Label of an antenna by its id. */
export type LabelOf = (antennaId: string) => string;

/** The one sentence that matters, with the state that its mark shows; null where there is nothing to judge. */
export type Headline = {
  readonly state: PairState | null;
  readonly sentence: string;
  readonly pair: PairResult | null;
};

/** A frequency in short: 155.5 MHz, 2.441 GHz. */
export function frequencyText(hertz: number): string {
  const megahertz = hertz / 1e6;
  if (megahertz >= 10_000) return `${trimmed(megahertz / 1000, 2)} GHz`;
  return `${trimmed(megahertz, megahertz < 1000 ? 1 : 0)} MHz`;
}

/** A mechanism as it is said in a line. */
export const MECHANISM_WORDS: Readonly<Record<Mechanism, string>> = {
  overload: 'overload',
  'transmitter noise': 'noise',
};

/** The pair that the headline speaks of: the worst that is judged, else the first that is not held. */
export function worstPair(estimate: Estimate): PairResult | null {
  let worst: PairResult | null = null;
  for (const pair of estimate.pairs) {
    if (pair.state === 'never together' || pair.state === 'not held') continue;
    if (worst === null || isWorse(pair, worst)) worst = pair;
  }
  return worst ?? estimate.pairs.find(({ state }) => state === 'not held') ?? null;
}

/** What the estimate comes to, in one sentence. */
export function headlineOf(estimate: Estimate | null, labelOf: LabelOf): Headline {
  if (estimate === null) return { state: null, sentence: 'The estimate is on its way', pair: null };
  const pair = worstPair(estimate);
  if (pair === null) {
    const sentence =
      estimate.pairs.length > 0 ? 'No pair needs to be judged' : 'Two radios on the plan make the first pair';
    return { state: null, sentence, pair: null };
  }
  const sentence = pairSentence(pair, labelOf);
  // What no model holds is not clear: the counts below say how many those are.
  const open = pair.state === 'clear' && estimate.counts['not held'] > 0;
  return {
    state: pair.state,
    sentence: open ? sentence.replace('All clear', 'Clear where held') : sentence,
    pair,
  };
}

/** A pair in one sentence: "A2 into A3 lacks 8 dB". */
export function pairSentence(pair: PairResult, labelOf: LabelOf): string {
  const who = `${labelOf(pair.from)} into ${labelOf(pair.into)}`;
  const margin = pair.marginDb === null ? '' : marginText(pair.marginDb).slice(1) || '0';
  switch (pair.state) {
    case 'lacking':
      return `${who} lacks ${margin} dB`;
    case 'tight':
      return `${who} is tight, ${margin} dB left`;
    case 'clear':
      return `All clear, ${who} has ${margin} dB left`;
    case 'not held':
      return `${who} is not held`;
    case 'never together':
      return `${who} never together`;
  }
}

/** How many pairs are in each state, with the model and what it assumes. */
export function countsLine(estimate: Estimate): string {
  const order: readonly PairState[] = ['lacking', 'not held', 'tight', 'clear', 'never together'];
  const counts = order.filter((state) => estimate.counts[state] > 0);
  const words = counts.map((state) => `${estimate.counts[state]} ${state}`).join(', ');
  const model = `Live estimate, ${estimate.assumption}.`;
  return words === '' ? model : `${words}. ${model}`;
}

/** Isolation, frequency and mechanism of a pair in a few words; the reason where there is no number. */
export function pairBasis(pair: PairResult): string {
  if (pair.state === 'never together') return pair.reason?.message ?? 'kept apart by a rule';
  if (pair.isolationDb === null || pair.frequency === null || pair.mechanism === null) {
    return pair.reason?.message ?? 'no number';
  }
  const words = `${Math.round(pair.isolationDb)} dB at ${frequencyText(pair.frequency)}, ${MECHANISM_WORDS[pair.mechanism]}`;
  return pair.state === 'not held' && pair.reason ? pair.reason.message : words;
}

/** The margin of a pair as its row shows it. */
export function pairMargin(pair: PairResult): string {
  if (pair.state === 'never together') return '–';
  if (pair.state === 'not held' || pair.marginDb === null) return 'not held';
  return marginText(pair.marginDb);
}

function trimmed(value: number, digits: number): string {
  return String(Number(value.toFixed(digits)));
}
