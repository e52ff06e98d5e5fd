import {
  DOCUMENT_VERSION,
  type KeepOut,
  type LayoutDocument,
  type MountPoint,
  type Obstacle,
  type Platform,
  type PlatformKind,
  type Surface,
} from '../document';
import { idFromName } from '../named-id';

/** One dimension of a starter that can be typed, m. */
export type StarterDimension = {
  readonly key: string;
  readonly label: string;
  readonly initial: number;
  readonly least: number;
  readonly most: number;
  /** Keys of the obstacles whose height it is; none for length, width and height. */
  readonly obstacles: readonly string[];
};

/** Dimensions by key, m. */
export type Dimensions = Readonly<Record<string, number>>;

/** An outline to begin a survey with; drawn for this product, of no maker's vehicle or building. */
export type StarterPlatform = {
  readonly id: string;
  readonly name: string;
  readonly kind: PlatformKind;
  readonly summary: string;
  /** Always `length`, `width` and `height`, then the heights of what stands on it. */
  readonly dimensions: readonly StarterDimension[];
  draw(dimensions: Dimensions): StarterDrawing;
};

/** What a starter draws: objects by a key that is theirs for ever, for their identifier is made of it. */
export type StarterDrawing = Pick<Platform, 'outline' | 'datum' | 'forwardAxis'> & {
  readonly surfaces: Keyed<Surface>;
  readonly obstacles: Keyed<Obstacle>;
  readonly keepOuts: Keyed<KeepOut>;
  readonly mountPoints: Keyed<MountPoint>;
  readonly cableEntries: Keyed<MountPoint>;
};
type Keyed<T> = Readonly<Record<string, Omit<T, 'id'>>>;

/** The value of a dimension. @throws Error when the starter does not have it. */
export function dimension(dimensions: Dimensions, key: string): number {
  const value = dimensions[key];
  if (value === undefined) throw new Error(`no dimension is called ${key}`);
  return value;
}

/** Length and width, which every drawing needs. */
export function footprint(dimensions: Dimensions): { readonly length: number; readonly width: number } {
  return { length: dimension(dimensions, 'length'), width: dimension(dimensions, 'width') };
}

/** The first three dimensions of every starter. */
export function overall(
  length: readonly [number, number, number],
  width: readonly [number, number, number],
  height: readonly [number, number, number],
  heightLabel: string,
): StarterDimension[] {
  return [
    extra('length', 'Length', ...length),
    extra('width', 'Width', ...width),
    extra('height', heightLabel, ...height),
  ];
}

/** One more dimension: what is typed first, the least and the most, m, and the obstacles whose height it is. */
export function extra(
  key: string,
  label: string,
  initial: number,
  least: number,
  most: number,
  obstacles: readonly string[] = [],
): StarterDimension {
  return { key, label, initial, least, most, obstacles };
}

/** The document that a starter's drawing makes: no radios and no antennas yet. */
export function documentOf(starter: StarterPlatform, dimensions: Dimensions): LayoutDocument {
  const drawing = starter.draw(dimensions);
  const { length, width } = footprint(dimensions);
  return {
    version: DOCUMENT_VERSION,
    platform: {
      kind: starter.kind,
      name: starter.name,
      starter: starter.id,
      length,
      width,
      height: dimension(dimensions, 'height'),
      outline: drawing.outline,
      datum: drawing.datum,
      forwardAxis: drawing.forwardAxis,
    },
    surfaces: filed<Surface>(starter.id, 'surfaces', drawing.surfaces),
    obstacles: filed<Obstacle>(starter.id, 'obstacles', drawing.obstacles),
    keepOuts: filed<KeepOut>(starter.id, 'keepOuts', drawing.keepOuts),
    mountPoints: filed<MountPoint>(starter.id, 'mountPoints', drawing.mountPoints),
    cableEntries: filed<MountPoint>(starter.id, 'cableEntries', drawing.cableEntries),
    radios: {},
    neverTogether: {},
    antennas: {},
  };
}

/** Identifier of what a starter draws under a key. */
export function starterObjectId(starterId: string, collection: string, key: string): string {
  return idFromName(`starter/${starterId}/${collection}/${key}`);
}

function filed<T extends { readonly id: string }>(
  starterId: string,
  collection: string,
  objects: Keyed<T>,
): Record<string, T> {
  return Object.fromEntries(
    Object.entries(objects).map(([key, object]) => {
      const id = starterObjectId(starterId, collection, key);
      return [id, { id, ...object } as T];
    }),
  );
}
