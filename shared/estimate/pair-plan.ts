import type { LayoutDocument, NeverTogether, PlacedAntenna, Radio } from '../layout/document';
import { SPEED_OF_LIGHT } from '../units/constants';
import { carrierFrequencies, channelFrequencies, groupFrequencies } from '../radio/band-frequencies';
import { overloadNeedDb } from '../radio/overload';
import { pathLossesDb } from '../radio/path-losses';
import { transmitterNoiseNeedDb } from '../radio/transmitter-noise';
import type { Mechanism } from './estimate-result';
import { hasWire } from './scene-from-document';

/** A mechanism of a pair: what it needs, and where it is looked at. */
export type PlannedMechanism = {
  readonly mechanism: Mechanism;
  readonly neededDb: number;
  /** Frequencies, Hz, and what feeders and filters add there, dB. */
  readonly points: readonly { readonly frequency: number; readonly lossesDb: number }[];
};

/** An ordered pair of antennas of different radios, of which the first transmits and the second receives. */
export type PlannedPair = {
  readonly from: string;
  readonly into: string;
  /** The rule that keeps the two apart; such a pair is not judged. */
  readonly rule: NeverTogether | null;
  readonly mechanisms: readonly PlannedMechanism[];
};

/** What is to be computed for a layout wherever its antennas stand. */
export type PairPlan = {
  readonly pairs: readonly PlannedPair[];
  /** At which frequency an antenna's pattern is shown, Hz, by antenna. */
  readonly patternFrequency: ReadonlyMap<string, number>;
  /** The frequencies at which the layout is solved, Hz, ascending; each stands for those within 0.25 % of it. */
  readonly frequencies: readonly number[];
};

/** The plan of a layout; depends on radios, rules, parts and feeders, not on positions. */
export function planPairs(document: LayoutDocument): PairPlan {
  const antennas = Object.values(document.antennas).sort((a, b) => (a.id < b.id ? -1 : 1));
  const rules = rulesByRadios(document);
  const pairs = antennas.flatMap((from) =>
    antennas.flatMap((into) => planPair(document, rules, from, into) ?? []),
  );
  const patternFrequency = new Map<string, number>();
  for (const antenna of antennas) {
    const frequency = frequencyOfPattern(antenna, radioOf(document, antenna));
    if (frequency !== null) patternFrequency.set(antenna.id, frequency);
  }
  const wired = new Set(antennas.filter(hasWire).map(({ id }) => id));
  const asked = pairs
    .filter(({ from, into, rule }) => rule === null && wired.has(from) && wired.has(into))
    .flatMap(({ mechanisms }) => mechanisms.flatMap(({ points }) => points.map((point) => point.frequency)));
  return { pairs, patternFrequency, frequencies: groupFrequencies([...asked, ...patternFrequency.values()]) };
}

/** Whether two documents have the same plan. */
export function hasSamePlan(one: LayoutDocument, other: LayoutDocument): boolean {
  if (one.antennas === other.antennas && one.radios === other.radios) {
    return one.neverTogether === other.neverTogether;
  }
  if (one.radios !== other.radios || one.neverTogether !== other.neverTogether) return false;
  const ids = Object.keys(one.antennas);
  return (
    ids.length === Object.keys(other.antennas).length &&
    ids.every((id) => {
      const a = one.antennas[id]!;
      const b = other.antennas[id];
      return (
        a === b ||
        (b !== undefined && a.part === b.part && a.radioId === b.radioId && a.feederLossDb === b.feederLossDb)
      );
    })
  );
}

function planPair(
  document: LayoutDocument,
  rules: ReadonlyMap<string, NeverTogether>,
  from: PlacedAntenna,
  into: PlacedAntenna,
): PlannedPair | null {
  const source = radioOf(document, from);
  const victim = radioOf(document, into);
  if (source === null || victim === null || source.id === victim.id) return null;
  const carriers = carrierFrequencies(source);
  const channels = channelFrequencies(victim);
  if (carriers.length === 0 || channels.length === 0) return null;
  const feederLossesDb = from.feederLossDb + into.feederLossDb;
  const points = (frequencies: readonly number[]) =>
    frequencies.map((frequency) => ({
      frequency,
      lossesDb: pathLossesDb(source, victim, feederLossesDb, frequency),
    }));
  return {
    from: from.id,
    into: into.id,
    rule: rules.get(pairKey(source.id, victim.id)) ?? null,
    mechanisms: [
      { mechanism: 'overload', neededDb: overloadNeedDb(source, victim), points: points(carriers) },
      {
        mechanism: 'transmitter noise',
        neededDb: transmitterNoiseNeedDb(source, victim),
        points: points(channels),
      },
    ],
  };
}

/** Middle of what its radio transmits, else of what it receives, else where its first wire is a quarter or half wave. */
function frequencyOfPattern(antenna: PlacedAntenna, radio: Radio | null): number | null {
  const wire = antenna.part.elements.find((element) => element.kind === 'wire');
  if (wire === undefined) return null;
  const band = radio
    ? ((radio.receiveOnly ? undefined : radio.transmitBands[0]) ?? radio.receiveBands[0])
    : undefined;
  if (band) return (band.from + band.to) / 2;
  return wire.quarterWaveAt ?? resonance(wire.length, wire.form);
}

/** Hz of the free-space quarter wave of a whip or half wave of a dipole of that length, m. */
function resonance(length: number, form: 'whip' | 'dipole'): number {
  return SPEED_OF_LIGHT / ((form === 'whip' ? 4 : 2) * length);
}

function radioOf(document: LayoutDocument, antenna: PlacedAntenna): Radio | null {
  return antenna.radioId === null ? null : (document.radios[antenna.radioId] ?? null);
}

function rulesByRadios(document: LayoutDocument): ReadonlyMap<string, NeverTogether> {
  const rules = Object.values(document.neverTogether);
  return new Map(rules.map((rule) => [pairKey(...rule.radioIds), rule]));
}

function pairKey(one: string, other: string): string {
  return one < other ? `${one} ${other}` : `${other} ${one}`;
}
