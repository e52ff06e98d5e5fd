/** What a layout may hold; the schemas and the operations refuse more. */
export const LIMITS = {
  antennas: 64,
  elementsPerPart: 16,
  radios: 64,
  bandsPerRadio: 16,
  rejectionsPerRadio: 32,
  neverTogether: 256,
  surfaces: 32,
  obstacles: 200,
  keepOuts: 200,
  mountPoints: 200,
  cableEntries: 64,
  outlinePoints: 2000,
  changesPerOperation: 256,
  documentBytes: 1_000_000,
  nameLength: 120,
  noteLength: 1000,
  /** Largest coordinate, m. */
  extent: 1000,
  /** Lowest and highest frequency, Hz. */
  frequencyLow: 1e5,
  frequencyHigh: 1e11,
} as const;
