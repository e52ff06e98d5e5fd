/**
 * The vocabulary of the electromagnetics kernel: straight thin wires, alone in free space or over a
 * perfectly conducting plane, and the answers of its models. SI units, time convention e^{+jwt}.
 */

export type Complex = { readonly re: number; readonly im: number };

/** Metres, right-handed; with a plane, the plane is z = 0 and z counts upward. */
export type Vector3 = readonly [number, number, number];

/**
 * A straight wire of `radius` metres. A wire fed at its `start` stands on the plane there; a wire with
 * feed `none` has no port. The port current is positive from start to end. `load` closes the port and is
 * its reference impedance in S, ohm; 50 ohm when absent.
 */
export type Wire = {
  readonly id: string;
  readonly start: Vector3;
  readonly end: Vector3;
  readonly radius: number;
  readonly feed: 'centre' | 'start' | 'none';
  readonly load?: Complex;
};

export type Ground = 'none' | 'plane';

/** An azimuth cut at one elevation above the horizon, every `stepDeg` degrees from +x toward +y. */
export type PatternRequest = { readonly elevationDeg: number; readonly stepDeg: number };

export type Scene = {
  readonly ground: Ground;
  /** Hertz. */
  readonly frequencies: readonly number[];
  readonly wires: readonly Wire[];
  readonly pattern?: PatternRequest;
};

export type Method = 'emf' | 'live' | 'moment';

/**
 * Why a number is not held:
 * `too-thick`: radius above 0.01 wavelength; `too-stout`: length below twenty diameters;
 * `too-short-pieces`: the mesh's pieces are shorter than 2.5 radii; `too-close`: axes closer than ten radii;
 * `touching`: the wires' surfaces meet; `too-long-for-one-piece`: k h / pi above 0.8 in the `emf` model;
 * `not-finite`: a number of the answer is not finite.
 */
export type ValidityCode =
  | 'too-thick'
  | 'too-stout'
  | 'too-short-pieces'
  | 'too-close'
  | 'touching'
  | 'too-long-for-one-piece'
  | 'not-finite';

/** The wires concerned (one, or the two of a pair), the reason's code and a sentence for people. */
export type ValidityEntry = {
  readonly wires: readonly string[];
  readonly code: ValidityCode;
  readonly message: string;
};

/**
 * Azimuth cut of one port driven and all others closed, against the same wire alone on the same ground.
 * Gain counts on the power accepted by the driven port, total polarisation, at least -60 dBi. `rippleDb` is
 * the greatest minus the least of `gainDbi - aloneDbi`; `deepestBearingDeg` the first bearing of the least.
 */
export type Pattern = {
  readonly azimuthDeg: readonly number[];
  readonly gainDbi: readonly number[];
  readonly aloneDbi: readonly number[];
  readonly rippleDb: number;
  readonly deepestBearingDeg: number;
};

/** One frequency's answer; rows and columns follow `ports`, the fed wires in the order of the scene. */
export type FrequencyResult = {
  readonly frequency: number;
  readonly ports: readonly string[];
  /** Impedances at the terminals, ohm; not finite where a port sits at a current zero. */
  readonly z: readonly (readonly Complex[])[];
  /** Power-wave scattering matrix. */
  readonly s: readonly (readonly Complex[])[];
  /** -20 lg |S_ij| from j into i, dB, at most 300; null on the diagonal. */
  readonly isolationDb: readonly (readonly (number | null)[])[];
  readonly patterns: Readonly<Record<string, Pattern>>;
  readonly validity: readonly ValidityEntry[];
};

export type SceneAnswer = {
  readonly method: Method;
  readonly solverVersion: string;
  readonly results: readonly FrequencyResult[];
};
