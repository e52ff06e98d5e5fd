/** What an estimate says of a layout; computed by the same code in the client and in the server. */

/** States of a pair. *Not held* is neither clear nor lacking: the model does not hold there, `reason` says why. */
export type PairState = 'clear' | 'tight' | 'lacking' | 'not held' | 'never together';

export type Mechanism = 'overload' | 'transmitter noise';

/** The model that a number comes from. */
export type EstimateModel = 'live';

/** Why a number is not held, or a warning: a closed code and a sentence for people. */
export type Reason = { readonly code: string; readonly message: string };

/** One mechanism of a pair at its own worst frequency (Hz). marginDb = isolationDb - neededDb. */
export type MechanismResult = {
  readonly mechanism: Mechanism;
  readonly frequency: number;
  readonly isolationDb: number | null;
  readonly neededDb: number;
  readonly marginDb: number | null;
  /** Null when the number is held. */
  readonly reason: Reason | null;
};

/** An ordered pair of antennas; the mechanism with the smallest margin speaks for it. */
export type PairResult = {
  readonly from: string;
  readonly into: string;
  readonly state: PairState;
  readonly model: EstimateModel;
  readonly mechanism: Mechanism | null;
  readonly frequency: number | null;
  readonly isolationDb: number | null;
  readonly neededDb: number | null;
  readonly marginDb: number | null;
  readonly mechanisms: readonly MechanismResult[];
  /** Why it is not held, or which rule keeps the two apart; null otherwise. */
  readonly reason: Reason | null;
};

/** Azimuth pattern with the others present and alone; bearings anticlockwise from +x, one value per step. */
export type PatternResult = {
  readonly frequency: number;
  readonly elevationDeg: number;
  readonly stepDeg: number;
  readonly gainDbi: readonly number[];
  readonly aloneDbi: readonly number[];
  readonly rippleDb: number;
  /** As on screen: clockwise from the forward axis. */
  readonly deepestAzimuthDeg: number;
  /** Null when the pattern is held. */
  readonly reason: Reason | null;
};

/** What the estimate says of one antenna. `pattern` is null where there is nothing to compute; `reason` says why. */
export type AntennaResult = {
  readonly antennaId: string;
  readonly pattern: PatternResult | null;
  readonly reason: Reason | null;
  /** Smallest margin of the pairs it takes part in. */
  readonly worstMarginDb: number | null;
};

export type Estimate = {
  readonly solverVersion: string;
  readonly model: EstimateModel;
  /** "infinite flat metal roof" or "no ground plane": what the model assumes, in words. */
  readonly assumption: string;
  /** Worst first. */
  readonly pairs: readonly PairResult[];
  readonly antennas: Readonly<Record<string, AntennaResult>>;
  readonly counts: Readonly<Record<PairState, number>>;
  readonly warnings: readonly Reason[];
};
