import type { Point } from '../geometry/point';

/**
 * The layout document: everything a layout is, by value, in SI units.
 * Axes: x along the platform's forward axis (true north on a rooftop), y to its left, z up; every position is
 * measured from the datum. Angles named `azimuthDeg` are clockwise from the forward axis, as a compass reads.
 */

/** Current version of the document; older ones are upgraded when read (`upgrades.ts`). */
export const DOCUMENT_VERSION = 1;

export type { Point };

/** A band of frequencies in Hz, `from` < `to`. */
export type Band = { readonly from: number; readonly to: number };

export type PlatformKind = 'vehicle' | 'rooftop' | 'handset';

/** What the antennas stand on; the collections of the document hang on it. */
export type Platform = {
  readonly kind: PlatformKind;
  readonly name: string;
  /** Starter outline it was made from. */
  readonly starter: string;
  readonly length: number;
  readonly width: number;
  /** Height of the main surface above the ground (vehicles, roofs) or thickness of the board. */
  readonly height: number;
  /** Outer edge, anticlockwise. */
  readonly outline: readonly Point[];
  /** Where the datum can be found with a tape measure. */
  readonly datum: string;
  /** What the x axis points at: "forward", "true north", "top edge". */
  readonly forwardAxis: string;
};

/** An area at one height that an antenna can stand on. `height` is above the ground. */
export type Surface = {
  readonly id: string;
  readonly name: string;
  readonly outline: readonly Point[];
  readonly height: number;
  readonly conducting: boolean;
};

/** A body in the way: from `base` above the surface it stands on, `height` tall. */
export type Obstacle = {
  readonly id: string;
  readonly name: string;
  readonly outline: readonly Point[];
  readonly base: number;
  readonly height: number;
  readonly metal: boolean;
};

/** An area where nothing may be mounted, with its reason. */
export type KeepOut = {
  readonly id: string;
  readonly name: string;
  readonly outline: readonly Point[];
  readonly reason: string;
};

/** An existing hole, bracket or rail position. */
export type MountPoint = {
  readonly id: string;
  readonly name: string;
  readonly x: number;
  readonly y: number;
};

/** Where feeders go through. */
export type CableEntry = {
  readonly id: string;
  readonly name: string;
  readonly x: number;
  readonly y: number;
};

/** Rejection of a filter in the line of a radio, over a band. */
export type FilterRejection = { readonly from: number; readonly to: number; readonly rejectionDb: number };

/** What both directions of a radio do, as its datasheet says. */
export type Radio = {
  readonly id: string;
  readonly name: string;
  readonly receiveOnly: boolean;
  readonly transmitBands: readonly Band[];
  readonly receiveBands: readonly Band[];
  /** Carrier power at the connector, W; 0 when it only receives. */
  readonly power: number;
  /** Broadband transmitter noise, dBc/Hz. */
  readonly noiseDbcPerHz: number;
  readonly noiseFigureDb: number;
  /** Receiver bandwidth, Hz. */
  readonly bandwidth: number;
  /** Strongest off-channel carrier at the connector that the receiver bears, dBm. */
  readonly overloadDbm: number;
  readonly rejections: readonly FilterRejection[];
};

/** Two radios of which one need not receive while the other transmits, and the rule that sees to it. */
export type NeverTogether = {
  readonly id: string;
  readonly radioIds: readonly [string, string];
  readonly rule: string;
};

/** A straight wire: a whip is fed at its foot on the surface, a dipole at its centre. */
export type WireElement = {
  readonly id: string;
  readonly kind: 'wire';
  readonly form: 'whip' | 'dipole';
  /** Whole length from end to end, m. */
  readonly length: number;
  readonly radius: number;
  /** The frequency that the length was worked out from, Hz; null when the length was typed. */
  readonly quarterWaveAt: number | null;
  /** From the part's reference point, m, before azimuth and tilt. */
  readonly offset: { readonly x: number; readonly y: number; readonly z: number };
};

/** An element known by its datasheet only; not computed yet. */
export type DeclaredElement = {
  readonly id: string;
  readonly kind: 'declared';
  readonly form: string;
  readonly gainDbi: number;
  readonly polarisation: 'vertical' | 'horizontal' | 'circular';
  readonly band: Band;
  readonly offset: { readonly x: number; readonly y: number; readonly z: number };
};

export type Element = WireElement | DeclaredElement;

/** An antenna as it stands on the shelf: one or more elements under one cover. */
export type AntennaPart = { readonly name: string; readonly elements: readonly Element[] };

/** An antenna of the layout, its part by value. */
export type PlacedAntenna = {
  readonly id: string;
  /** Short mark on the drawing: A1, A2 ... */
  readonly label: string;
  readonly name: string;
  readonly part: AntennaPart;
  readonly x: number;
  readonly y: number;
  /** Height above the surface of the reference point: a whip's foot, a dipole's centre. */
  readonly mountHeight: number;
  readonly azimuthDeg: number;
  /** From upright, toward the azimuth. */
  readonly tiltDeg: number;
  readonly radioId: string | null;
  /** Loss of the feeder between radio and antenna, dB. */
  readonly feederLossDb: number;
};

export type LayoutDocument = {
  readonly version: typeof DOCUMENT_VERSION;
  readonly platform: Platform;
  readonly surfaces: Readonly<Record<string, Surface>>;
  readonly obstacles: Readonly<Record<string, Obstacle>>;
  readonly keepOuts: Readonly<Record<string, KeepOut>>;
  readonly mountPoints: Readonly<Record<string, MountPoint>>;
  readonly cableEntries: Readonly<Record<string, CableEntry>>;
  readonly radios: Readonly<Record<string, Radio>>;
  readonly neverTogether: Readonly<Record<string, NeverTogether>>;
  readonly antennas: Readonly<Record<string, PlacedAntenna>>;
};

/** The collections of the document, by name. */
export type Collections = Pick<
  LayoutDocument,
  | 'surfaces'
  | 'obstacles'
  | 'keepOuts'
  | 'mountPoints'
  | 'cableEntries'
  | 'radios'
  | 'neverTogether'
  | 'antennas'
>;
export type CollectionName = keyof Collections;
export type ObjectOf<C extends CollectionName> = Collections[C][string];
