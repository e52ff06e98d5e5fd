import {
  DOCUMENT_VERSION,
  type AntennaPart,
  type Band,
  type CableEntry,
  type CollectionName,
  type Collections,
  type DeclaredElement,
  type FilterRejection,
  type KeepOut,
  type LayoutDocument,
  type MountPoint,
  type NeverTogether,
  type Obstacle,
  type PlacedAntenna,
  type Platform,
  type Radio,
  type Surface,
  type WireElement,
} from '../document';
import { LIMITS } from '../limits';
import {
  booleanRule,
  idRule,
  listRule,
  nameRule,
  nullableRule,
  numberRule,
  objectRule,
  oneOfRule,
  outlineRule,
  positiveRule,
  recordRule,
  taggedRule,
  type FieldRules,
  type Rule,
} from './rule';

const coordinate = numberRule(-LIMITS.extent, LIMITS.extent, 'm');
const length = positiveRule(LIMITS.extent, 'm');
const height = numberRule(0, LIMITS.extent, 'm');
const frequency = numberRule(LIMITS.frequencyLow, LIMITS.frequencyHigh, 'Hz');
const attenuationDb = numberRule(0, 200, 'dB');
const offset = objectRule<{ x: number; y: number; z: number }>({
  x: coordinate,
  y: coordinate,
  z: coordinate,
});

const band = objectRule<Band>({ from: frequency, to: frequency }, ordered);

function ordered({ from, to }: Band, path: string, report: (path: string, message: string) => void): void {
  if (from >= to) report(path === '' ? 'to' : `${path}.to`, 'must be above the lower end of the band');
}

/** The largest number of objects in each collection. */
export const COLLECTION_LIMITS: Readonly<Record<CollectionName, number>> = {
  surfaces: LIMITS.surfaces,
  obstacles: LIMITS.obstacles,
  keepOuts: LIMITS.keepOuts,
  mountPoints: LIMITS.mountPoints,
  cableEntries: LIMITS.cableEntries,
  radios: LIMITS.radios,
  neverTogether: LIMITS.neverTogether,
  antennas: LIMITS.antennas,
};

export const PLATFORM_RULES: FieldRules<Platform> = {
  kind: oneOfRule(['vehicle', 'rooftop', 'handset']),
  name: nameRule,
  starter: nameRule,
  length,
  width: length,
  height,
  outline: outlineRule,
  datum: nameRule,
  forwardAxis: nameRule,
};

const SURFACE_RULES: FieldRules<Surface> = {
  id: idRule,
  name: nameRule,
  outline: outlineRule,
  height,
  conducting: booleanRule,
};

const OBSTACLE_RULES: FieldRules<Obstacle> = {
  id: idRule,
  name: nameRule,
  outline: outlineRule,
  base: height,
  height: length,
  metal: booleanRule,
};

const KEEP_OUT_RULES: FieldRules<KeepOut> = {
  id: idRule,
  name: nameRule,
  outline: outlineRule,
  reason: nameRule,
};

const MARK_RULES: FieldRules<MountPoint & CableEntry> = {
  id: idRule,
  name: nameRule,
  x: coordinate,
  y: coordinate,
};

const rejection = objectRule<FilterRejection>(
  { from: frequency, to: frequency, rejectionDb: attenuationDb },
  ordered,
);

export const RADIO_RULES: FieldRules<Radio> = {
  id: idRule,
  name: nameRule,
  receiveOnly: booleanRule,
  transmitBands: listRule(band, 0, LIMITS.bandsPerRadio),
  receiveBands: listRule(band, 0, LIMITS.bandsPerRadio),
  power: numberRule(0, 1e6, 'W'),
  noiseDbcPerHz: numberRule(-250, 0, 'dBc/Hz'),
  noiseFigureDb: numberRule(0, 60, 'dB'),
  bandwidth: numberRule(1, 1e10, 'Hz'),
  overloadDbm: numberRule(-150, 60, 'dBm'),
  rejections: listRule(rejection, 0, LIMITS.rejectionsPerRadio),
};

const NEVER_TOGETHER_RULES: FieldRules<NeverTogether> = {
  id: idRule,
  radioIds: listRule(idRule, 2, 2),
  rule: nameRule,
};

