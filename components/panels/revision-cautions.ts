import type { PlatformKind } from '@/shared/layout/document';

export type Caution = { readonly id: string; readonly title: string; readonly text: string };

/** Stands over the cautions: what goes before this sheet. */
export const CAUTIONS_LEAD =
  'Local codes, the rules of the vehicle, building or device, and licensed practice go before this sheet. Where they differ from it, stop and ask. The isolations are estimates: the measurement after fitting is the proof.';

const DRILLING: Caution = {
  id: 'drilling',
  title: 'Drilling',
  text: 'Find out what lies behind the panel before you mark it: wiring, airbags, fuel and gas lines, tanks, waterproofing, structure. Measure twice from the datum, check the letter of this revision, drill once. Clean off swarf, protect bare metal, seal the hole. Wear eye protection.',
};

const HEIGHT: Caution = {
  id: 'height',
  title: 'Work at height',
  text: 'Use a guarded platform or fall protection made for the place, and never work alone. Not every roof panel bears a person. Tether tools and keep the ground below clear. Stay down in wind, ice and thunder.',
};

const EXPOSURE: Caution = {
  id: 'exposure',
  title: 'RF exposure',
  text: 'Before anybody comes near an antenna, switch off and lock out every transmitter that feeds one here, also those of other owners. Exposure boundaries are not worked out on this sheet: a competent person sets them by the limits in force where you are.',
};

const LIGHTNING: Caution = {
  id: 'lightning',
  title: 'Lightning and earthing',
  text: 'Earthing, bonding and surge protection are done or checked by somebody licensed for it, as the local code says. An antenna is never an air terminal. Stop work and come down at the first thunder.',
};

const BATTERIES: Caution = {
  id: 'batteries',
  title: 'Batteries',
  text: 'Isolate the battery before you touch its wiring, and cover its terminals: a spanner across them welds and burns. Fuse every new lead close to the battery. Do not pierce, crush or heat lithium cells, and charge them only as their maker says.',
};

const BY_KIND: Readonly<Record<PlatformKind, readonly Caution[]>> = {
  vehicle: [DRILLING, HEIGHT, EXPOSURE, LIGHTNING, BATTERIES],
  rooftop: [HEIGHT, LIGHTNING, EXPOSURE, DRILLING, BATTERIES],
  handset: [BATTERIES, EXPOSURE, DRILLING, LIGHTNING, HEIGHT],
};

/** The cautions for a kind of platform, the likeliest harm first; none is ever left out. */
export function cautionsFor(kind: PlatformKind): readonly Caution[] {
  return BY_KIND[kind];
}
