import type { AntennaResult, Estimate, PairResult } from '@/shared/estimate/estimate-result';
import type { PlacedAntenna } from '@/shared/layout/document';
import { readLength } from './drawn-length';
import { isWorse } from './links';
import { marginText } from './margin-text';
import type { LengthUnit } from './round-length';

/** What a screen reader says of an antenna: mark and name, position from the datum, worst margin. */
export function speakAntenna(
  antenna: PlacedAntenna,
  estimate: Estimate | null,
  unit: LengthUnit,
  labelOf: (antennaId: string) => string,
): string {
  const name = antenna.name && antenna.name !== antenna.label ? ` ${antenna.name}` : '';
  const place = `x ${readLength(antenna.x, unit)}, y ${readLength(antenna.y, unit)}`;
  return `${antenna.label}${name}, ${place}, ${speakWorst(antenna.id, estimate, labelOf)}`;
}

function speakWorst(id: string, estimate: Estimate | null, labelOf: (id: string) => string): string {
  const worst = worstPairOf(id, estimate);
  if (!worst) return noPairs(estimate?.antennas[id]);
  if (worst.marginDb === null || worst.state === 'not held') return 'worst margin not held';
  const other = worst.from === id ? `into ${labelOf(worst.into)}` : `from ${labelOf(worst.from)}`;
  return `worst margin ${marginText(worst.marginDb)} dB ${other}, ${worst.state}`;
}

function noPairs(result: AntennaResult | undefined): string {
  return result?.reason ? result.reason.message : 'no pairs to judge';
}

/** The pair that an antenna is worst in; pairs that are never together count last. */
export function worstPairOf(id: string, estimate: Estimate | null): PairResult | null {
  let worst: PairResult | null = null;
  for (const pair of estimate?.pairs ?? []) {
    if (pair.from !== id && pair.into !== id) continue;
    if (pair.state === 'never together') continue;
    if (worst === null || isWorse(pair, worst)) worst = pair;
  }
  return worst;
}