const WIRE_ELEMENT_RULES: FieldRules<WireElement> = {
  id: idRule,
  kind: oneOfRule(['wire']),
  form: oneOfRule(['whip', 'dipole']),
  length: positiveRule(100, 'm'),
  radius: positiveRule(1, 'm'),
  quarterWaveAt: nullableRule(frequency),
  offset,
};

const DECLARED_ELEMENT_RULES: FieldRules<DeclaredElement> = {
  id: idRule,
  kind: oneOfRule(['declared']),
  form: nameRule,
  gainDbi: numberRule(-60, 60, 'dBi'),
  polarisation: oneOfRule(['vertical', 'horizontal', 'circular']),
  band,
  offset,
};

const element: Rule = taggedRule({
  wire: objectRule<WireElement>(WIRE_ELEMENT_RULES, (wire, path, report) => {
    if (wire.radius * 2 >= wire.length)
      report(path === '' ? 'radius' : `${path}.radius`, 'is too large for the length');
  }),
  declared: objectRule(DECLARED_ELEMENT_RULES),
});

export const ANTENNA_PART_RULES: FieldRules<AntennaPart> = {
  name: nameRule,
  elements: (value, path, report) => {
    listRule(element, 1, LIMITS.elementsPerPart)(value, path, report);
    if (!Array.isArray(value)) return;
    const ids = value.map((item: unknown) => (item as { id?: unknown } | null)?.id);
    if (new Set(ids).size < ids.length) report(path, 'names an element twice');
  },
};

const ANTENNA_RULES: FieldRules<PlacedAntenna> = {
  id: idRule,
  label: nameRule,
  name: nameRule,
  part: objectRule(ANTENNA_PART_RULES),
  x: coordinate,
  y: coordinate,
  mountHeight: numberRule(0, LIMITS.extent, 'm'),
  azimuthDeg: numberRule(-360, 360, 'degrees'),
  tiltDeg: numberRule(0, 90, 'degrees'),
  radioId: nullableRule(idRule),
  feederLossDb: attenuationDb,
};

/** What the fields of the objects in each collection may be. */
export const COLLECTION_RULES: { readonly [C in CollectionName]: FieldRules<Collections[C][string]> } = {
  surfaces: SURFACE_RULES,
  obstacles: OBSTACLE_RULES,
  keepOuts: KEEP_OUT_RULES,
  mountPoints: MARK_RULES,
  cableEntries: MARK_RULES,
  radios: RADIO_RULES,
  neverTogether: NEVER_TOGETHER_RULES,
  antennas: ANTENNA_RULES,
};

/** Names of the collections, in the order of the document. */
export const COLLECTION_NAMES = Object.keys(COLLECTION_RULES) as CollectionName[];

/** The same as one rule per collection, for a whole object. */
export const OBJECT_RULES: Readonly<Record<CollectionName, Rule>> = {
  surfaces: objectRule(SURFACE_RULES),
  obstacles: objectRule(OBSTACLE_RULES),
  keepOuts: objectRule(KEEP_OUT_RULES),
  mountPoints: objectRule(MARK_RULES),
  cableEntries: objectRule(MARK_RULES),
  radios: objectRule(RADIO_RULES),
  neverTogether: objectRule(NEVER_TOGETHER_RULES),
  antennas: objectRule(ANTENNA_RULES),
};

/** The form of a whole document of the current version; references between its objects are `integrity.ts`'s. */
export const documentRule: Rule = objectRule<LayoutDocument>({
  version: oneOfRule([DOCUMENT_VERSION]),
  platform: objectRule(PLATFORM_RULES),
  surfaces: recordRule(OBJECT_RULES.surfaces, COLLECTION_LIMITS.surfaces),
  obstacles: recordRule(OBJECT_RULES.obstacles, COLLECTION_LIMITS.obstacles),
  keepOuts: recordRule(OBJECT_RULES.keepOuts, COLLECTION_LIMITS.keepOuts),
  mountPoints: recordRule(OBJECT_RULES.mountPoints, COLLECTION_LIMITS.mountPoints),
  cableEntries: recordRule(OBJECT_RULES.cableEntries, COLLECTION_LIMITS.cableEntries),
  radios: recordRule(OBJECT_RULES.radios, COLLECTION_LIMITS.radios),
  neverTogether: recordRule(OBJECT_RULES.neverTogether, COLLECTION_LIMITS.neverTogether),
  antennas: recordRule(OBJECT_RULES.antennas, COLLECTION_LIMITS.antennas),
});
